import type { Condition } from "../kinds/circuit";
import type { Part } from "../kinds/part";
import { stressedQuantities } from "../kinds/stressed-quantities";
import type { ConditionResult } from "../mna/solution";

/** What is applied to a part in one condition: the largest of each quantity, and what it is at the operating point. */
export interface AppliedQuantities {
  readonly largest: Readonly<Record<string, number>>;
  readonly steady: Readonly<Record<string, number>>;
}

/** Ripple heats by its root mean square, not by its peak. */
const BY_ROOT_MEAN_SQUARE = new Set(["rippleCurrent"]);

/**
 * The applied quantities of a part in a condition, over the extremes of a sweep or a transient too.
 * null where the condition has no solution, or leaves a voltage of the part undetermined.
 */
export function appliedQuantities(
  part: Part,
  condition: Condition,
  result: ConditionResult,
): AppliedQuantities | null {
  const solved = result.parts[part.path];
  if (result.status !== "solved" || solved === undefined || solved.power === null) return null;
  const pinVoltages: [string, number][] = [];
  const currents: [string, number][] = [];
  for (const [pin, net] of Object.entries(part.pins)) {
    const voltage = net === null ? 0 : result.nets[net];
    const current = solved.currents[pin] ?? 0;
    if (voltage === null || voltage === undefined) return null;
    pinVoltages.push([pin, voltage]);
    currents.push([pin, current]);
  }
  const steady = {
    ...stressedQuantities(part, {
      pinVoltages: Object.fromEntries(pinVoltages),
      currents: Object.fromEntries(currents),
      power: solved.power,
      temperature: solved.temperature,
    }),
    // Direct current is no ripple.
    ...(part.kind === "capacitor" && { rippleCurrent: 0 }),
    ambientTemperature: condition.ambient,
  };
  const extremes = (result.transient ?? result.sweep)?.extremes[part.path] ?? {};
  const courses = Object.entries(extremes).map(([quantity, extreme]): [string, number] => [
    quantity,
    BY_ROOT_MEAN_SQUARE.has(quantity)
      ? extreme.rms
      : Math.max(Math.abs(extreme.min), Math.abs(extreme.max)),
  ]);
  return { largest: { ...steady, ...Object.fromEntries(courses) }, steady };
}
