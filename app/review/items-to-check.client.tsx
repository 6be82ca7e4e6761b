"use client";

import type { Edit } from "../../lib/comparison/comparison";
import { editWords } from "./edit-words";

/** What changed, one line each, to be checked off by someone other than the author. */
export function ItemsToCheck(props: {
  readonly items: readonly Edit[];
  /** Who checked each item, by the edit's id. */
  readonly checkedBy: ReadonlyMap<string, string>;
  /** Null for one who may not check: an author, or one without the right. */
  readonly onCheck: ((item: string, checked: boolean) => void) | null;
  readonly onSelect: (part: string) => void;
}) {
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
                  checked={by !== undefined}
                  disabled={props.onCheck === null}
                  onChange={(event) => props.onCheck?.(item.id, event.target.checked)}
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
