import { readFileSync } from "node:fs";
import fc from "fast-check";
import { describe, expect, it } from "vitest";
import type { Circuit } from "../../lib/kinds/circuit";
import { readCircuitFile } from "../../lib/kinds/read-circuit";
import { divider, resistor, source } from "./divider";

const demo: unknown = JSON.parse(
  readFileSync(new URL("../kept/ffc-2-A.json", import.meta.url), "utf8"),
);

const circuitOf = (file: unknown): Circuit => {
  const read = readCircuitFile(file);
  if (!read.ok) throw new Error(JSON.stringify(read.error));
  return read.value;
};

/** The JSON with every text and key that is a name given its new name; addresses too. */
function renamed(value: unknown, names: ReadonlyMap<string, string>): unknown {
  const rename = (text: string): string => {
    const [part = "", ...rest] = text.split(".");
    return names.has(part) ? [names.get(part), ...rest].join(".") : text;
  };
  if (typeof value === "string") return rename(value);
  if (Array.isArray(value)) return value.map((item) => renamed(item, names));
  if (typeof value !== "object" || value === null) return value;
  return Object.fromEntries(
    Object.entries(value).map(([key, member]) => [rename(key), renamed(member, names)]),
  );
}

/** What must not change: kinds, parameters and which pins share a net, in file order. */
function structure(circuit: Circuit): unknown {
  const seen = new Map<string, number>();
  const number = (net: string | null): number | null => {
    if (net === null) return null;
    const known = seen.get(net) ?? seen.size;
    seen.set(net, known);
    return known;
  };
  return circuit.conditions.map((condition) =>
    condition.parts.map(({ kind, params, pins }) => ({
      kind,
      params,
      pins: Object.values(pins).map(number),
    })),
  );
}

describe("names carry no meaning", () => {
  it("so that new nets and designators leave parts and connections alone", () => {
    const before = circuitOf(demo);
    const own = [...before.nets, ...before.parts.map((part) => part.path)];
    fc.assert(
      fc.property(fc.shuffledSubarray(own, { minLength: own.length }), (order) => {
        const names = new Map(order.map((name, index) => [name, `${name.slice(0, 1)}_${index}`]));
        expect(structure(circuitOf(renamed(demo, names)))).toEqual(structure(before));
      }),
      { numRuns: 30 },
    );
  });

  it("so that a chain of blocks is the chain of their parts", () => {
    const section = {
      ports: ["A", "B"],
      parts: [resistor("R1", "A", "B"), resistor("R2", "B", "GND")],
    };
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 12 }), (length) => {
        const steps = Array.from({ length }, (_, index) => index);
        const uses = steps.map((index) => ({
          ref: `X${index}`,
          kind: "block",
          block: "section",
          pins: { A: index === 0 ? "IN" : `N${index}`, B: `N${index + 1}` },
        }));
        const byHand = steps.flatMap((index) => [
          resistor(`RA${index}`, index === 0 ? "IN" : `N${index}`, `N${index + 1}`),
          resistor(`RB${index}`, `N${index + 1}`, "GND"),
        ]);
        const main = { parts: [source, ...uses] };
        const nested = circuitOf(divider({ top: "main", blocks: { main, section } }));
        const flat = circuitOf(divider({ blocks: { main: { parts: [source, ...byHand] } } }));
        expect(structure(nested)).toEqual(structure(flat));
        expect(nested.nets).toEqual(flat.nets);
      }),
    );
  });
});
