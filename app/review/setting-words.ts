import type { CircuitFile } from "../../lib/circuit/circuit-file";
import { formatQuantity } from "../../lib/values/format-quantity";
import { readValue } from "../../lib/values/read-value";

const MINUS = "\u2212";

/** What a condition sets, shortly: `28.8 V · 70 °C · transient`. */
export function settingWords(file: CircuitFile, conditionName: string): string {
  const condition = file.conditions?.find((one) => one.name === conditionName);
  const words: string[] = [];
  const supply = supplyVoltage(file, condition?.set ?? {});
  if (supply !== null) words.push(supply);
  words.push(`${String(condition?.ambient ?? 25).replace("-", MINUS)} °C`);
  const analysis = condition?.analysis?.type ?? "operatingPoint";
  if (analysis === "transient") words.push("transient");
  if (analysis === "sweep") words.push("sweep");
  if (analysis === "frequencyResponse") words.push("frequency");
  return words.join(" · ");
}

/** The voltage of the first source of the top block, as this condition sets it. */
function supplyVoltage(file: CircuitFile, set: Readonly<Record<string, unknown>>): string | null {
  const top = file.top ?? Object.keys(file.blocks)[0];
  const parts = top === undefined ? [] : (file.blocks[top]?.parts ?? []);
  const source = parts.find((part) => part.kind === "voltageSource");
  if (source === undefined) return null;
  const written = set[`${source.ref}.dc`] ?? source.params?.["dc"];
  if (typeof written === "number") return formatQuantity(written, "V");
  if (typeof written !== "string") return null;
  const read = readValue(written, "voltage");
  return read.ok ? formatQuantity(read.value.value, "V") : null;
}
