import { describe, expect, it } from "vitest";
import { solvedOnly, type WrittenPart } from "./random-networks";

const rail = (volts: number): WrittenPart => ({
  ref: "V1",
  kind: "voltageSource",
  pins: { plus: "VCC", minus: "GND" },
  params: { dc: volts },
});
const resistor = (ref: string, a: string, b: string, resistance: number): WrittenPart => ({
  ref,
  kind: "resistor",
  pins: { 1: a, 2: b },
  params: { resistance },
});
const npn = (ref: string, collector: string, base: string, emitter: string): WrittenPart => ({
  ref,
  kind: "bjt",
  pins: { collector, base, emitter },
  params: { polarity: "npn" },
});

describe("operating points of nonlinear circuits", () => {
  it("drives a chain of ten diodes", () => {
    const chain = Array.from({ length: 10 }, (_, k) => ({
      ref: `D${k}`,
      kind: "diode",
      pins: { anode: `N${k}`, cathode: k === 9 ? "GND" : `N${k + 1}` },
    }));
    const solved = solvedOnly([rail(12), resistor("R1", "VCC", "N0", 1000), ...chain]);
    expect(solved.status).toBe("solved");
    const each = (solved.nets["N0"] ?? Number.NaN) / 10;
    const current = (12 - 10 * each) / 1000;
    // Shockley's law read backwards, at 25 °C.
    expect(each).toBeCloseTo(0.025692579 * Math.log(current / 1e-14 + 1), 6);
  });

  it("holds a flip-flop where the condition starts it", () => {
    const flipFlop = [
      rail(5),
      resistor("R1", "VCC", "Q", 1000),
      resistor("R2", "VCC", "QN", 1000),
      resistor("R3", "Q", "B2", 10_000),
      resistor("R4", "QN", "B1", 10_000),
      npn("Q1", "Q", "B1", "GND"),
      npn("Q2", "QN", "B2", "GND"),
    ];
    const started = (nets: object) =>
      solvedOnly(flipFlop, { conditions: [{ name: "Held", start: { nets } }] }).nets["Q"];
    expect(started({ Q: 5, QN: 0 })).toBeGreaterThan(4);
    expect(started({ Q: 0, QN: 5 })).toBeLessThan(0.3);
  });

  it("heats a resistor-fed transistor until power and temperature agree", () => {
    const solved = solvedOnly(
      [
        rail(10),
        resistor("R1", "VCC", "B", 100_000),
        { ...npn("Q1", "VCC", "B", "GND"), thermal: { junctionToAmbient: 100 } },
      ],
      { conditions: [{ name: "Warm", ambient: 25, selfHeating: true }] },
    );
    const part = solved.parts["Q1"];
    expect(part?.temperature).toBeCloseTo(25 + 100 * (part?.power ?? Number.NaN), 5);
    expect(part?.temperature).toBeGreaterThan(30);
  });

  it("finds a long chain of saturated and linear amplifiers", () => {
    const stages = Array.from({ length: 8 }, (_, k) => [
      {
        ref: `U${k}`,
        kind: "opAmp",
        pins: {
          inPlus: k === 0 ? "IN" : `O${k - 1}`,
          inMinus: `F${k}`,
          out: `O${k}`,
          supplyPlus: "VCC",
          supplyMinus: "GND",
        },
      },
      resistor(`RA${k}`, `O${k}`, `F${k}`, 10_000),
      resistor(`RB${k}`, `F${k}`, "GND", 10_000),
    ]).flat();
    const solved = solvedOnly([
      rail(12),
      { ref: "V2", kind: "voltageSource", pins: { plus: "IN", minus: "GND" }, params: { dc: 0.5 } },
      ...stages,
    ]);
    expect(solved.status).toBe("solved");
    expect(solved.nets["O0"]).toBeCloseTo(1, 3);
    expect(solved.nets["O1"]).toBeCloseTo(2, 3);
    expect(solved.nets["O7"]).toBeCloseTo(12, 6);
  });

  it("keeps a comparator between its thresholds low, and high where it was started so", () => {
    const between = [
      rail(5),
      {
        ref: "V2",
        kind: "voltageSource",
        pins: { plus: "IN", minus: "GND" },
        params: { dc: 0.01 },
      },
      {
        ref: "U1",
        kind: "comparator",
        pins: { inPlus: "IN", inMinus: "GND", out: "OUT", supplyPlus: "VCC", supplyMinus: "GND" },
        params: { hysteresis: 0.1 },
      },
      resistor("R1", "OUT", "GND", 10_000),
    ];
    const out = (more: object) =>
      solvedOnly(between, { conditions: [{ name: "One", ...more }] }).nets["OUT"];
    expect(out({})).toBeCloseTo(0, 6);
    expect(out({ start: { nets: { OUT: 5 } } })).toBeCloseTo(5, 6);
    expect(out({ set: { "V2.dc": 0.06 } })).toBeCloseTo(5, 6);
    expect(out({ set: { "V2.dc": -0.06 }, start: { nets: { OUT: 5 } } })).toBeCloseTo(0, 6);
  });
});
