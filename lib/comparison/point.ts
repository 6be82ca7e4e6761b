import type { Circuit, Condition } from "../kinds/circuit";
import type { Part } from "../kinds/part";
import { type Kept, operatingPoint } from "../mna/operating-point";
import type { ConditionResult } from "../mna/solution";

/** Node voltages of one solution, by net; null where there is none or a net is not determined. */
export type Voltages = Readonly<Record<string, number | null>>;

/** The certified operating point of a condition with other parts; of a transient, its state at t = 0. null: no solution. */
export function pointVoltages(
  circuit: Circuit,
  condition: Condition,
  parts: readonly Part[],
  before: Kept | null,
): { readonly nets: Voltages; readonly kept: Kept | null } | null {
  const time = condition.analysis.type === "transient" ? 0 : null;
  const point = operatingPoint(circuit, { ...condition, parts }, time, before);
  if (point.faults.length > 0 || point.certificate === null) return null;
  return { nets: point.nets, kept: point.kept };
}

/**
 * Every condition's operating point (of a transient, its state at t = 0) as results, each from the one
 * before. One without a certified solution is `unsolvable`, with what is determined all the same.
 */
export function pointResults(circuit: Circuit): readonly ConditionResult[] {
  const results: ConditionResult[] = [];
  let kept: Kept | null = null;
  for (const condition of circuit.conditions) {
    const time = condition.analysis.type === "transient" ? 0 : null;
    const point = operatingPoint(circuit, condition, time, kept);
    kept = point.kept ?? kept;
    results.push({
      name: condition.name,
      status: point.faults.length > 0 || point.certificate === null ? "unsolvable" : "solved",
      nets: point.nets,
      parts: point.parts,
      certificate: point.certificate,
      sweep: null,
      frequencyResponse: null,
      transient: null,
      spread: null,
    });
  }
  return results;
}
