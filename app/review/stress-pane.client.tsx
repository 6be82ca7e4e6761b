"use client";

import { formatFixed, formatQuantity } from "../../lib/values/format-quantity";
import type { Selection } from "../sheet/selection";
import { marginNumber } from "../wording/numbers";
import { quantityName, quantityUnit } from "../wording/quantities";
import { StressDumbbell } from "./dumbbells";
import type { StressLine } from "./stress-lines";

/** The Stress pane of the ledger: every part and rule, worst first; the chosen one spells out its rule. */
export function StressPane(props: {
  readonly lines: readonly StressLine[];
  readonly baseLetter: string | null;
  readonly letter: string;
  readonly selection: Selection | null;
  readonly onSelect: (selection: Selection) => void;
  /** Absent for one who may not grant a waiver. */
  readonly onWaive?: ((line: StressLine) => void) | undefined;
}) {
  const selected =
    props.selection !== null && "part" in props.selection ? props.selection.part : null;
  return (
    <table className="led stress">
      <thead>
        <tr>
          <th>Part</th>
          <th className="mid">Applied / limit</th>
          <th>{props.baseLetter === null ? "" : `${props.baseLetter} %`}</th>
          <th>{props.letter} %</th>
        </tr>
      </thead>
      <tbody>
        {props.lines.map((line) => (
          <Line
            key={`${line.row.part} ${line.row.rule.id}`}
            line={line}
            on={line.row.part === selected}
            onSelect={props.onSelect}
            onWaive={props.onWaive}
          />
        ))}
      </tbody>
    </table>
  );
}

function Line(props: {
  readonly line: StressLine;
  readonly on: boolean;
  readonly onSelect: (selection: Selection) => void;
  readonly onWaive?: ((line: StressLine) => void) | undefined;
}) {
  const { line, on } = props;
  const { row } = line;
  const open = row.verdict !== "pass" && line.waiver === null;
  return (
    <>
      <tr className={on ? "part on" : "part"}>
        <td>
          <button
            type="button"
            className="pick"
            aria-pressed={on}
            onClick={() => props.onSelect({ part: row.part })}
          >
            {row.part}
          </button>
          <span className="sub">
            {quantityName(row.quantity)}
            {line.waiver !== null && `, ${line.waiver}`}
          </span>
        </td>
        <td>
          <StressDumbbell
            wasRatio={line.wasRatio}
            isRatio={line.isRatio}
            waived={line.waiver !== null}
          />
        </td>
        <td className="num">{line.wasMargin === null ? "" : marginNumber(line.wasMargin)}</td>
        <td className={open ? "num worse" : "num"}>
          {row.verdict === "unknown" ? "unknown" : marginNumber(row.margin)}
        </td>
      </tr>
      {on && (
        <tr className="on detail">
          <td colSpan={4}>
            <p>{appliedWords(line)}</p>
            <p className="sub">
              {row.rule.id}: {row.rule.document}
              {row.rule.clause === "" ? "" : `, ${row.rule.clause}`} ({row.rule.status})
            </p>
            {open && props.onWaive !== undefined && (
              <button type="button" className="btn" onClick={() => props.onWaive?.(line)}>
                Waive …
              </button>
            )}
          </td>
        </tr>
      )}
    </>
  );
}

/** `138 °C of 125 °C allowed (150 °C rated), Hot and charging`. */
function appliedWords(line: StressLine): string {
  const { row } = line;
  const unit = quantityUnit(row.quantity);
  if (row.verdict === "unknown") {
    return `Not evaluated: needs ${(row.needs ?? ["more data"]).join(", ")}. Add it to ${row.part}, or have it waived.`;
  }
  const number = (value: number | null): string =>
    value === null
      ? "?"
      : unit === "°C"
        ? formatFixed(value, "°C", 1)
        : formatQuantity(value, unit);
  const rated = row.rated === null ? "" : ` (${number(row.rated)} rated)`;
  return `${number(row.applied)} of ${number(row.limit)} allowed${rated}, ${row.condition}`;
}
