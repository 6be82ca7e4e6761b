import type { LimitRow } from "../stress/circuit-result";

/** What a limit is set on: `TREF`, `A to B`, `R1 power`. */
export function limitSubject(row: LimitRow): string {
  if (row.net !== undefined) return row.net;
  if (row.between !== undefined) return `${row.between[0]} to ${row.between[1]}`;
  return `${row.part ?? "?"} ${row.quantity ?? ""}`.trim();
}

/**
 * How far inside its limits a figure stands, as a fraction like a stress margin: limit / applied - 1
 * for an upper bound, applied / limit - 1 for a lower one, the lesser of both. For bounds at or below
 * zero and bands that reach across it, where that quotient means nothing, the distance over the width
 * of the allowed band (or over the bound's size) serves. null where the figure is not known.
 */
export function limitMargin(row: LimitRow): number | null {
  if (row.low === null || row.high === null) return null;
  const width = row.min !== null && row.max !== null ? row.max - row.min : null;
  const acrossZero = row.min !== null && row.min < 0;
  const margins: number[] = [];
  if (row.max !== null) {
    margins.push(
      row.max > 0 && row.high > 0 && !acrossZero
        ? row.max / row.high - 1
        : (row.max - row.high) / scale(width, row.max),
    );
  }
  if (row.min !== null) {
    margins.push(row.min > 0 ? row.low / row.min - 1 : (row.low - row.min) / scale(width, row.min));
  }
  return margins.length === 0 ? null : Math.min(...margins);
}

function scale(width: number | null, bound: number): number {
  if (width !== null && width > 0) return width;
  return Math.max(Math.abs(bound), 1);
}
