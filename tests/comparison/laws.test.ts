import { readFileSync } from "node:fs";
import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { z } from "zod";
import { compare } from "../../lib/comparison/compare";
import { readSide } from "../../lib/comparison/read-side";
import { circuitOf, ladderParts, twoLadders } from "./circuits";

const examples = z
  .array(z.object({ id: z.string(), circuit: z.unknown() }))
  .parse(JSON.parse(readFileSync("tests/kept/examples.json", "utf8")));
const sides = examples.flatMap(({ id, circuit }) => {
  const side = readSide(JSON.stringify(circuit));
  return side.ok ? [{ id, side: side.value }] : [];
});

describe("every kept example", () => {
  it("compared with itself has no edit, no shift, no cause", () => {
    expect(sides.length).toBeGreaterThan(100);
    // A transient of hundreds of steps says nothing here that an operating point does not.
    const still = sides.filter(({ side }) =>
      side.circuit.conditions.every(({ analysis }) => analysis.type !== "transient"),
    );
    expect(still.length).toBeGreaterThan(80);
    for (const { id, side } of still) {
      const { edits, nets, stress, causes } = compare(side, side);
      expect({ id, edits, nets, stress, causes }).toEqual({
        id,
        edits: [],
        nets: [],
        stress: [],
        causes: [],
      });
    }
  });
});

describe("a comparison of two random ladders", () => {
  it("read backwards has was and is, shifts and shares exchanged", () => {
    let seen = 0;
    fc.assert(
      fc.property(twoLadders, ([a, b]) => {
        const [base, proposed] = [circuitOf(ladderParts(a)), circuitOf(ladderParts(b))];
        const there = compare(base, proposed);
        const back = compare(proposed, base);
        expect(back.edits.map(({ id }) => id)).toEqual(there.edits.map(({ id }) => id));
        for (const [k, edit] of there.edits.entries())
          expect([back.edits[k]?.was, back.edits[k]?.is]).toEqual([edit.is, edit.was]);
        expect(back.nets.map(({ net }) => net)).toEqual(there.nets.map(({ net }) => net));
        for (const [k, row] of there.nets.entries()) {
          seen += 1;
          expect([back.nets[k]?.was, back.nets[k]?.is]).toEqual([row.is, row.was]);
          expect(back.nets[k]?.shift).toBeCloseTo(-(row.shift ?? Number.NaN), 12);
        }
        for (const cause of there.causes) {
          const mirrored = back.causes.find(
            ({ edit, net }) => edit === cause.edit && net === cause.net,
          );
          expect(mirrored?.share).toBeCloseTo(-cause.share, 9);
        }
      }),
      { numRuns: 40 },
    );
    expect(seen).toBeGreaterThan(40);
  });

  it("shares out every shift: one row for each edit, adding up to the whole", () => {
    let seen = 0;
    fc.assert(
      fc.property(twoLadders, ([a, b]) => {
        const { edits, nets, causes } = compare(
          circuitOf(ladderParts(a)),
          circuitOf(ladderParts(b)),
        );
        for (const { net, shift } of nets) {
          seen += 1;
          const rows = causes.filter((cause) => cause.net === net);
          expect(rows.map(({ edit }) => edit).sort()).toEqual(edits.map(({ id }) => id).sort());
          const sum = rows.reduce((total, { share }) => total + share, 0);
          expect(sum).toBeCloseTo(shift ?? Number.NaN, 9);
        }
      }),
      { numRuns: 40 },
    );
    expect(seen).toBeGreaterThan(40);
  });

  it("with new names for nets and parts has no shift, and says every new name", () => {
    fc.assert(
      fc.property(twoLadders, fc.boolean(), fc.boolean(), ([ladder], nets, parts) => {
        const names = {
          net: (k: number) => (nets ? `NODE${k}` : `N${k}`),
          prefix: parts ? "9" : "",
        };
        const ids = (list: readonly object[]) => list.map((part, k) => ({ ...part, id: `p${k}` }));
        const comparison = compare(
          circuitOf(ids(ladderParts(ladder))),
          circuitOf(ids(ladderParts(ladder, names))),
        );
        expect(comparison).toMatchObject({ nets: [], stress: [], causes: [], problems: [] });
        const count = (change: string) =>
          comparison.edits.filter((edit) => edit.change === change).length;
        expect(count("renamed")).toBe(nets ? ladder.rungs.length : 0);
        expect(count("renumbered")).toBe(parts ? 2 * ladder.rungs.length : 0);
        expect(comparison.edits).toHaveLength(count("renamed") + count("renumbered"));
      }),
      { numRuns: 40 },
    );
  });
});
