import { describe, expect, it } from "vitest";
import { judge } from "../../lib/stress/judge";
import { acrossSource, resistor, reversed } from "./one-part";

const top = {
  ref: "R1",
  kind: "resistor",
  pins: { "1": "A", "2": "OUT" },
  params: { resistance: 1000 },
};
const bottom = { ...top, ref: "R2", pins: { "1": "OUT", "2": "GND" } };

function rows(limits: readonly object[], condition: object = {}) {
  const conditions = [{ name: "Only", ...condition }];
  return judge(acrossSource(10, [top, bottom], { limits, conditions })).limits;
}

describe("a limit", () => {
  it("at an operating point counts its bounds in", () => {
    expect(rows([{ net: "OUT", min: 5, max: 5 }])).toMatchObject([
      { net: "OUT", condition: "Only", low: 5, high: 5, verdict: "pass" },
    ]);
    expect(rows([{ net: "OUT", max: 4.999 }])[0]?.verdict).toBe("fail");
    expect(rows([{ between: ["A", "OUT"], min: 5.001 }])).toMatchObject([
      { between: ["A", "OUT"], low: 5, high: 5, verdict: "fail" },
    ]);
    expect(rows([{ part: "R1", quantity: "power", max: "30 mW" }])[0]).toMatchObject({
      verdict: "pass",
      high: expect.closeTo(0.025, 12),
    });
  });

  it("on a part bounds the very quantity it names", () => {
    const zener = reversed("zener", {
      params: { breakdownVoltage: 10 },
      thermal: { junctionToAmbient: 100 },
    });
    const of = (quantity: string) =>
      judge(acrossSource(10, [zener], { limits: [{ part: "D1", quantity, max: 5 }] })).limits[0];
    expect(of("junctionTemperature")).toMatchObject({
      low: expect.closeTo(26, 6),
      verdict: "fail",
    });
    expect(of("reverseVoltage")).toMatchObject({ high: 10, verdict: "fail" });
    expect(of("voltage")).toMatchObject({ high: -10, verdict: "pass" });
    expect(of("current")).toMatchObject({ high: expect.closeTo(-1e-3, 9), verdict: "pass" });
    // A diode has no collector: nothing is known, and unknown is no pass.
    expect(of("collectorCurrent")).toMatchObject({ high: null, verdict: "unknown" });
  });

  it("in a sweep takes the extremes, wherever they stand", () => {
    const analysis = { type: "sweep", of: "V1.dc", from: -4, to: 8, points: 13 };
    const limits = [
      { net: "OUT", max: 3.9 },
      { between: ["OUT", "A"], min: -4.1 },
    ];
    const [net, between] = rows(limits, { analysis });
    expect(net).toMatchObject({ low: -2, high: 4, verdict: "fail" });
    expect(between).toMatchObject({ low: -4, high: 2, verdict: "pass" });
  });

  it("between two nets of a transient takes the difference at each moment, not of the extremes", () => {
    const set = { "V1.waveform": { step: { from: 0, to: 10, at: "1 ms" } } };
    const transient = (record?: readonly string[]) => ({
      set,
      analysis: { type: "transient", until: "2 ms", ...(record && { record }) },
    });
    const limit = { between: ["A", "OUT"], max: 5.001 };
    // The extremes would allow 10 V - 0 V.
    expect(rows([limit], transient())[0]).toMatchObject({ low: 0, verdict: "pass" });
    expect(rows([limit], transient())[0]?.high).toBeCloseTo(5, 9);
    // Against the reference, which stands still, the extremes suffice; else nothing is known.
    const over = { between: ["OUT", "GND"], max: 4 };
    expect(rows([over], transient(["A"]))[0]).toMatchObject({ verdict: "fail" });
    expect(rows([over], transient(["A"]))[0]?.high).toBeCloseTo(5, 9);
    expect(rows([limit], transient(["OUT"]))[0]).toMatchObject({ high: null, verdict: "unknown" });
  });

  it("holds in its own condition alone, else in every one", () => {
    const conditions = [{ name: "One" }, { name: "Two", set: { "V1.dc": 20 } }];
    const limits = [
      { net: "OUT", max: 6 },
      { net: "OUT", max: 5, condition: "One" },
    ];
    const found = judge(acrossSource(10, [top, bottom], { limits, conditions })).limits;
    expect(found.map(({ condition, verdict }) => `${condition} ${verdict}`)).toEqual([
      "One pass",
      "Two fail",
      "One pass",
    ]);
  });

  it("of a condition without a solution is unknown, and the other conditions are judged", () => {
    const second = {
      ref: "V2",
      kind: "voltageSource",
      pins: { plus: "B", minus: "GND" },
      params: { dc: 3 },
    };
    const link = {
      ref: "S1",
      kind: "switch",
      pins: { "1": "A", "2": "B" },
      params: { closedResistance: 0 },
    };
    const conditions = [{ name: "Open" }, { name: "Closed", set: { "S1.closed": true } }];
    const circuit = acrossSource(10, [resistor({ params: { resistance: 10 } }), second, link], {
      conditions,
      limits: [{ net: "A", max: 20 }],
    });
    expect(judge(circuit).limits).toMatchObject([
      { condition: "Open", verdict: "pass" },
      { condition: "Closed", verdict: "unknown", low: null, high: null },
    ]);
  });
});
