import { describe, expect, it } from "vitest";
import { judge } from "../../lib/stress/judge";
import { acrossSource, capacitor, resistor, reversed, rowOf } from "./one-part";

const zener = reversed("zener", {
  params: { breakdownVoltage: 10 },
  ratings: { power: 1, junctionTemperature: 150 },
  thermal: { junctionToAmbient: 100 },
});
const load = resistor({ params: { resistance: 100 }, ratings: { power: 2, voltage: 100 } });

describe("a junction's temperature", () => {
  it("is ambient + power x junctionToAmbient, its own heating counted once with selfHeating too", () => {
    // 10 V, 1 mA of breakdown: 10 mW over 100 K/W is 1 K.
    for (const selfHeating of [false, true]) {
      const circuit = acrossSource(10, [zener], { conditions: [{ name: "Only", selfHeating }] });
      expect(rowOf(circuit, "cp-diode-junction")?.applied).toBeCloseTo(26, 6);
    }
  });

  it("counts its own heating once in a sweep and in a transient", () => {
    const analyses = [
      { type: "sweep", of: "V1.dc", from: 5, to: 10, points: 3 },
      { type: "transient", until: "1 ms" },
    ];
    for (const analysis of analyses) {
      const circuit = acrossSource(10, [zener], {
        conditions: [{ name: "Only", selfHeating: true, analysis }],
      });
      expect(rowOf(circuit, "cp-diode-junction")?.applied).toBeCloseTo(26, 6);
    }
  });

  it("starts from the part's own temperature where it has one", () => {
    const warm = { ...zener, temperature: 60 };
    for (const selfHeating of [false, true]) {
      const circuit = acrossSource(10, [warm], { conditions: [{ name: "Only", selfHeating }] });
      expect(rowOf(circuit, "cp-diode-junction")?.applied).toBeCloseTo(61, 6);
    }
  });
});

describe("what is applied", () => {
  it("is directed where the direction matters, and a magnitude where it does not", () => {
    const forward = { ref: "D2", kind: "diode", pins: { anode: "A", cathode: "B" } };
    const ratings = { reverseVoltage: 100, forwardCurrent: 1, junctionTemperature: 150 };
    const parts = [
      { ...forward, ratings },
      { ref: "R1", kind: "resistor", pins: { "1": "GND", "2": "B" }, params: { resistance: "1k" } },
    ];
    const { stress } = judge(acrossSource(10, parts));
    const of = (rule: string) => stress.find((row) => row.rule.id === rule)?.applied;
    expect(of("cp-diode-reverse")).toBe(0);
    expect(of("cp-diode-forward")).toBeGreaterThan(5e-3);
    // R1's first pin is at GND: its voltage counts by size.
    expect(of("cp-res-voltage")).toBeGreaterThan(9);
  });

  it("of a polarised capacitor in reverse is a stress of its own (RAC sheet, 0.02 of the rating)", () => {
    const given = capacitor({
      params: { capacitance: "10u" },
      style: "tantalum-solid",
      ratings: { voltage: 50, temperature: 125 },
    });
    const at = (volts: number) =>
      rowOf(
        acrossSource(volts, [given], { policy: { use: "rac-severe" } }),
        "rac-severe-cap-tantalum-solid-reverse",
      );
    expect(at(-2)).toMatchObject({ applied: 2, limit: 1, verdict: "fail" });
    expect(at(10)).toMatchObject({ applied: 0, verdict: "pass" });
  });

  it("is taken over the extremes of a sweep and of a transient", () => {
    const swept = { type: "sweep", of: "V1.dc", from: -12, to: 5, points: 18 };
    const row = (dc: object, analysis: object) =>
      rowOf(
        acrossSource(1, [{ ...load, ...dc }], { conditions: [{ name: "Only", analysis }] }),
        "cp-res-voltage",
      );
    expect(row({}, swept)?.applied).toBeCloseTo(12, 9);
    const moving = { type: "transient", until: "2 ms" };
    const step = { "V1.waveform": { step: { from: 0, to: -30, at: "1 ms" } } };
    const conditions = [{ name: "Only", set: step, analysis: moving }];
    const stepped = rowOf(acrossSource(1, [load], { conditions }), "cp-res-voltage");
    expect(stepped?.applied).toBeCloseTo(30, 9);
  });

  it("of a temperature is the highest, not the farthest from zero", () => {
    const cold = { type: "sweep", of: "ambient", from: -60, to: -10, points: 6 };
    const given = capacitor({
      params: { capacitance: "10u" },
      style: "aluminium-electrolytic",
      ratings: { voltage: 50, temperature: 85 },
    });
    const conditions = [{ name: "Cold", analysis: cold }];
    const row = rowOf(acrossSource(10, [given], { conditions }), "cp-cap-electrolytic-temperature");
    expect(row?.applied).toBeCloseTo(-10, 9);
    expect(row?.verdict).toBe("pass");
  });
});

