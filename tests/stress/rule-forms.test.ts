import { describe, expect, it } from "vitest";
import { judge } from "../../lib/stress/judge";
import { acrossSource, capacitor, resistor, reversed, rowOf } from "./one-part";

const part = { params: { resistance: "1k" }, ratings: { power: 0.25, voltage: 200 } };

/** The verdict of one rule of the file's own on R1, 10 V across 1 kΩ: 0.1 W. */
function own(rule: object, given: object = part) {
  const rules = [{ id: "own", kinds: ["resistor"], quantity: "power", ...rule }];
  const policy = { use: "common-practice", rules };
  return rowOf(acrossSource(10, [resistor(given)], { policy }), "own");
}

describe("each form of rule, worked by hand on 0.1 W", () => {
  it("ratio: 0.25 W times 0.5", () => {
    const row = own({ form: "ratio", rating: "power", points: [[25, 0.5]] });
    expect(row).toMatchObject({ limit: 0.125, verdict: "pass", rated: 0.25 });
    expect(row?.margin).toBeCloseTo(0.25, 12);
  });

  it("ceiling: a value, or another applied quantity", () => {
    expect(own({ form: "ceiling", value: 0.08 })).toMatchObject({ limit: 0.08, verdict: "fail" });
    // 0.1 W against 10 V: units aside, the applied voltage is the ceiling.
    const other = own({ form: "ceiling", valueFrom: "applied:voltage" });
    expect(other).toMatchObject({ limit: 10, verdict: "pass", rated: null, ratio: null });
    expect(own({ form: "ceiling", valueFrom: "applied:nothing" })).toMatchObject({
      verdict: "unknown",
      needs: ["applied:nothing"],
    });
  });

  it("belowRating: 0.25 W less 0.2 W", () => {
    const row = own({ form: "belowRating", rating: "power", value: 0.2 });
    expect(row?.limit).toBeCloseTo(0.05, 12);
    expect(row?.margin).toBeCloseTo(-0.5, 12);
    expect(row?.verdict).toBe("fail");
  });

  it("lowerOf: the least of its terms, and unknown while one is missing", () => {
    const terms = [
      { form: "ceiling", value: 0.2 },
      { form: "ratio", rating: "power", points: [[25, 0.6]] },
    ];
    expect(own({ form: "lowerOf", terms })?.limit).toBeCloseTo(0.15, 12);
    const bare = { params: { resistance: "1k" } };
    expect(own({ form: "lowerOf", terms }, bare)).toMatchObject({
      verdict: "unknown",
      limit: null,
      needs: ["rating power"],
    });
  });

  it("formula: over ratings, parameters and another rule's limit", () => {
    const uses = ["rating:power", "param:resistance"];
    // 0.8 * 0.25 / 1000 + 0.1
    const row = own({ form: "formula", expression: "0.8 * ratedPower / resistance + 0.1", uses });
    expect(row?.limit).toBeCloseTo(0.1002, 12);
    const unread = { form: "formula", expression: "resistance(", uses: ["param:resistance"] };
    expect(own(unread)?.verdict).toBe("unknown");
    const bad = { form: "formula", expression: "colour", uses: ["param:colour", "rule:none"] };
    expect(own(bad)?.needs).toEqual(["parameter colour", "rule none"]);
  });

  it("band: 0.25 W from 0.3 to 0.5 of it; the nearer bound is the limit", () => {
    const row = own({ form: "band", rating: "power", band: [0.3, 0.5] });
    expect(row).toMatchObject({ verdict: "pass", limit: 0.125 });
    expect(row?.margin).toBeCloseTo(0.25, 12);
    const under = own({ form: "band", rating: "power", band: [0.5, 0.9] });
    expect(under).toMatchObject({ verdict: "fail", limit: 0.125 });
    expect(under?.margin).toBeCloseTo(-0.2, 12);
  });

  it("fails strictly below where the rule says so, and meets a plain limit exactly", () => {
    const limit = { form: "ceiling", value: 10 };
    const rule = { quantity: "voltage", ...limit };
    expect(own(rule)).toMatchObject({ applied: 10, limit: 10, margin: 0, verdict: "pass" });
    expect(own({ ...rule, compare: "<" })).toMatchObject({ margin: 0, verdict: "fail" });
  });

  it("keeps advice from failing, but shows its margin", () => {
    const row = own({ form: "ceiling", value: 0.05, severity: "advice" });
    expect(row?.verdict).toBe("pass");
    expect(row?.margin).toBeCloseTo(-0.5, 12);
  });

  it("fails any stress against a limit of zero", () => {
    const points = [
      [25, 1],
      [26, 0],
    ];
    const rules = [
      {
        id: "own",
        kinds: ["resistor"],
        quantity: "power",
        form: "ratio",
        rating: "power",
        points,
        beyond: "zero",
      },
    ];
    const circuit = acrossSource(1e-3, [resistor(part)], {
      conditions: [{ name: "Hot", ambient: 80 }],
      policy: { use: "common-practice", rules },
    });
    expect(rowOf(circuit, "own")).toMatchObject({ limit: 0, verdict: "fail", margin: -1 });
  });
});

