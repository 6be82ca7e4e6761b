import type { CircuitResult, StressRow } from "../stress/circuit-result";
import type { StressShift } from "./comparison";

/** Margins closer than this are the same number. */
const SAME = 1e-9;

const key = (row: StressRow): string => `${row.part}\n${row.rule.id}\n${row.condition}`;

/** Every margin or verdict that is another one than before, by part, rule and condition; one side alone has null on the other. */
export function stressShifts(base: CircuitResult, proposed: CircuitResult): readonly StressShift[] {
  const before = new Map(base.stress.map((row) => [key(row), row]));
  const after = new Map(proposed.stress.map((row) => [key(row), row]));
  const keys = new Set([...after.keys(), ...before.keys()]);
  return [...keys].flatMap((one): readonly StressShift[] => {
    const was = before.get(one) ?? null;
    const is = after.get(one) ?? null;
    const row = is ?? was;
    if (row === null) return [];
    const same =
      was !== null &&
      is !== null &&
      was.verdict === is.verdict &&
      (was.margin === is.margin || Math.abs((was.margin ?? 0) - (is.margin ?? 0)) <= SAME);
    if (same) return [];
    return [
      {
        part: row.part,
        quantity: row.quantity,
        rule: row.rule.id,
        condition: row.condition,
        was: was?.margin ?? null,
        is: is?.margin ?? null,
        verdictWas: was?.verdict ?? null,
        verdictIs: is?.verdict ?? null,
      },
    ];
  });
}
