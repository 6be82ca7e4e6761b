import type { Condition } from "../kinds/circuit";
import type { Part } from "../kinds/part";
import { stressedQuantities } from "../kinds/stressed-quantities";
import type { ConditionResult, Extreme } from "../mna/solution";

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
  const measured = stressedQuantities(part, {
    pinVoltages: Object.fromEntries(pinVoltages),
    currents: Object.fromEntries(currents),
    power: solved.power,
    temperature: solved.temperature,
  });
  const heatsItself = selfHeated(part, condition);
  const steady = {
    ...measured,
    // Direct current is no ripple.
    ...(part.kind === "capacitor" && { rippleCurrent: 0 }),
    ...(heatsItself && { junctionTemperature: solved.temperature }),
    ambientTemperature: part.temperature ?? condition.ambient,
  };
  const courses = partCourses(part, condition, result).map(
    ([quantity, extreme]): [string, number] => [quantity, worstOf(quantity, extreme)],
  );
  const surroundings =
    result.sweep === null ? {} : { ambientTemperature: hottest(part, condition) };
  return { largest: { ...steady, ...Object.fromEntries(courses), ...surroundings }, steady };
}

/** The size that counts of a course: a voltage stresses by its magnitude, a temperature only by being high. */
function worstOf(quantity: string, { min, max, rms }: Extreme): number {
  if (BY_ROOT_MEAN_SQUARE.has(quantity)) return rms;
  return quantity.toLowerCase().endsWith("temperature")
    ? max
    : Math.max(Math.abs(min), Math.abs(max));
}

/**
 * The temperature around a part at which its ratings are taken, degrees Celsius: its own where it has
 * one, else the ambient; over a sweep of the ambient the hottest, since a rating falls with temperature.
 */
export function hottest(part: Part, condition: Condition): number {
  const { analysis, ambient } = condition;
  if (part.temperature !== null) return part.temperature;
  return analysis.type === "sweep" && analysis.of === "ambient"
    ? Math.max(analysis.from, analysis.to)
    : ambient;
}

/** The extremes of a part's quantities over a sweep or a transient, by quantity; none at an operating point. */
export function partCourses(
  part: Part,
  condition: Condition,
  result: ConditionResult,
): readonly (readonly [quantity: string, extreme: Extreme])[] {
  const extremes = (result.transient ?? result.sweep)?.extremes[part.path] ?? {};
  const { temperature, junctionTemperature } = extremes;
  if (temperature === undefined || junctionTemperature === undefined)
    return Object.entries(extremes);
  if (!selfHeated(part, condition)) return Object.entries(extremes);
  // A sweep settles the temperature at each point. A transient stays at that of t = 0 while the power moves.
  const warmth = temperature.max - condition.ambient;
  const junction =
    result.transient === null
      ? temperature
      : {
          ...junctionTemperature,
          min: junctionTemperature.min - warmth,
          max: junctionTemperature.max - warmth,
        };
  return Object.entries({ ...extremes, junctionTemperature: junction });
}

/** Whether the part's temperature is its junction's already: ambient + power x junctionToAmbient, solved together. */
function selfHeated(part: Part, condition: Condition): boolean {
  return condition.selfHeating && part.temperature === null && part.junctionToAmbient !== null;
}
