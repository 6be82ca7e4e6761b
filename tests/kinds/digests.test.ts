import { readFileSync } from "node:fs";
import fc from "fast-check";
import { describe, expect, it } from "vitest";
import type { Circuit } from "../../lib/kinds/circuit";
import { readCircuitFile } from "../../lib/kinds/read-circuit";
import { divider, resistor, source, withParts } from "./divider";

const demo: unknown = JSON.parse(
  readFileSync(new URL("../kept/ffc-2-A.json", import.meta.url), "utf8"),
);

const circuitOf = (file: unknown): Circuit => {
  const read = readCircuitFile(file);
  if (!read.ok) throw new Error(JSON.stringify(read.error));
  return read.value;
};

/** The same JSON with the keys of every object in another order. */
function shuffled(value: unknown, draw: () => number): unknown {
  if (Array.isArray(value)) return value.map((item) => shuffled(item, draw));
  if (typeof value !== "object" || value === null) return value;
  const entries = Object.entries(value).map(
    ([key, member]) => [draw(), key, shuffled(member, draw)] as const,
  );
  entries.sort(([left], [right]) => left - right);
  return Object.fromEntries(entries.map(([, key, member]) => [key, member]));
}

const one = (more: Readonly<Record<string, unknown>>): Circuit =>
  circuitOf(withParts(source, resistor("R1", "IN", "GND", more)));

describe("the digests", () => {
  it("do not depend on the order of keys, nor does anything read but that order", () => {
    const before = circuitOf(demo);
    fc.assert(
      fc.property(fc.infiniteStream(fc.nat()), (stream) => {
        const after = circuitOf(shuffled(demo, () => stream.next().value ?? 0));
        expect(after).toEqual(before);
      }),
      { numRuns: 20 },
    );
  });

  it("the electrical one reads values, the other the file as written", () => {
    const [text, number] = [one({}), one({ params: { resistance: 4700 } })];
    expect(text.electricalDigest).toBe(number.electricalDigest);
    expect(text.digest).not.toBe(number.digest);
  });

  it("the electrical one writes a tolerance letter out", () => {
    const letter = one({ params: { resistance: "4K7J" } }).electricalDigest;
    expect(letter).toBe(one({ params: { resistance: 4700, tolerance: "5 %" } }).electricalDigest);
    expect(letter).not.toBe(one({}).electricalDigest);
  });

  it.each([{ note: "hot" }, { id: "a1" }, { at: [10, 20] }, { turn: 1 }, { mirror: true }])(
    "the electrical one leaves out %j",
    (more) => {
      expect(one(more).electricalDigest).toBe(one({}).electricalDigest);
      expect(one(more).digest).not.toBe(one({}).digest);
    },
  );

  it.each([
    { ratings: { power: 1 } },
    { style: "film-chip" },
    { temperature: 30 },
    { drift: { bias: 0.01 } },
    { fitted: false },
    { pins: { "1": "GND", "2": "IN" } },
  ])("the electrical one has %j in", (more) => {
    expect(one(more).electricalDigest).not.toBe(one({}).electricalDigest);
  });

  it("the electrical one leaves out title, wires and sheet, and has limits in", () => {
    const bare = circuitOf(divider()).electricalDigest;
    expect(circuitOf(divider({ title: "A" })).electricalDigest).toBe(bare);
    const main = {
      parts: [source, resistor("R1", "IN", "OUT"), resistor("R2", "OUT", "GND")],
      wires: [{ a: { part: "R1", pin: "2" }, b: { junction: "j1" } }],
      sheet: {
        size: "A3",
        junctions: { j1: [5, 5] },
        labels: [{ shape: "name", net: "OUT", at: [5, 6], end: { junction: "j1" } }],
        texts: [{ at: [1, 1], text: "Divider", style: "heading" }],
      },
    };
    expect(circuitOf(divider({ blocks: { main } })).electricalDigest).toBe(bare);
    const limits = [{ net: "OUT", min: 1 }];
    expect(circuitOf(divider({ limits })).electricalDigest).not.toBe(bare);
  });
});
