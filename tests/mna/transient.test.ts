import { describe, expect, it } from "vitest";
import type { TransientResult } from "../../lib/mna/solution";
import { solvedOnly, type WrittenPart } from "./random-networks";

const source = (waveform: object): WrittenPart => ({
  ref: "V1",
  kind: "voltageSource",
  pins: { plus: "IN", minus: "GND" },
  params: { waveform },
});
const resistor = (ref: string, a: string, b: string, resistance: number): WrittenPart => ({
  ref,
  kind: "resistor",
  pins: { 1: a, 2: b },
  params: { resistance },
});
const capacitor = (ref: string, a: string, b: string, capacitance: number): WrittenPart => ({
  ref,
  kind: "capacitor",
  pins: { 1: a, 2: b },
  params: { capacitance },
});

function course(parts: readonly WrittenPart[], analysis: object): TransientResult {
  const solved = solvedOnly(parts, {
    conditions: [{ name: "Time", analysis: { type: "transient", ...analysis } }],
  });
  expect(solved.status).toBe("solved");
  if (solved.transient === null) throw new Error("a transient has a course");
  return solved.transient;
}

/** By a straight line between the stored points. */
function valueAt({ time, nets }: TransientResult, net: string, at: number): number {
  const next = time.findIndex((point) => point >= at);
  const [t0, t1] = [time[next - 1] ?? 0, time[next] ?? 0];
  const [v0, v1] = [nets[net]?.[next - 1] ?? Number.NaN, nets[net]?.[next] ?? Number.NaN];
  return next === 0 ? v1 : v0 + ((v1 - v0) * (at - t0)) / (t1 - t0);
}

function expectRising({ time }: TransientResult, until: number): void {
  expect(time[0]).toBe(0);
  expect(time.at(-1)).toBe(until);
  for (let k = 1; k < time.length; k++)
    expect(time[k] ?? 0).toBeGreaterThan(time[k - 1] ?? Number.POSITIVE_INFINITY);
}

