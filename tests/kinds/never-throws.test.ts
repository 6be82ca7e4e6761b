import { readFileSync } from "node:fs";
import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { readCircuit, readCircuitFile } from "../../lib/kinds/read-circuit";

const demo: unknown = JSON.parse(
  readFileSync(new URL("../kept/ffc-2-A.json", import.meta.url), "utf8"),
);
const places = placesOf(demo, []);

type Path = readonly (string | number)[];

function placesOf(value: unknown, path: Path): Path[] {
  if (Array.isArray(value)) {
    return [path, ...value.flatMap((item, index) => placesOf(item, [...path, index]))];
  }
  if (typeof value !== "object" || value === null) return [path];
  const below = Object.entries(value).flatMap(([key, member]) => placesOf(member, [...path, key]));
  return [path, ...below];
}

/** The JSON with what stands at a path replaced. */
function replaced(value: unknown, [step, ...rest]: Path, by: unknown): unknown {
  if (step === undefined) return by;
  if (Array.isArray(value)) {
    return value.map((item, index) => (index === step ? replaced(item, rest, by) : item));
  }
  const entries = Object.entries(value ?? {});
  return Object.fromEntries(
    entries.map(([key, member]) => [key, key === step ? replaced(member, rest, by) : member]),
  );
}

/** A pointer leads to something in the file, or a key of something. */
const POINTER = /^(?:\/(?:[^~/]|~[01])*)*$/u;

function isAnswer(read: ReturnType<typeof readCircuit>): boolean {
  if (read.ok) return read.value.conditions.length > 0;
  return read.error.length > 0 && read.error.every(({ message }) => /[.?]$/.test(message));
}

describe("the reader never throws", () => {
  it("whatever the text", () => {
    fc.assert(
      fc.property(fc.string({ unit: "binary" }), (text) => {
        expect(isAnswer(readCircuit(text))).toBe(true);
      }),
    );
  });

  it("whatever the JSON", () => {
    fc.assert(
      fc.property(fc.jsonValue({ maxDepth: 6 }), (value) => {
        expect(isAnswer(readCircuitFile(value))).toBe(true);
      }),
    );
  });

  it("whatever stands in place of one or two of the demo's values", () => {
    const strange = fc.oneof(
      fc.jsonValue({ maxDepth: 3 }),
      fc.constantFrom(
        ...["", "GND", "R1", "R1.resistance", "4k7", "4K7J", "__proto__", "a/b", "block"],
        ...[0, -1, 1e300, null, true, {}, [], [[]], { "": {} }],
      ),
    );
    const change = fc.tuple(fc.constantFrom(...places), strange);
    fc.assert(
      fc.property(fc.array(change, { minLength: 1, maxLength: 2 }), (changes) => {
        const file = changes.reduce((made, [path, by]) => replaced(made, path, by), demo);
        const read = readCircuitFile(file);
        expect(isAnswer(read)).toBe(true);
        for (const { at } of read.ok ? [] : read.error) expect(at).toMatch(POINTER);
      }),
      { numRuns: 1000 },
    );
  });

  it("and tells the same of the text as of the parsed file", () => {
    fc.assert(
      fc.property(fc.constantFrom(...places), fc.jsonValue({ maxDepth: 2 }), (path, by) => {
        const file = replaced(demo, path, by);
        const text = JSON.stringify(file);
        expect(readCircuit(text)).toEqual(readCircuitFile(JSON.parse(text)));
      }),
      { numRuns: 50 },
    );
  });
});