describe("the temperature a rating is taken at", () => {
  it("is the hottest of a sweep of the ambient", () => {
    const analysis = { type: "sweep", of: "ambient", from: 120, to: 25, points: 5 };
    const circuit = acrossSource(10, [load], { conditions: [{ name: "Only", analysis }] });
    // 1 W applied; at 120 °C of a rule that ends at 125 °C: 2 W x 0.6 x 5 / 55.
    expect(rowOf(circuit, "cp-res-power")?.limit).toBeCloseTo((2 * 0.6 * 5) / 55, 12);
    expect(rowOf(circuit, "cp-res-power")?.verdict).toBe("fail");
  });

  it("is the part's own where it has one", () => {
    const hot = acrossSource(10, [{ ...load, temperature: 120 }]);
    expect(rowOf(hot, "cp-res-power")?.limit).toBeCloseTo((2 * 0.6 * 5) / 55, 12);
  });
});

describe("the row that is shown", () => {
  const at = (name: string, dc: number, ambient = 25) => ({ name, ambient, set: { "V1.dc": dc } });
  const shown = (conditions: readonly object[]) =>
    rowOf(acrossSource(1, [load], { conditions }), "cp-res-power");

  it("is the condition with the least margin", () => {
    expect(shown([at("Low", 1), at("High", 10), at("Middle", 5)])?.condition).toBe("High");
    // The same power, a lower limit.
    expect(shown([at("Cool", 5), at("Warm", 5, 100)])?.condition).toBe("Warm");
    expect(shown([at("Off", 0), at("On", 1)])?.condition).toBe("On");
  });

  it("is a failing one before an unknown one, and an unknown one before any pass", () => {
    const sourcesFight = [
      load,
      {
        ref: "S1",
        kind: "switch",
        pins: { "1": "A", "2": "B" },
        params: { closed: false, closedResistance: 0 },
      },
      { ref: "V2", kind: "voltageSource", pins: { plus: "B", minus: "GND" }, params: { dc: 3 } },
    ];
    const broken = { name: "Broken", set: { "S1.closed": true } };
    const rows = (conditions: readonly object[]) =>
      judge(acrossSource(1, sourcesFight, { conditions })).stress.find(
        ({ rule }) => rule.id === "cp-res-power",
      );
    expect(rows([at("Low", 1), broken])).toMatchObject({
      condition: "Broken",
      verdict: "unknown",
      needs: ["a solution of Broken"],
    });
    expect(rows([broken, at("Over", 20)])).toMatchObject({ condition: "Over", verdict: "fail" });
  });

  it("stands in every condition where asked for, in their order", () => {
    const circuit = acrossSource(1, [load], { conditions: [at("Low", 1), at("High", 10)] });
    const { stress } = judge(circuit, { everyCondition: true });
    expect(
      stress.filter(({ rule }) => rule.id === "cp-res-power").map(({ condition }) => condition),
    ).toEqual(["Low", "High"]);
  });
});
