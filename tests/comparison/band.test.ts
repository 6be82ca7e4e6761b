import { readFileSync } from "node:fs";
import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { z } from "zod";
import { toleranceBands } from "../../lib/comparison/band";
import { readCircuitFile } from "../../lib/kinds/read-circuit";
import { solveCircuit } from "../../lib/mna/solve";
import { circuitOf, ladderParts, resistor, source, twoLadders } from "./circuits";

const examples = z
  .array(
    z.object({
      id: z.string(),
      circuit: z.unknown(),
      expect: z.array(
        z.object({
          condition: z.string().optional(),
          path: z.string(),
          value: z.number().optional(),
        }),
      ),
    }),
  )
  .parse(JSON.parse(readFileSync("tests/kept/examples.json", "utf8")))
  .filter(({ id }) => id.startsWith("tol-"));

function bandOf(circuit: ReturnType<typeof circuitOf>["circuit"], name: string, net: string) {
  const condition = circuit.conditions.find((one) => one.name === name);
  return condition === undefined ? undefined : toleranceBands(circuit, condition).get(net);
}

describe("the tolerance band of a kept example", () => {
  // Closed forms; each example names its own in tests/kept/examples.json.
  it.each(examples)("$id", ({ circuit, expect: wanted }) => {
    const read = readCircuitFile(circuit);
    if (!read.ok) throw new Error(JSON.stringify(read.error));
    let checked = 0;
    for (const { condition, path, value } of wanted) {
      const [, net = "", end] = /^spread\.nets\.(\w+)\.(low|high)$/.exec(path) ?? [];
      if (end === undefined) continue;
      const band = bandOf(read.value, condition ?? "Nominal", net);
      expect(band?.[end === "low" ? 0 : 1]).toBeCloseTo(Number(value), 4);
      checked += 1;
    }
    expect(checked).toBeGreaterThan(0);
  });
});

describe("the extreme value band", () => {
  it("holds every corner and every sample of a ladder, and is reached at its ends", () => {
    fc.assert(
      fc.property(
        twoLadders,
        fc.array(fc.double({ min: -1, max: 1, noNaN: true }), { minLength: 6, maxLength: 6 }),
        ([ladder], places) => {
          const scaled = (factor: (k: number) => number, tolerance: number) =>
            circuitOf(
              ladderParts(ladder).map((part, k) => {
                if (!("params" in part) || k === 0) return part;
                const { resistance } = z.object({ resistance: z.number() }).parse(part.params);
                return { ...part, params: { resistance: resistance * factor(k - 1), tolerance } };
              }),
            ).circuit;
          const circuit = scaled(() => 1, 0.05);
          const at = (factor: (k: number) => number) =>
            solveCircuit(scaled(factor, 0)).conditions[0]?.nets ?? {};
          const corners = Array.from({ length: 2 ** (2 * ladder.rungs.length) }, (_, corner) =>
            at((k) => ((corner >> k) & 1 ? 1.05 : 0.95)),
          );
          const sample = at((k) => 1 + 0.05 * (places[k] ?? 0));
          ladder.rungs.forEach((_, k) => {
            const [low, high] = bandOf(circuit, "Nominal", `N${k}`) ?? [Number.NaN, Number.NaN];
            const ends = corners.map((nets) => nets[`N${k}`] ?? Number.NaN);
            expect(low).toBeCloseTo(Math.min(...ends), 9);
            expect(high).toBeCloseTo(Math.max(...ends), 9);
            expect(sample[`N${k}`]).toBeGreaterThanOrEqual(low - 1e-9);
            expect(sample[`N${k}`]).toBeLessThanOrEqual(high + 1e-9);
          });
        },
      ),
      { numRuns: 15 },
    );
  });

  it("takes drift in: random beside the tolerance, bias to one side", () => {
    const drift = { bias: 0.02, random: 0.01 };
    const { circuit } = circuitOf([
      source(10),
      resistor("R1", "IN", "OUT", "10k"),
      resistor("R2", "OUT", "GND", "10k", {
        params: { resistance: "10k", tolerance: 0.01 },
        drift,
      }),
    ]);
    // R2 from 1 + 0.02 - 0.02 to 1 + 0.02 + 0.02 of 10 kΩ.
    const [low, high] = bandOf(circuit, "Nominal", "OUT") ?? [];
    expect(low).toBeCloseTo((10 * 1) / 2, 9);
    expect(high).toBeCloseTo((10 * 1.04) / 2.04, 9);
  });
});
