import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { compare, compareWithNothing } from "../../lib/comparison/compare";
import { shapleyShares } from "../../lib/comparison/shapley";
import { demoRevision, sideOf } from "../demo-revisions";

/** 24 V over R1 and R2, OUT between; each value with a tolerance of 1 %. */
function divider(top: string, bottom: string, names = { out: "OUT", upper: "R1" }) {
  const tolerance = "1 %";
  return sideOf({
    ampersign: 1,
    blocks: {
      main: {
        parts: [
          {
            ref: "V1",
            kind: "voltageSource",
            pins: { plus: "IN", minus: "GND" },
            params: { dc: "24 V" },
          },
          {
            ref: names.upper,
            kind: "resistor",
            pins: { "1": "IN", "2": names.out },
            params: { resistance: top, tolerance },
          },
          {
            ref: "R2",
            kind: "resistor",
            pins: { "1": names.out, "2": "GND" },
            params: { resistance: bottom, tolerance },
          },
        ],
      },
    },
  });
}

describe("a comparison", () => {
  it("of a revision with itself is empty", () => {
    for (const letter of ["A", "B", "C"] as const) {
      const side = demoRevision(letter);
      expect(compare(side, side)).toMatchObject({ edits: [], nets: [], stress: [], causes: [] });
    }
  });

  it("read backwards has was and is exchanged", () => {
    const there = compare(demoRevision("B"), demoRevision("C"));
    const back = compare(demoRevision("C"), demoRevision("B"));
    const key = (row: { net: string; condition: string }) => `${row.net} ${row.condition}`;
    const shifts = new Map(back.nets.map((row) => [key(row), row]));
    expect(there.nets.length).toBeGreaterThan(20);
    expect(back.nets.length).toBe(there.nets.length);
    for (const row of there.nets) {
      const mirrored = shifts.get(key(row));
      expect(mirrored?.was).toBeCloseTo(row.is ?? Number.NaN, 9);
      expect(mirrored?.shift).toBeCloseTo(-(row.shift ?? Number.NaN), 9);
    }
  });

  it("shares out every loud shift among the edits: the shares add up to the whole", () => {
    const { nets, causes } = compare(demoRevision("B"), demoRevision("C"));
    const loud = nets.filter((row) => row.significant || row.crosses.length > 0);
    expect(loud.length).toBeGreaterThan(5);
    for (const { net, condition, shift } of loud) {
      const shares = causes.filter((cause) => cause.net === net && cause.condition === condition);
      const sum = shares.reduce((total, { share }) => total + share, 0);
      expect(sum).toBeCloseTo(shift ?? Number.NaN, 6);
    }
  });

  it("of the demo's B and C names R7 for TREF and K1 for Q1", () => {
    const { nets, causes, edits } = compare(demoRevision("B"), demoRevision("C"));
    expect(edits.map(({ id }) => id)).toEqual([
      "R7.resistance",
      "R9.resistance",
      "K1.resistance",
      "K1.inductance",
      "C3 removed",
    ]);
    const tref = nets.find((row) => row.net === "TREF" && row.condition === "Hot and charging");
    expect(tref).toMatchObject({ significant: true, crosses: ["TREF 5.2 to 5.942"] });
    expect(tref?.shift).toBeCloseTo(0.287, 3);
    const share = (edit: string, of: { net?: string; part?: string; rule?: string }) =>
      causes.find(
        (cause) =>
          cause.edit === edit &&
          cause.condition === "Hot and charging" &&
          cause.net === of.net &&
          cause.part === of.part &&
          cause.rule === of.rule,
      )?.share;
    expect(share("R7.resistance", { net: "TREF" })).toBeCloseTo(0.287, 3);
    expect(share("K1.inductance", { net: "TREF" })).toBe(0);
    const junction = { part: "Q1", rule: "cp-transistor-junction" };
    expect(share("K1.resistance", junction)).toBeLessThan(
      10 * (share("R9.resistance", junction) ?? 0),
    );
  });

  it("says that a renaming and a renumbering are just that", () => {
    const is = divider("10k", "10k", { out: "HALF", upper: "R7" });
    const comparison = compare(divider("10k", "10k"), is);
    expect(comparison.nets).toEqual([]);
    expect(comparison.edits.map(({ change }) => change).sort()).toEqual(["renamed", "renumbered"]);
    expect(comparison.edits.find(({ change }) => change === "renamed")).toMatchObject({
      was: "OUT",
      is: "HALF",
    });
  });

  it("takes 4k7 and 4.7 kΩ for the same value", () => {
    expect(compare(divider("4k7", "10k"), divider("4.7 kΩ", "10k")).edits).toEqual([]);
  });

  it("splits an interaction evenly: two halves worked by hand", () => {
    // 24 V: from 10k/10k (12 V) to 20k/20k (12 V): each alone moves OUT by -4 V and +4 V; together by nothing.
    const { causes } = compare(divider("10k", "10k"), divider("20k", "20k"));
    // No shift, so nothing loud, so nothing to share.
    expect(causes).toEqual([]);
    // To 20k/5k: 24 * 5/25 = 4.8 V. Alone: R1 8 V (-4), R2 8 V (-4); together -7.2: each -3.6.
    const shared = compare(divider("10k", "10k"), divider("20k", "5k")).causes;
    expect(shared.map(({ share }) => share)).toEqual([
      expect.closeTo(-3.6, 9),
      expect.closeTo(-3.6, 9),
    ]);
  });

  it("has the divider's extreme value band: 12 V, 1 % each, from 11.88 to 12.12 V", () => {
    const [row] = compare(divider("10k", "10k"), divider("10k", "10k2")).nets;
    // 24 * 9.9 / (10.1 + 9.9) and 24 * 10.1 / (9.9 + 10.1)
    expect(row?.band?.[0]).toBeCloseTo(11.88, 9);
    expect(row?.band?.[1]).toBeCloseTo(12.12, 9);
    expect(row?.significant).toBe(false);
    expect(compare(divider("10k", "10k"), divider("10k", "10k3")).nets[0]?.significant).toBe(true);
  });

  it("makes every part of a first issue an item", () => {
    const side = demoRevision("A");
    const { edits } = compareWithNothing(side);
    expect(edits).toHaveLength(side.circuit.parts.length);
    expect(new Set(edits.map(({ change }) => change))).toEqual(new Set(["added"]));
  });

  it("still says what can be said when the proposed side has no solution", () => {
    const broken = sideOf({
      ampersign: 1,
      blocks: {
        main: {
          parts: [
            {
              ref: "V1",
              kind: "voltageSource",
              pins: { plus: "IN", minus: "GND" },
              params: { dc: "24 V" },
            },
            {
              ref: "R1",
              kind: "resistor",
              pins: { "1": "IN", "2": "OUT" },
              params: { resistance: "10k", tolerance: "1 %" },
            },
            {
              ref: "V2",
              kind: "voltageSource",
              pins: { plus: "IN", minus: "GND" },
              params: { dc: "5 V" },
            },
          ],
        },
      },
    });
    const comparison = compare(divider("10k", "10k"), broken);
    expect(comparison.edits.map(({ id }) => id).sort()).toEqual(["R2 removed", "V2 added"]);
    expect(comparison.problems.map(({ message }) => message).join()).toContain("proposed");
  });
});

describe("Shapley shares", () => {
  it("add up, give nothing to who does nothing, and alike to who does alike", () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 1, max: 6 }),
        fc.array(fc.double({ min: -10, max: 10, noNaN: true }), { minLength: 64, maxLength: 64 }),
        (players, table) => {
          const idle = players - 1;
          const value = (subset: number): number => table[subset & ~(1 << idle)] ?? 0;
          const shares = shapleyShares(players, value);
          const whole = value((1 << players) - 1) - value(0);
          expect(shares.reduce((sum, share) => sum + share, 0)).toBeCloseTo(whole, 9);
          expect(shares[idle]).toBeCloseTo(0, 12);
        },
      ),
    );
    expect(shapleyShares(3, (subset) => (subset === 7 ? 6 : 0))).toEqual(
      [2, 2, 2].map((n) => expect.closeTo(n, 12)),
    );
  });
});
