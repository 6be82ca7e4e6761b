import type { Part } from "../kinds/part";
import type { PlacedPart } from "./network";
import type { PartResult } from "./solution";
import type { System } from "./system";

/** The two pins whose difference is a part's voltage, where they are not the first two. */
const voltagePins = new Map<Part["kind"], readonly [string, string]>([
  ["bjt", ["collector", "emitter"]],
  ["mosfet", ["drain", "source"]],
  ["jfet", ["drain", "source"]],
  ["potentiometer", ["1", "2"]],
  ["linearRegulator", ["in", "common"]],
]);

/** The currents into a placed part's pins, A, with the charging currents where `rate` gives dq/dt by terminal. */
export function pinCurrents(placed: PlacedPart, charging: Float64Array | null): number[] {
  return placed.pins.map((_, t) => (placed.law.f[t] ?? 0) + (charging?.[t] ?? 0));
}

/** V, first pin minus second; null for a part with fewer than two. */
function partVoltage(placed: PlacedPart, x: Float64Array): number | null {
  const [first, second] = voltagePins.get(placed.part.kind) ?? placed.pins;
  if (first === undefined || second === undefined) return null;
  return pinVoltage(placed, x, first) - pinVoltage(placed, x, second);
}

/** V, at one pin. */
function pinVoltage(placed: PlacedPart, x: Float64Array, pin: string): number {
  return x[placed.law.terminals[placed.pins.indexOf(pin)] ?? 0] ?? 0;
}

/** W, absorbed. */
export function partPower(
  placed: PlacedPart,
  x: Float64Array,
  currents: readonly number[],
): number {
  return currents.reduce((sum, i, t) => sum + i * (x[placed.law.terminals[t] ?? 0] ?? 0), 0);
}

/** Node voltages and parts at a solution. */
export interface Reading {
  readonly nets: Record<string, number | null>;
  readonly parts: Record<string, PartResult>;
}

/**
 * Reads a solution; the system must have been assembled at `x`.
 * @param charging rates of charge by terminal, A, all laws one after the other; null: none
 */
export function readSolution(
  system: System,
  x: Float64Array,
  charging: Float64Array | null = null,
): Reading {
  const nets: [string, number][] = [];
  system.network.unknowns.names.forEach((name, unknown) => {
    if ("net" in name) nets.push([name.net, positiveZero(x[unknown] ?? 0)]);
  });
  let offset = 0;
  const parts = system.network.parts.map((placed): [string, PartResult] => {
    const { length } = placed.law.terminals;
    const currents = pinCurrents(placed, charging?.subarray(offset, offset + length) ?? null);
    offset += length;
    const result: PartResult = {
      voltage: placed.pins.length < 2 ? null : partVoltage(placed, x),
      power: partPower(placed, x, currents),
      currents: Object.fromEntries(
        placed.pins.map((pin, t) => [pin, positiveZero(currents[t] ?? 0)]),
      ),
      temperature: placed.temperature,
    };
    return [placed.part.path, result];
  });
  return { nets: Object.fromEntries(nets), parts: Object.fromEntries(parts) };
}

/** JSON has no negative zero worth keeping. */
function positiveZero(value: number): number {
  return value === 0 ? 0 : value;
}
