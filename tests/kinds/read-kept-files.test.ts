import { readFileSync } from "node:fs";
import { describe, expect, it } from "vitest";
import { readCircuit, readCircuitFile } from "../../lib/kinds/read-circuit";

const kept = (name: string): string =>
  readFileSync(new URL(`../kept/${name}`, import.meta.url), "utf8");

interface Example {
  readonly id: string;
  readonly circuit: unknown;
}

describe("the kept circuit files", () => {
  it.each([
    ["ffc-2-A.json", 26],
    ["ffc-2-B.json", 26],
    ["ffc-2-C.json", 25],
  ])("reads %s whole", (name, parts) => {
    const read = readCircuit(kept(name));
    expect(read.ok ? [] : read.error).toEqual([]);
    if (!read.ok) return;
    expect(read.value.parts).toHaveLength(parts);
    expect(read.value.conditions.map((condition) => condition.name)).toEqual([
      "Nominal",
      "Charging",
      "Hot and charging",
      "Cold crank",
      "Relay drop-out",
    ]);
    expect(read.value.limits).toHaveLength(7);
  });

  it("reads every worked example", () => {
    const examples: readonly Example[] = JSON.parse(kept("examples.json"));
    const bad = examples.flatMap(({ id, circuit }) => {
      const read = readCircuitFile(circuit);
      return read.ok ? [] : [{ id, problems: read.error }];
    });
    expect(bad).toEqual([]);
    expect(examples).toHaveLength(135);
  });
});
