import fc from "fast-check";
import type { Circuit } from "../../lib/kinds/circuit";
import { readCircuitFile } from "../../lib/kinds/read-circuit";
import type { ConditionResult } from "../../lib/mna/solution";
import { solveCircuit } from "../../lib/mna/solve";

/** A part as the circuit file writes it. */
export interface WrittenPart {
  readonly ref: string;
  readonly kind: string;
  readonly pins: Readonly<Record<string, string | null>>;
  readonly params?: object;
  readonly [key: string]: unknown;
}

/** A circuit of one block, read. */
export function circuitOf(parts: readonly WrittenPart[], more: object = {}): Circuit {
  const read = readCircuitFile({ ampersign: 1, blocks: { main: { parts } }, ...more });
  if (!read.ok) throw new Error(JSON.stringify(read.error));
  return read.value;
}

/** The only condition's result. */
export function solvedOnly(parts: readonly WrittenPart[], more: object = {}): ConditionResult {
  const [only] = solveCircuit(circuitOf(parts, more)).conditions;
  if (only === undefined) throw new Error("a circuit has a condition");
  return only;
}

/** A resistive network: a chain through all nets from the reference, and further resistors at will. */
export interface Network {
  readonly nets: readonly string[];
  readonly resistors: readonly { readonly a: string; readonly b: string; readonly ohms: number }[];
  readonly injected: readonly { readonly net: string; readonly amperes: number }[];
}

const ohms = fc.double({ min: 0, max: 6, noNaN: true }).map((power) => 10 ** power);

/** Networks of 2 to 12 nets, resistances from 1 Ω to 1 MΩ, currents injected from the reference. */
export const networks: fc.Arbitrary<Network> = fc.integer({ min: 2, max: 12 }).chain((count) => {
  const nets = Array.from({ length: count }, (_, k) => `N${k + 1}`);
  const net = fc.constantFrom("GND", ...nets);
  const chain = fc
    .array(ohms, { minLength: count, maxLength: count })
    .map((values) =>
      values.map((value, k) => ({ a: k === 0 ? "GND" : `N${k}`, b: `N${k + 1}`, ohms: value })),
    );
  const further = fc.array(fc.record({ a: net, b: net, ohms }), { maxLength: 2 * count });
  const injected = fc.array(
    fc.record({
      net: fc.constantFrom(...nets),
      amperes: fc
        .tuple(fc.double({ min: -6, max: -1, noNaN: true }), fc.constantFrom(1, -1))
        .map(([power, sign]) => sign * 10 ** power),
    }),
    { minLength: 1, maxLength: 3 },
  );
  return fc.tuple(chain, further, injected).map(([first, rest, currents]) => ({
    nets,
    resistors: [...first, ...rest.filter(({ a, b }) => a !== b)],
    injected: currents,
  }));
});

/** The network's parts; `scale` multiplies the injected currents. */
export function partsOf(network: Network, scale = 1): WrittenPart[] {
  return [
    ...network.resistors.map(({ a, b, ohms: resistance }, k) => ({
      ref: `R${k + 1}`,
      kind: "resistor",
      pins: { 1: a, 2: b },
      params: { resistance },
    })),
    ...network.injected.map(({ net, amperes }, k) => ({
      ref: `I${k + 1}`,
      kind: "currentSource",
      pins: { from: "GND", to: net },
      params: { dc: amperes * scale },
    })),
  ];
}

/** Largest |voltage| of a result, V; what differences are measured against. */
export function largestVoltage(result: ConditionResult): number {
  return Math.max(1e-9, ...Object.values(result.nets).map((value) => Math.abs(value ?? 0)));
}
