import type { CircuitResult, StressRow } from "../../lib/stress/circuit-result";

/** One part and rule of the ledger, at the condition with the least margin, beside what it was. */
export interface StressLine {
  readonly row: StressRow;
  readonly wasMargin: number | null;
  /** applied / limit, before and now. */
  readonly wasRatio: number | null;
  readonly isRatio: number | null;
  readonly waiver: string | null;
}

const key = (row: StressRow): string => `${row.part}\n${row.rule.id}`;

/** Over first, then unknown, then the least margin; a part and rule appear once, at their worst condition. */
export function stressLines(
  result: CircuitResult,
  base: CircuitResult | null,
  waiverOf: (row: StressRow) => string | null,
): readonly StressLine[] {
  const worstWas = worstRows(base);
  return [...worstRows(result).values()]
    .map((row): StressLine => {
      const was = worstWas.get(key(row)) ?? null;
      return {
        row,
        wasMargin: was?.margin ?? null,
        wasRatio: ratio(was),
        isRatio: ratio(row),
        waiver: waiverOf(row),
      };
    })
    .sort((a, b) => rank(a) - rank(b) || (a.row.margin ?? 0) - (b.row.margin ?? 0));
}

/** The worst row of each part and rule: a failing one, else an unknown one, else the least margin. */
export function worstRows(result: CircuitResult | null): ReadonlyMap<string, StressRow> {
  const worst = new Map<string, StressRow>();
  for (const row of result?.stress ?? []) {
    const held = worst.get(key(row));
    if (held === undefined || order(row) < order(held)) worst.set(key(row), row);
  }
  return worst;
}

function order(row: StressRow): number {
  if (row.verdict === "unknown") return -1e6;
  return row.margin ?? Number.POSITIVE_INFINITY;
}

function rank(line: StressLine): number {
  if (line.row.verdict === "fail") return line.waiver === null ? 0 : 2;
  if (line.row.verdict === "unknown") return line.waiver === null ? 1 : 2;
  return 3;
}

function ratio(row: StressRow | null): number | null {
  if (row === null || row.margin === null) return null;
  return 1 / (1 + row.margin);
}
