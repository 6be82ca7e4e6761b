"use client";

import type { Selection } from "../sheet/selection";
import { shiftWords, voltageWords } from "../wording/numbers";
import { ShiftDumbbell } from "./dumbbells";
import type { NetRow } from "./net-rows";

/** The Nets pane of the ledger: every net of the condition, loud shifts first. */
export function NetsPane(props: {
  readonly rows: readonly NetRow[];
  readonly baseLetter: string | null;
  readonly letter: string;
  readonly selection: Selection | null;
  readonly onSelect: (selection: Selection) => void;
}) {
  const loud = props.rows.filter((row) => row.loud);
  const quiet = props.rows.filter((row) => !row.loud);
  const selectedNet =
    props.selection !== null && "net" in props.selection ? props.selection.net : null;
  return (
    <table className="led">
      <thead>
        <tr>
          <th>Net</th>
          <th className="mid">Shift, in bands</th>
          <th>{props.baseLetter === null ? "" : `${props.baseLetter} was`}</th>
          <th>{props.letter} is</th>
          <th>Shift V</th>
        </tr>
      </thead>
      <tbody>
        {loud.length > 0 && (
          <Group words={`Outside the tolerance band or a limit: ${loud.length}`} />
        )}
        {loud.map((row) => (
          <Row key={row.net} row={row} on={row.net === selectedNet} onSelect={props.onSelect} />
        ))}
        <Group words={`Inside the band: ${quiet.length}`} />
        {quiet.map((row) => (
          <Row key={row.net} row={row} on={row.net === selectedNet} onSelect={props.onSelect} />
        ))}
      </tbody>
    </table>
  );
}

function Group(props: { readonly words: string }) {
  return (
    <tr className="grp">
      <td colSpan={5}>{props.words}</td>
    </tr>
  );
}

function Row(props: {
  readonly row: NetRow;
  readonly on: boolean;
  readonly onSelect: (selection: Selection) => void;
}) {
  const { row, on } = props;
  const classes = [row.loud ? "loud" : "quiet", on ? "on" : ""].join(" ").trim();
  const number = row.past ? "num worse" : "num";
  return (
    <tr className={classes}>
      <td>
        <button
          type="button"
          className="pick"
          aria-pressed={on}
          onClick={() => props.onSelect({ net: row.net })}
        >
          {row.net}
        </button>
      </td>
      <td>
        {row.is !== null && (
          <ShiftDumbbell
            was={row.was ?? row.is}
            is={row.is}
            band={row.band}
            limits={row.limits}
            past={row.past}
          />
        )}
      </td>
      <td className="num">{row.was === null ? "" : voltageWords(row.was)}</td>
      <td className={number}>{voltageWords(row.is)}</td>
      <td className={number}>{row.shift === null ? "new" : shiftWords(row.shift)}</td>
    </tr>
  );
}
