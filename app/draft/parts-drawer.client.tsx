"use client";

import { useId, useState } from "react";
import { kinds } from "../../lib/kinds/catalogue";
import type { Kind } from "../../lib/kinds/part";
import { symbols } from "../../lib/kinds/symbols";
import { kindGroups, kindWords } from "../wording/kinds";

/** The drawer of part kinds: a press places one on the sheet, where it can be moved by mouse or arrow keys. */
export function PartsDrawer(props: {
  readonly open: boolean;
  readonly disabled: boolean;
  readonly onPlace: (kind: Kind) => void;
}) {
  const [wanted, setWanted] = useState("");
  const id = useId();
  const words = wanted.trim().toLowerCase();
  const shown = kinds.filter(
    (kind) =>
      kindWords[kind].name.toLowerCase().includes(words) || kind.toLowerCase().includes(words),
  );
  return (
    <aside className={props.open ? "drawer open" : "drawer"} aria-label="Parts">
      <div className="find">
        <label className="cap" htmlFor={id}>
          Find a part
        </label>
        <input
          id={id}
          value={wanted}
          placeholder="kind"
          onChange={(event) => setWanted(event.target.value)}
        />
      </div>
      {kindGroups.map(({ group, words: heading }) => {
        const members = shown.filter((kind) => kindWords[kind].group === group);
        if (members.length === 0) return null;
        return (
          <section key={group}>
            <h2 className="cap">{heading}</h2>
            <ul>
              {members.map((kind) => (
                <li key={kind}>
                  <button
                    type="button"
                    disabled={props.disabled}
                    onClick={() => props.onPlace(kind)}
                    aria-label={`Place a ${kindWords[kind].name}`}
                  >
                    <KindPicture kind={kind} />
                    <span aria-hidden="true">{kindWords[kind].name}</span>
                  </button>
                </li>
              ))}
            </ul>
          </section>
        );
      })}
      {shown.length === 0 && <p className="none">No kind is called that.</p>}
    </aside>
  );
}

function KindPicture(props: { readonly kind: Kind }) {
  const symbol = symbols[props.kind];
  const [left, top, right, bottom] = symbol.box;
  const middleX = (left + right) / 2;
  const middleY = (top + bottom) / 2;
  const first = Object.values(symbol.variant?.strokes ?? {})[0] ?? [];
  return (
    <svg viewBox={`${middleX - 42} ${middleY - 33} 84 66`} className="sy" aria-hidden="true">
      {[...symbol.strokes, ...first].map((stroke) => (
        <path
          key={stroke.path}
          d={stroke.path}
          className={stroke.look === "solid" ? "solid" : undefined}
        />
      ))}
    </svg>
  );
}
