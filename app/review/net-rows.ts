import type { Comparison } from "../../lib/comparison/comparison";
import { limitMargin } from "../../lib/review/limit-words";
import type { CircuitResult, LimitRow } from "../../lib/stress/circuit-result";

/** One net of the ledger, in one condition. */
export interface NetRow {
  readonly net: string;
  readonly was: number | null;
  readonly is: number | null;
  readonly shift: number | null;
  readonly band: readonly [low: number, high: number] | null;
  readonly limits: readonly [min: number | null, max: number | null] | null;
  /** Outside the band or across a limit. */
  readonly loud: boolean;
  /** Past a limit now. */
  readonly past: boolean;
}

/**
 * The nets of a condition for the ledger: loud ones first, each group by how many bands it moved.
 * Nets that did not move beyond solver error come last, with a shift of zero.
 */
export function netRows(
  result: CircuitResult,
  base: CircuitResult | null,
  comparison: Comparison | null,
  condition: string,
): readonly NetRow[] {
  const is = result.conditions.find((one) => one.name === condition)?.nets ?? {};
  const was = base?.conditions.find((one) => one.name === condition)?.nets ?? {};
  const moved = new Map(
    comparison?.nets.filter((row) => row.condition === condition).map((row) => [row.net, row]),
  );
  const rows = Object.keys(is)
    .filter((net) => net !== result.reference)
    .map((net): NetRow => {
      const shift = moved.get(net);
      const limit = netLimit(result, net, condition);
      const past = limit !== null && (limitMargin(limit) ?? 0) < 0;
      return {
        net,
        was: shift?.was ?? was[net] ?? null,
        is: is[net] ?? null,
        shift: shift === undefined ? (was[net] === undefined ? null : 0) : shift.shift,
        band: shift?.band ?? null,
        limits: limit === null ? null : [limit.min, limit.max],
        loud: past || shift?.significant === true || (shift?.crosses.length ?? 0) > 0,
        past,
      };
    });
  return rows.sort(
    (a, b) =>
      Number(b.loud) - Number(a.loud) ||
      Number(b.past) - Number(a.past) ||
      Math.abs(b.shift ?? 0) - Math.abs(a.shift ?? 0) ||
      (a.net < b.net ? -1 : 1),
  );
}

/** The limit that holds for a net in a condition, if any. */
export function netLimit(
  result: CircuitResult | null,
  net: string,
  condition: string,
): LimitRow | null {
  return result?.limits.find((row) => row.net === net && row.condition === condition) ?? null;
}
