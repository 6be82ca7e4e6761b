import { readFileSync } from "node:fs";
import type { Side } from "../lib/comparison/compare";
import { readSide } from "../lib/comparison/read-side";

/** A kept revision of the demo circuit, with values of parts replaced if wanted: `{ R7: { resistance: "31k6" } }`. */
export function demoRevision(
  letter: "A" | "B" | "C",
  values: Readonly<Record<string, Readonly<Record<string, unknown>>>> = {},
): Side {
  const file = JSON.parse(readFileSync(`tests/kept/ffc-2-${letter}.json`, "utf8"));
  for (const part of file.blocks.main.parts)
    if (values[part.ref] !== undefined) part.params = { ...part.params, ...values[part.ref] };
  return sideOf(file);
}

/** A circuit file as one side of a comparison. */
export function sideOf(file: unknown): Side {
  const side = readSide(JSON.stringify(file));
  if (!side.ok) throw new Error(JSON.stringify(side.error));
  return side.value;
}
