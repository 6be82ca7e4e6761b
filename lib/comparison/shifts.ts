import type { ConditionResult } from "../mna/solution";
import type { CircuitResult, LimitRow } from "../stress/circuit-result";
import type { Band } from "./band";
import type { NetShift } from "./comparison";

/** A shift below this part of the voltages, or this many volts, is no more than solver error. */
const RELATIVE_ERROR = 1e-9;
const ABSOLUTE_ERROR = 1e-9;

/** Every net of either side, in each condition that both have, whose voltage moved by more than solver error. */
export function netShifts(
  base: CircuitResult,
  proposed: CircuitResult,
  bands: ReadonlyMap<string, ReadonlyMap<string, Band>>,
): readonly NetShift[] {
  return base.conditions.flatMap((before) => {
    const after = proposed.conditions.find((one) => one.name === before.name);
    return after === undefined
      ? []
      : conditionShifts(before, after, bands.get(before.name) ?? new Map(), base, proposed);
  });
}

function conditionShifts(
  before: ConditionResult,
  after: ConditionResult,
  bands: ReadonlyMap<string, Band>,
  base: CircuitResult,
  proposed: CircuitResult,
): readonly NetShift[] {
  const nets = new Set([...Object.keys(before.nets), ...Object.keys(after.nets)]);
  const errorBound = Math.max(
    before.certificate?.errorBound ?? 0,
    after.certificate?.errorBound ?? 0,
    RELATIVE_ERROR,
  );
  return [...nets].flatMap((net): readonly NetShift[] => {
    const was = before.nets[net] ?? null;
    const is = after.nets[net] ?? null;
    if (was === null && is === null) return [];
    const shift = was === null || is === null ? null : is - was;
    const noise = Math.max(
      ABSOLUTE_ERROR,
      errorBound * Math.max(Math.abs(was ?? 0), Math.abs(is ?? 0)),
    );
    if (shift !== null && Math.abs(shift) <= noise) return [];
    const band = bands.get(net) ?? null;
    const inside = band !== null && is !== null && is >= band[0] - noise && is <= band[1] + noise;
    return [
      {
        net,
        condition: before.name,
        was,
        is,
        shift,
        band,
        significant: !inside,
        crosses: crossed(net, before.name, base, proposed),
      },
    ];
  });
}

/** The limits that the net met before and does not meet now, or the other way round. */
function crossed(
  net: string,
  condition: string,
  base: CircuitResult,
  proposed: CircuitResult,
): readonly string[] {
  const rowsOf = (result: CircuitResult): readonly LimitRow[] =>
    result.limits.filter((row) => row.net === net && row.condition === condition);
  return rowsOf(proposed).flatMap((row) => {
    const before = rowsOf(base).find((one) => one.min === row.min && one.max === row.max);
    const wasMet = before === undefined || before.verdict === "pass";
    const isMet = row.verdict === "pass";
    if (wasMet === isMet) return [];
    return [`${net} ${row.min ?? "any"} to ${row.max ?? "any"}`];
  });
}
