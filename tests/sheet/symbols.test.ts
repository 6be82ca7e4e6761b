import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { catalogue, kinds } from "../../lib/kinds/catalogue";
import { symbols } from "../../lib/kinds/symbols";
import { placeSymbol } from "../../lib/sheet/pin-place";

const turns = fc.constantFrom(0 as const, 1 as const, 2 as const, 3 as const);
const grid = fc.integer({ min: 0, max: 80 }).map((step) => step * 10);

describe("symbols", () => {
  it.each(kinds)("%s has a symbol whose pins are the kind's pins", (kind) => {
    const { pins } = symbols[kind];
    const drawn = pins === "any" ? "any" : Object.keys(pins).sort();
    const known = catalogue[kind].pins;
    expect(drawn).toEqual(known === "any" ? "any" : [...known].sort());
    expect(symbols[kind].strokes.length).toBeGreaterThan(0);
  });

  it("has every pin on the grid and at the edge of the box after any turn", () => {
    fc.assert(
      fc.property(
        fc.constantFrom(...kinds),
        turns,
        fc.boolean(),
        grid,
        grid,
        (kind, turn, mirror, x, y) => {
          const known = catalogue[kind].pins;
          const names = known === "any" ? ["1", "2", "3"] : known;
          const part = {
            ref: "X1",
            kind,
            pins: Object.fromEntries(names.map((name) => [name, "N"])),
          };
          const { pins, box } = placeSymbol(part, { at: [x, y], turn, mirror });
          expect(pins.map(({ name }) => name).sort()).toEqual([...names].sort());
          for (const { at, outward } of pins) {
            expect([Math.abs(at[0] % 10), Math.abs(at[1] % 10)]).toEqual([0, 0]);
            expect(Math.abs(outward[0]) + Math.abs(outward[1])).toBe(1);
            expect(at[0]).toBeGreaterThanOrEqual(box[0]);
            expect(at[0]).toBeLessThanOrEqual(box[2]);
            expect(at[1]).toBeGreaterThanOrEqual(box[1]);
            expect(at[1]).toBeLessThanOrEqual(box[3]);
          }
        },
      ),
    );
  });

  it("comes back to where it was after four quarter turns", () => {
    const pins = { collector: "A", base: "B", emitter: "C" };
    const placed = ([0, 1, 2, 3] as const).map(
      (turn) =>
        placeSymbol({ ref: "Q1", kind: "bjt", pins }, { at: [0, 0], turn, mirror: false }).pins,
    );
    const [first, second] = placed;
    const collector = first?.find(({ name }) => name === "collector")?.at;
    expect(collector).toEqual([10, -20]);
    expect(second?.find(({ name }) => name === "collector")?.at).toEqual([20, 10]);
    expect(new Set(placed.map((one) => JSON.stringify(one))).size).toBe(4);
  });

  it("draws the arrow of a pnp transistor the other way", () => {
    const strokes = (polarity: string) =>
      placeSymbol(
        { ref: "Q1", kind: "bjt", params: { polarity } },
        { at: [0, 0], turn: 0, mirror: false },
      ).strokes;
    expect(strokes("pnp")).not.toEqual(strokes("npn"));
  });

  it("draws a part of no known kind as a box with its pins", () => {
    const part = { ref: "Y1", kind: "gyrator", pins: { a: "N1", b: "N2", c: null } };
    const { pins, strokes } = placeSymbol(part, { at: [100, 100], turn: 0, mirror: false });
    expect(pins.map(({ name }) => name)).toEqual(["a", "b", "c"]);
    expect(strokes.length).toBeGreaterThan(0);
  });
});
