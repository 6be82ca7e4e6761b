import type { Circuit, Condition } from "../kinds/circuit";
import type { Part } from "../kinds/part";
import { scaledPart, type VaryingParameter, varyingParameters } from "../kinds/tolerance-ends";
import { pointVoltages, type Voltages } from "./point";

export type Band = readonly [low: number, high: number];

/** One parameter of one part that tolerances let vary. */
interface Varying extends VaryingParameter {
  /** Index in the condition's parts. */
  readonly part: number;
}

/**
 * What the tolerances of a circuit allow at each net in one condition. Extreme value: for each net
 * the corner given by the signs of its sensitivities is solved again, low and high; root-sum-square:
 * the shifts at each parameter's two ends are combined. Drift is included; its bias is added.
 * Nets without a solution at some end are left out.
 */
export function toleranceBands(circuit: Circuit, condition: Condition): ReadonlyMap<string, Band> {
  const nominal = pointVoltages(circuit, condition, condition.parts, null);
  if (nominal === null) return new Map();
  const varying = condition.parts.flatMap((part, index) =>
    varyingParameters(part).map((one): Varying => ({ ...one, part: index })),
  );
  const solve = (end: (one: Varying, index: number) => number): Voltages | null =>
    pointVoltages(circuit, condition, partsAt(condition.parts, varying, end), nominal.kept)?.nets ??
    null;
  const highs = varying.map((_, k) => solve((one, index) => (index === k ? one.high : 1)));
  const method = condition.spread?.method ?? "extremeValue";
  if (method === "rootSumSquare") {
    const lows = varying.map((_, k) => solve((one, index) => (index === k ? one.low : 1)));
    return squareBands(nominal.nets, lows, highs);
  }
  return cornerBands(nominal.nets, varying, highs, solve);
}

function partsAt(
  parts: readonly Part[],
  varying: readonly Varying[],
  end: (one: Varying, index: number) => number,
): readonly Part[] {
  const changed = [...parts];
  varying.forEach((one, index) => {
    const part = changed[one.part];
    if (part !== undefined) changed[one.part] = scaledPart(part, one.name, end(one, index));
  });
  return changed;
}

function cornerBands(
  nominal: Voltages,
  varying: readonly Varying[],
  highs: readonly (Voltages | null)[],
  solve: (end: (one: Varying, index: number) => number) => Voltages | null,
): ReadonlyMap<string, Band> {
  const bands = new Map<string, Band>();
  // Nets that rise and fall with the same parts share their corners.
  const corners = new Map<string, Voltages | null>();
  const corner = (signs: readonly number[]): Voltages | null => {
    const key = signs.join("");
    const known = corners.get(key);
    if (known !== undefined) return known;
    const found = solve((one, index) => (signs[index] === 1 ? one.high : one.low));
    corners.set(key, found);
    return found;
  };
  for (const [net, voltage] of Object.entries(nominal)) {
    if (voltage === null) continue;
    const up = varying.map((_, k) => ((highs[k]?.[net] ?? voltage) >= voltage ? 1 : 0));
    const high = corner(up)?.[net];
    const low = corner(up.map((sign) => 1 - sign))?.[net];
    if (typeof high !== "number" || typeof low !== "number") continue;
    bands.set(net, [Math.min(low, voltage, high), Math.max(low, voltage, high)]);
  }
  return bands;
}

function squareBands(
  nominal: Voltages,
  lows: readonly (Voltages | null)[],
  highs: readonly (Voltages | null)[],
): ReadonlyMap<string, Band> {
  const bands = new Map<string, Band>();
  for (const [net, voltage] of Object.entries(nominal)) {
    if (voltage === null) continue;
    let below = 0;
    let above = 0;
    highs.forEach((high, k) => {
      const ends = [high?.[net], lows[k]?.[net]].filter((end) => typeof end === "number");
      const shifts = ends.map((end) => end - voltage);
      below += Math.min(0, ...shifts) ** 2;
      above += Math.max(0, ...shifts) ** 2;
    });
    bands.set(net, [voltage - Math.sqrt(below), voltage + Math.sqrt(above)]);
  }
  return bands;
}
