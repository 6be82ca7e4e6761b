"use client";

import { useState } from "react";
import type { Edit } from "../../lib/comparison/comparison";
import { editWords } from "./edit-words";

/** What changed, one line each, to be checked off by someone other than the author. */
export function ItemsToCheck(props: {
  readonly items: readonly Edit[];
  /** Who checked each item, by the edit's id. */
  readonly checkedBy: ReadonlyMap<string, string>;
  /** Null for one who may not check: an author, or one without the right. */
  readonly onCheck: ((item: string, checked: boolean) => Promise<void>) | null;
  readonly onSelect: (part: string) => void;
}) {
  // What was ticked here a moment ago and the server has not answered yet.
  const [asked, setAsked] = useState<ReadonlyMap<string, boolean>>(new Map());
  const ask = async (item: string, checked: boolean): Promise<void> => {
    setAsked((held) => new Map([...held, [item, checked]]));
    await props.onCheck?.(item, checked);
    setAsked((held) => new Map([...held].filter(([one]) => one !== item)));
  };
  const done = props.items.filter((item) => props.checkedBy.has(item.id)).length;
  return (
    <section className="items">
      <h2 className="cap">
        Changed items: {done} of {props.items.length} checked
      </h2>
      <ul>
        {props.items.map((item) => {
          const by = props.checkedBy.get(item.id);
          return (
            <li key={item.id}>
              <label>
                <input
                  type="checkbox"
                  checked={asked.get(item.id) ?? by !== undefined}
                  disabled={props.onCheck === null || asked.has(item.id)}
                  onChange={(event) => void ask(item.id, event.target.checked)}
                />
                <span>{editWords(item)}</span>
              </label>
              {by !== undefined && <span className="by">{by}</span>}
              {item.part !== undefined && item.change !== "removed" && (
                <button
                  type="button"
                  className="btn quiet"
                  onClick={() => item.part !== undefined && props.onSelect(item.part)}
                >
                  show
                </button>
              )}
            </li>
          );
        })}
      </ul>
    </section>
  );
}
