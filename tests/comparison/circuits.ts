import fc from "fast-check";
import { sideOf } from "../demo-revisions";

/** A source from net IN to GND. */
export function source(dc: number | string, ref = "V1"): object {
  return { ref, kind: "voltageSource", pins: { plus: "IN", minus: "GND" }, params: { dc } };
}

/** A resistor between two nets. */
export function resistor(
  ref: string,
  from: string,
  to: string,
  resistance: number | string,
  more: object = {},
): object {
  return { ref, kind: "resistor", pins: { "1": from, "2": to }, params: { resistance }, ...more };
}

/** Parts in one block as a side of a comparison. */
export function circuitOf(parts: readonly object[], more: Readonly<Record<string, unknown>> = {}) {
  return sideOf({ ampersign: 1, blocks: { main: { parts } }, ...more });
}

/** A ladder of rungs N0, N1, …: a series and a shunt resistor each; values in ohms. */
export interface Ladder {
  readonly volts: number;
  readonly rungs: readonly (readonly [series: number, shunt: number])[];
}

/** The parts of a ladder, with the names that it is given. */
export function ladderParts(
  { volts, rungs }: Ladder,
  names: { readonly net: (k: number) => string; readonly prefix: string } = {
    net: (k) => `N${k}`,
    prefix: "",
  },
): readonly object[] {
  return [
    source(volts),
    ...rungs.flatMap(([series, shunt], k) => [
      resistor(`R${names.prefix}${k}`, k === 0 ? "IN" : names.net(k - 1), names.net(k), series),
      resistor(`S${names.prefix}${k}`, names.net(k), "GND", shunt),
    ]),
  ];
}

const ohms = fc.integer({ min: 100, max: 100_000 });

/** Two ladders of the same length: a base and what it becomes. */
export const twoLadders = fc.integer({ min: 1, max: 3 }).chain((length) => {
  const rungs = fc.array(fc.tuple(ohms, ohms), { minLength: length, maxLength: length });
  const ladder = fc.record({ volts: fc.integer({ min: 1, max: 48 }), rungs });
  return fc.tuple(ladder, ladder);
});