describe("what is missing", () => {
  it("is said by name: a rating, a style, a thermal resistance", () => {
    const bare = { params: { resistance: "1k" } };
    expect(own({ form: "ratio", rating: "power", points: [[25, 1]] }, bare)).toMatchObject({
      verdict: "unknown",
      margin: null,
      needs: ["rating power"],
    });
    const cold = reversed("diode", { ratings: { junctionTemperature: 150, reverseVoltage: 100 } });
    expect(rowOf(acrossSource(5, [cold]), "cp-diode-junction")).toMatchObject({
      verdict: "unknown",
      applied: null,
      needs: ["thermal junctionToAmbient"],
    });
  });

  it("a part that only a style's rules could judge is asked for its style, ratings or not", () => {
    const policy = { use: "mil-std-975m" };
    for (const ratings of [{}, { voltage: 50 }]) {
      const given = capacitor({ params: { capacitance: "1u" }, ratings });
      const rows = judge(acrossSource(5, [given], { policy })).stress;
      expect(rows.length).toBeGreaterThan(0);
      for (const row of rows) {
        expect(row.verdict).toBe("unknown");
        expect(row.needs).toContain("style");
      }
    }
  });
});

describe("a policy", () => {
  it("with variants judges by the chosen one alone, and by none where none is chosen", () => {
    const diode = reversed("diode", {
      style: "general-purpose",
      ratings: { reverseVoltage: 100, forwardCurrent: 1, surgeCurrent: 1 },
    });
    const rows = (variant?: object) =>
      judge(acrossSource(5, [diode], { policy: { use: "navy-sd-18", variant } })).stress;
    const reverse = (environment: string, qualityLevel: number) =>
      rows({ environment, qualityLevel }).filter(({ quantity }) => quantity === "reverseVoltage");
    // Navy SD-18, discrete semiconductors, general-purpose row.
    expect(reverse("protected", 1).map(({ limit }) => limit)).toEqual([95]);
    expect(reverse("severe", 2).map(({ limit }) => limit)).toEqual([50]);
    expect(rows()).toEqual([]);
    expect(rows({ environment: "protected" })).toEqual([]);
  });

  it("takes a file's rule beside its own under a new id", () => {
    const rules = [
      { id: "own", kinds: ["resistor"], quantity: "current", form: "ceiling", value: 1 },
    ];
    const policy = { use: "common-practice", rules };
    const { stress } = judge(acrossSource(10, [resistor(part)], { policy }));
    expect(stress.map(({ rule }) => rule.id)).toEqual(["cp-res-power", "cp-res-voltage", "own"]);
    expect(stress[2]?.rule).toMatchObject({ status: "given in the circuit file" });
  });
});
