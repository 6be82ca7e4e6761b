import type { Quantity } from "../values/quantity";

/** What the last word of a rating's or a result's name says it measures. */
const BY_LAST_WORD: ReadonlyMap<string, Quantity> = new Map([
  ["voltage", "voltage"],
  ["current", "current"],
  ["power", "power"],
  ["temperature", "temperature"],
  ["resistance", "resistance"],
  ["capacitance", "capacitance"],
  ["inductance", "inductance"],
  ["frequency", "frequency"],
  ["time", "time"],
  ["constant", "dissipation"],
]);

/**
 * What a rating or a stressed quantity measures, told by the last word of its name (`reverseVoltage` is a
 * voltage), so that a policy of one's own may name new ones. Null where the name does not say.
 */
export function measuredByName(name: string): Quantity | null {
  const [lastWord] = /(?:[A-Z]|^)[a-z]+$/.exec(name) ?? [];
  return lastWord === undefined ? null : (BY_LAST_WORD.get(lastWord.toLowerCase()) ?? null);
}
