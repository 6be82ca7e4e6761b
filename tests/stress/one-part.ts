import type { StressRow } from "../../lib/stress/circuit-result";
import { judge } from "../../lib/stress/judge";
import { sideOf } from "../demo-revisions";

/** A source of `dc` volts from net A to GND, the given parts, and what else the file says. */
export function acrossSource(
  dc: number,
  parts: readonly object[],
  more: Readonly<Record<string, unknown>> = {},
) {
  const source = { ref: "V1", kind: "voltageSource", pins: { plus: "A", minus: "GND" } };
  const main = { parts: [{ ...source, params: { dc } }, ...parts] };
  return sideOf({ ampersign: 1, blocks: { main }, ...more }).circuit;
}

/** A resistor R1 from A to GND. */
export function resistor(part: object): object {
  return { ref: "R1", kind: "resistor", pins: { "1": "A", "2": "GND" }, ...part };
}

/** A diode-like part D1 with its cathode at A and its anode at GND. */
export function reversed(kind: "diode" | "zener", part: object): object {
  return { ref: "D1", kind, pins: { cathode: "A", anode: "GND" }, ...part };
}

/** A capacitor C1, positive pin at A. */
export function capacitor(part: object): object {
  return { ref: "C1", kind: "capacitor", pins: { "1": "A", "2": "GND" }, ...part };
}

/** The row of one rule, at its worst condition. */
export function rowOf(circuit: Parameters<typeof judge>[0], rule: string): StressRow | undefined {
  return judge(circuit).stress.find((row) => row.rule.id === rule);
}
