import { describe, expect, it } from "vitest";
import type { StressRow } from "../../lib/stress/circuit-result";
import { judge } from "../../lib/stress/judge";
import { formulaValue } from "../../lib/stress/rules/formula";
import { piecewise } from "../../lib/stress/rules/ratio";
import { demoRevision, sideOf } from "../demo-revisions";

/** One resistor across a source, judged by a policy at one temperature. */
function resistorRows(given: {
  readonly part: object;
  readonly volts: number;
  readonly ambient: number;
  readonly policy: object;
}): readonly StressRow[] {
  const { circuit } = sideOf({
    ampersign: 1,
    blocks: {
      main: {
        parts: [
          {
            ref: "V1",
            kind: "voltageSource",
            pins: { plus: "A", minus: "GND" },
            params: { dc: given.volts },
          },
          { ref: "R1", kind: "resistor", pins: { "1": "A", "2": "GND" }, ...given.part },
        ],
      },
    },
    conditions: [{ name: "Only", ambient: given.ambient }],
    policy: given.policy,
  });
  return judge(circuit).stress;
}

const rule = (rows: readonly StressRow[], id: string): StressRow | undefined =>
  rows.find((row) => row.rule.id === id);

// MIL-STD-975M (NASA), 1994, Appendix A, 3.11 resistors; film chip from memory, the rest seen second-hand.
describe("MIL-STD-975M, Appendix A, 3.11", () => {
  const chip = {
    params: { resistance: "10k" },
    ratings: { power: "0.25 W", voltage: "200 V" },
    style: "film-chip",
  };
  const policy = { use: "mil-std-975m" };

  it("allows a film chip of 0.25 W 75 mW at 94 °C, and nothing from 118 °C", () => {
    const warm = rule(
      resistorRows({ part: chip, volts: 10, ambient: 94, policy }),
      "res-film-chip-power",
    );
    expect(warm?.limit).toBeCloseTo(0.075, 12);
    const hot = rule(
      resistorRows({ part: chip, volts: 10, ambient: 118, policy }),
      "res-film-chip-power",
    );
    expect(hot?.limit).toBeCloseTo(0, 12);
    expect(hot?.verdict).toBe("fail");
  });

  it("takes for the voltage the lower of 0.8 of the rating and what the power allows", () => {
    const row = rule(resistorRows({ part: chip, volts: 10, ambient: 70, policy }), "res-voltage");
    expect(row?.limit).toBeCloseTo(Math.sqrt(0.15 * 10_000), 9);
    expect(row?.limit).toBeCloseTo(38.7, 1);
  });

  it("says what the policy leaves open instead of passing it", () => {
    const bare = { ...chip, ratings: { power: "0.25 W" } };
    const row = rule(resistorRows({ part: bare, volts: 10, ambient: 70, policy }), "res-voltage");
    expect(row?.verdict).toBe("unknown");
    expect(row?.needs).toContain("rating voltage");
    expect(row?.margin).toBeNull();
  });
});

describe("rule forms", () => {
  it("interpolates, holds before the first point, and ends as the rule says", () => {
    const points = [
      [70, 0.5],
      [110, 0.3],
    ] as const;
    expect(piecewise(points, "held", 90)).toBeCloseTo(0.4, 12); // solid tantalum at 90 °C, 16 V: 6.4 V
    expect(piecewise(points, "held", -40)).toBe(0.5);
    expect(piecewise(points, "zero", 111)).toBe(0);
    expect(piecewise(points, "held", 111)).toBe(0.3);
    expect(piecewise(points, "notEvaluated", 111)).toBeNull();
    expect(piecewise([[25, 0.8]], "held", 300)).toBe(0.8);
  });

  it("reads a formula and runs nothing else", () => {
    const values = new Map([
      ["ratedPower", 0.25],
      ["resistance", 10_000],
    ]);
    expect(formulaValue("0.8 * sqrt(ratedPower * resistance)", values)).toBeCloseTo(40, 12);
    expect(
      formulaValue("50 K * dissipationConstant", new Map([["dissipationConstant", 0.002]])),
    ).toBeCloseTo(0.1, 12);
    expect(formulaValue("process.exit(1)", values)).toBeNull();
    expect(formulaValue("ratedPower +", values)).toBeNull();
    expect(formulaValue("ratedPower / 0", values)).toBeNull();
  });

  it("lets a file's own rule replace a published one by its id", () => {
    const own = {
      id: "cp-res-power",
      kinds: ["resistor"],
      quantity: "power",
      form: "ratio",
      rating: "power",
      points: [[25, 0.1]],
    };
    const part = { params: { resistance: "1k" }, ratings: { power: "0.25 W", voltage: "200 V" } };
    const rows = resistorRows({
      part,
      volts: 5,
      ambient: 25,
      policy: { use: "common-practice", rules: [own] },
    });
    expect(rule(rows, "cp-res-power")?.limit).toBeCloseTo(0.025, 12);
    expect(rows.filter((row) => row.rule.id === "cp-res-power")).toHaveLength(1);
  });
});

describe("the demo under common practice (no source)", () => {
  const failing = (letter: "A" | "B" | "C") =>
    judge(demoRevision(letter).circuit)
      .stress.filter((row) => row.verdict !== "pass")
      .map((row) => `${row.part} ${row.quantity}, ${row.condition}: ${row.verdict}`);

  it("holds everywhere in A and B but at K1's coil in Cold crank", () => {
    expect(failing("A")).toEqual(["K1 voltage, Cold crank: fail"]);
    expect(failing("B")).toEqual(["K1 voltage, Cold crank: fail"]);
  });

  it("has Q1's junction over its derated limit in C, hot and charging; -9 % with K1's tempco at zero", () => {
    expect(failing("C")).toEqual([
      "Q1 junctionTemperature, Hot and charging: fail",
      "K1 voltage, Cold crank: fail",
    ]);
    const { circuit } = demoRevision("C", { K1: { tempco: 0 } });
    const row = rule(
      judge(circuit).stress.filter(({ part }) => part === "Q1"),
      "cp-transistor-junction",
    );
    expect(row?.applied).toBeCloseTo(138, 0);
    expect(row?.margin).toBeCloseTo(-0.09, 2);
  });

  it("judges a limit in a transient by its extremes", () => {
    const row = judge(demoRevision("C").circuit).limits.find(
      ({ condition }) => condition === "Relay drop-out",
    );
    expect(row).toMatchObject({ net: "RLY", verdict: "pass" });
    expect(row?.high).toBeGreaterThan(12.5);
    expect(row?.low).toBeLessThan(0.2);
  });
});

it("never passes what has no solution", () => {
  const { circuit } = sideOf({
    ampersign: 1,
    blocks: {
      main: {
        parts: [
          { ref: "I1", kind: "currentSource", pins: { from: "GND", to: "A" }, params: { dc: 1 } },
          {
            ref: "R1",
            kind: "resistor",
            pins: { "1": "B", "2": "GND" },
            params: { resistance: 10 },
            ratings: { power: 1, voltage: 1 },
          },
          {
            ref: "C1",
            kind: "capacitor",
            pins: { "1": "A", "2": "B" },
            params: { capacitance: 1e-6 },
          },
        ],
      },
    },
    limits: [{ net: "A", max: 5 }],
  });
  const { stress, limits } = judge(circuit);
  expect(stress.length).toBeGreaterThan(0);
  for (const row of [...stress, ...limits]) expect(row.verdict).toBe("unknown");
});
