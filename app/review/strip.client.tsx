"use client";

import type { Comparison } from "../../lib/comparison/comparison";
import { shiftWords, voltageWords } from "../wording/numbers";
import { editWords } from "./edit-words";
import type { NetRow } from "./net-rows";
import { WasIsScale } from "./was-is-scale";

/** The strip under the sheet: the chosen net's shift, its band and limits, and what caused it. */
export function Strip(props: {
  readonly row: NetRow | null;
  readonly condition: string;
  readonly comparison: Comparison | null;
  readonly history: readonly { readonly letter: string; readonly volts: number | null }[];
}) {
  const { row, comparison, condition, history } = props;
  if (row === null) {
    return (
      <section className="strip" aria-label="Selected net">
        <h2>
          <span>Choose a net</span>
          <span className="dim">on the sheet or in the ledger, to see how it moved and why</span>
        </h2>
      </section>
    );
  }
  const causes = (comparison?.causes ?? [])
    .filter((cause) => cause.net === row.net && cause.condition === condition)
    .toSorted((a, b) => Math.abs(b.share) - Math.abs(a.share));
  const largest = Math.max(...causes.map((cause) => Math.abs(cause.share)), 1e-15);
  const words = new Map(comparison?.edits.map((edit) => [edit.id, editWords(edit)]));
  return (
    <section className="strip" aria-label="Selected net">
      <h2>
        <span>Net {row.net}</span>
        <span className={row.past ? "big worse" : "big"}>
          {row.shift === null ? `${voltageWords(row.is)} V` : `${shiftWords(row.shift)} V`}
        </span>
        <span className="dim">{standing(row)}</span>
      </h2>
      <div className="cols">
        <div>
          <p className="cap">Was and is, in its band and limit, V</p>
          <WasIsScale row={row} />
        </div>
        <div>
          <p className="cap">Causes</p>
          {causes.length === 0 && (
            <p className="dim">
              {row.loud ? "None computed yet." : "Inside its band: no cause is looked for."}
            </p>
          )}
          {causes.slice(0, 5).map((cause) => (
            <div className="cause" key={cause.edit}>
              <span>{words.get(cause.edit) ?? cause.edit}</span>
              <span className="bar">
                <i style={{ width: `max(1px, ${(Math.abs(cause.share) / largest) * 100}%)` }} />
              </span>
              <span className="num">{shiftWords(cause.share)} V</span>
            </div>
          ))}
        </div>
        <div>
          <p className="cap">By revision, {condition.toLowerCase()}</p>
          <ul className="byrev">
            {history.map((entry) => (
              <li key={entry.letter}>
                Rev {entry.letter} <span className="num">{voltageWords(entry.volts)} V</span>
              </li>
            ))}
          </ul>
        </div>
      </div>
    </section>
  );
}

/** `2.5 times its tolerance band; 0.079 V past the upper limit`. */
function standing(row: NetRow): string {
  const words: string[] = [];
  if (row.band !== null && row.was !== null && row.is !== null) {
    const half = row.is >= row.was ? row.band[1] - row.was : row.was - row.band[0];
    const times = half > 0 ? Math.abs(row.is - row.was) / half : Number.POSITIVE_INFINITY;
    if (times <= 1) words.push("inside its tolerance band");
    else if (Number.isFinite(times) && times < 1000)
      words.push(`${times.toFixed(1)} times its tolerance band`);
    else words.push("its tolerance band allows no shift");
  } else if (row.shift === 0) {
    words.push("did not move");
  }
  const [min, max] = row.limits ?? [null, null];
  if (row.is !== null && max !== null && row.is > max)
    words.push(`${(row.is - max).toFixed(3)} V past the upper limit`);
  if (row.is !== null && min !== null && row.is < min)
    words.push(`${(min - row.is).toFixed(3)} V past the lower limit`);
  return words.join("; ");
}
