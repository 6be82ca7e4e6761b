"use client";

import { limitMargin, limitSubject } from "../../lib/review/limit-words";
import type { CircuitResult, LimitRow } from "../../lib/stress/circuit-result";
import { voltageWords } from "../wording/numbers";
import { LimitDumbbell } from "./dumbbells";

/** The Limits pane of the ledger: every limit in every condition, nearest or past first. */
export function LimitsPane(props: {
  readonly result: CircuitResult;
  readonly base: CircuitResult | null;
  readonly baseLetter: string | null;
  readonly letter: string;
  readonly waiverOf: (row: LimitRow) => string | null;
  /** Absent for one who may not grant a waiver. */
  readonly onWaive?: ((row: LimitRow) => void) | undefined;
}) {
  const rows = [...props.result.limits].sort(
    (a, b) => (limitMargin(a) ?? -1) - (limitMargin(b) ?? -1),
  );
  return (
    <table className="led limits">
      <thead>
        <tr>
          <th>Limit, V</th>
          <th className="mid">Within it</th>
          <th>Allowed</th>
          <th>{props.baseLetter === null ? "" : `${props.baseLetter} was`}</th>
          <th>{props.letter} is</th>
        </tr>
      </thead>
      <tbody>
        {rows.map((row) => (
          <Row
            key={`${limitSubject(row)} ${row.condition} ${row.min} ${row.max}`}
            row={row}
            was={wasRow(props.base, row)}
            waiver={props.waiverOf(row)}
            onWaive={props.onWaive}
          />
        ))}
      </tbody>
    </table>
  );
}

function Row(props: {
  readonly row: LimitRow;
  readonly was: LimitRow | null;
  readonly waiver: string | null;
  readonly onWaive?: ((row: LimitRow) => void) | undefined;
}) {
  const { row, was, waiver, onWaive } = props;
  const open = row.verdict !== "pass" && waiver === null;
  const is = farther(row);
  return (
    <tr className={row.verdict === "pass" ? "quiet" : "loud"}>
      <td>
        {limitSubject(row)}
        <span className="sub">
          {waiver === null ? row.condition : `${row.condition}, ${waiver}`}
        </span>
        {open && onWaive !== undefined && (
          <button type="button" className="btn quiet" onClick={() => onWaive(row)}>
            Waive …
          </button>
        )}
      </td>
      <td>
        <LimitDumbbell
          was={was === null ? null : farther(was)}
          is={is}
          min={row.min}
          max={row.max}
          past={row.verdict === "fail" && waiver === null}
          waived={waiver !== null}
        />
      </td>
      <td className="num">
        {row.min === null ? "to" : voltageWords(row.min)}
        <span className="sub">
          {row.max === null
            ? "and up"
            : row.min === null
              ? voltageWords(row.max)
              : `to ${voltageWords(row.max)}`}
        </span>
      </td>
      <td className="num">{was === null ? "" : voltageWords(farther(was))}</td>
      <td className={open ? "num worse" : "num"}>{voltageWords(is)}</td>
    </tr>
  );
}

/** Of the two extremes the one nearer to, or farther past, a bound. */
function farther(row: LimitRow): number | null {
  if (row.low === null || row.high === null) return null;
  if (row.max === null) return row.low;
  if (row.min === null) return row.high;
  return row.max - row.high < row.low - row.min ? row.high : row.low;
}

function wasRow(base: CircuitResult | null, row: LimitRow): LimitRow | null {
  return (
    base?.limits.find(
      (one) => one.condition === row.condition && limitSubject(one) === limitSubject(row),
    ) ?? null
  );
}