describe("a course in time", () => {
  it("follows R and C through a pulse within 1e-3 of the swing, between stored points too", () => {
    const pulse = { low: 0, high: 1, delay: "1 ms", rise: 0, fall: 0, width: "2 ms" };
    const result = course(
      [source({ pulse }), resistor("R1", "IN", "C", 1000), capacitor("C1", "C", "GND", 1e-7)],
      { until: "6 ms" },
    );
    expectRising(result, 0.006);
    const tau = 1e-4;
    const exact = (t: number): number => {
      if (t < 1e-3) return 0;
      const rise = 1 - Math.exp(-(Math.min(t, 3e-3) - 1e-3) / tau);
      return t < 3e-3 ? rise : rise * Math.exp(-(t - 3e-3) / tau);
    };
    for (let k = 0; k <= 1200; k++) {
      const t = k * 5e-6;
      expect(Math.abs(valueAt(result, "C", t) - exact(t)), `${t} s`).toBeLessThan(1e-3);
    }
    // At a jump the value after it counts, and the one just before is there too.
    const jump = result.time.indexOf(1e-3);
    expect(result.nets["IN"]?.[jump]).toBe(1);
    expect(result.nets["IN"]?.[jump - 1]).toBe(0);
  });

  it("gives least, greatest, effective value and their times", () => {
    const sine = { amplitude: 2, frequency: "1 kHz", offset: 1 };
    const result = course([source({ sine }), resistor("R1", "IN", "GND", 100)], {
      until: "5 ms",
      record: [],
    });
    expect(result.nets).toEqual({});
    const net = result.netExtremes["IN"];
    expect(net?.max).toBeCloseTo(3, 3);
    expect(net?.min).toBeCloseTo(-1, 3);
    expect(net?.rms).toBeCloseTo(Math.sqrt(1 + 2), 2);
    expect(((net?.atMax ?? 0) * 1000) % 1).toBeCloseTo(0.25, 1);
    expect(result.extremes["R1"]?.["power"]?.max).toBeCloseTo(0.09, 4);
  });

  it("keeps charge: two capacitors joined by a switch share it", () => {
    const result = course(
      [
        capacitor("C1", "A", "GND", 1e-6),
        capacitor("C2", "B", "GND", 3e-6),
        {
          ref: "S1",
          kind: "switch",
          pins: { 1: "A", 2: "B" },
          params: { openResistance: 1e15, waveform: { step: { from: 0, to: 1, at: "1 ms" } } },
        },
        resistor("R1", "B", "GND", 1e12),
      ],
      { until: "2 ms", from: "rest", initial: { "C1.voltage": 8 } },
    );
    expect(result.nets["A"]?.[0]).toBeCloseTo(8, 9);
    expect(result.nets["B"]?.[0]).toBeCloseTo(0, 9);
    expect(result.nets["A"]?.at(-1)).toBeCloseTo(2, 6);
    expect(result.nets["B"]?.at(-1)).toBeCloseTo(2, 6);
  });

  it("keeps the energy of an ideal L and C within 1 % over ten periods", () => {
    const result = course(
      [
        { ref: "L1", kind: "inductor", pins: { 1: "A", 2: "GND" }, params: { inductance: 1e-3 } },
        capacitor("C1", "A", "GND", 1e-7),
      ],
      { until: 2 * Math.PI * 1e-4, maxStep: "1 µs", from: "rest", initial: { "L1.current": 0.01 } },
    );
    const late = result.time.map((t, k) => (t > 5.6e-4 ? (result.nets["A"]?.[k] ?? 0) : 0));
    // v = i sqrt(L / C)
    expect(Math.max(...late)).toBeGreaterThan(0.995);
    expect(Math.max(...late)).toBeLessThan(1.005);
  });

  it("starts at the operating point of the waveforms' first values and stays there", () => {
    const step = { from: 3, to: 5, at: 1 };
    const result = course(
      [
        source({ step }),
        resistor("R1", "IN", "C", 1000),
        capacitor("C1", "C", "GND", 1e-6),
        { ref: "D1", kind: "diode", pins: { anode: "C", cathode: "GND" } },
      ],
      { until: "10 ms" },
    );
    const first = result.nets["C"]?.[0] ?? Number.NaN;
    expect(first).toBeGreaterThan(0.6);
    for (const value of result.nets["C"] ?? []) expect(value).toBeCloseTo(first, 9);
  });

  it("switches a comparator with hysteresis at its thresholds", () => {
    const points = [
      [0, -1],
      [1, 1],
      [2, -1],
    ];
    const result = course(
      [
        source({ points }),
        {
          ref: "V2",
          kind: "voltageSource",
          pins: { plus: "VCC", minus: "GND" },
          params: { dc: 5 },
        },
        {
          ref: "U1",
          kind: "comparator",
          pins: {
            inPlus: "IN",
            inMinus: "GND",
            out: "OUT",
            supplyPlus: "VCC",
            supplyMinus: "GND",
          },
          params: { hysteresis: 0.4 },
        },
        resistor("R1", "OUT", "GND", 10_000),
      ],
      { until: 2 },
    );
    expectRising(result, 2);
    const out = result.nets["OUT"] ?? [];
    const up = result.time[out.findIndex((value) => value > 2.5)] ?? Number.NaN;
    const down = result.time[out.findLastIndex((value) => value > 2.5)] ?? Number.NaN;
    // The input is 2 t - 1, then 3 - 2 t: it crosses 0.2 V at 0.6 s and -0.2 V at 1.6 s.
    expect(Math.abs(up - 0.6)).toBeLessThan(4e-3);
    expect(Math.abs(down - 1.6)).toBeLessThan(4e-3);
  });

  it("follows an astable flip-flop: a relaxation oscillator's regenerative jumps", () => {
    const supply = { ref: "V2", kind: "voltageSource", pins: { plus: "VCC", minus: "GND" } };
    const result = course(
      [
        { ...supply, params: { dc: 10 } },
        {
          ref: "U1",
          kind: "comparator",
          pins: { inPlus: "T", inMinus: "C", out: "OUT", supplyPlus: "VCC", supplyMinus: "GND" },
        },
        resistor("R1", "OUT", "T", 10_000),
        resistor("R2", "T", "GND", 10_000),
        resistor("R3", "VCC", "T", 10_000),
        resistor("R4", "OUT", "C", 10_000),
        capacitor("C1", "C", "GND", 1e-7),
      ],
      { until: "10 ms", from: "rest" },
    );
    // Between 1/3 and 2/3 of the supply: each half period is RC ln 2.
    const out = result.nets["OUT"] ?? [];
    const rises = result.time.filter(
      (_, k) => k > 0 && (out[k] ?? 0) > 5 && (out[k - 1] ?? 0) <= 5,
    );
    expect(rises.length).toBeGreaterThan(4);
    const period = (rises.at(-1) ?? 0) - (rises.at(-2) ?? 0);
    expect(Math.abs(period / (2 * 1e-3 * Math.LN2) - 1)).toBeLessThan(0.01);
  });
});
