import fc from "fast-check";
import { describe, expect, it } from "vitest";
import type { Stage } from "../../lib/kinds/law";
import { networkOf } from "../../lib/mna/network";
import { circuitOf, type WrittenPart } from "./random-networks";

const parts: readonly WrittenPart[] = [
  {
    ref: "D1",
    kind: "diode",
    pins: { anode: "A", cathode: "B" },
    params: { junctionCapacitance: 1e-11, transitTime: 1e-8 },
  },
  {
    ref: "D2",
    kind: "zener",
    pins: { anode: "A", cathode: "B" },
    params: { breakdownVoltage: 1.2 },
  },
  {
    ref: "D3",
    kind: "led",
    pins: { anode: "A", cathode: "B" },
    params: { seriesResistance: 2, emissionCoefficient: 2 },
  },
  {
    ref: "Q1",
    kind: "bjt",
    pins: { collector: "A", base: "B", emitter: "C" },
    params: { polarity: "npn", earlyVoltage: 50 },
  },
  {
    ref: "Q2",
    kind: "bjt",
    pins: { collector: "A", base: "B", emitter: "C" },
    params: { polarity: "pnp" },
  },
  {
    ref: "M1",
    kind: "mosfet",
    pins: { drain: "A", gate: "B", source: "C" },
    params: {
      channel: "n",
      thresholdVoltage: 0.4,
      transconductanceFactor: 2e-3,
      channelModulation: 0.02,
      bodyDiode: true,
    },
  },
  {
    ref: "M2",
    kind: "mosfet",
    pins: { drain: "A", gate: "B", source: "C" },
    params: { channel: "p", thresholdVoltage: -0.4, transconductanceFactor: 1e-3 },
  },
  {
    ref: "J1",
    kind: "jfet",
    pins: { drain: "A", gate: "B", source: "C" },
    params: { channel: "n", pinchOffVoltage: -2, saturatedDrainCurrent: 1e-2 },
  },
  {
    ref: "U1",
    kind: "opAmp",
    pins: { inPlus: "A", inMinus: "B", out: "C", supplyPlus: "D", supplyMinus: "E" },
    params: { openLoopGain: 5, outputResistance: 50, dropToPlus: 0.1 },
  },
  {
    ref: "U2",
    kind: "opAmp",
    pins: { inPlus: "A", inMinus: "B", out: "C", supplyPlus: null, supplyMinus: null },
    params: { openLoopGain: 5, slewRate: 1e6 },
  },
  {
    ref: "U3",
    kind: "comparator",
    pins: { inPlus: "A", inMinus: "B", out: "C", supplyPlus: "D", supplyMinus: "E" },
    params: { gain: 5, hysteresis: 0.1 },
  },
  {
    ref: "U4",
    kind: "comparator",
    pins: { inPlus: "A", inMinus: "B", out: "C", supplyPlus: "D", supplyMinus: "E" },
    params: { gain: 5, openCollector: true },
  },
  {
    ref: "X1",
    kind: "lamp",
    pins: { 1: "A", 2: "B" },
    params: { ratedVoltage: 12, ratedPower: 5 },
  },
];

function stage(time: number | null): Stage {
  return {
    time,
    sources: 1,
    helping: 1e-12,
    gainCap: Number.POSITIVE_INFINITY,
    limited: 0,
    switching: false,
    begin: "warm",
  };
}

describe("laws", () => {
  it.each(parts)("$ref $kind: derivatives are those of the currents and charges", (part) => {
    const circuit = circuitOf([part]);
    const [condition] = circuit.conditions;
    if (condition === undefined) throw new Error("a circuit has a condition");
    const { parts: placed, unknowns } = networkOf(circuit, condition);
    const law = placed[0]?.law;
    if (law === undefined) throw new Error("there is a part");
    const at = (x: Float64Array, time: number | null): { f: Float64Array; q: Float64Array } => {
      law.evaluate(x, stage(time));
      return { f: law.f.slice(), q: law.q.slice() };
    };
    // Supplies (D, E) of an amplifier are apart, as in a circuit that works.
    // An output current has a kink at 0, where it changes over from one supply to the other.
    const voltage = fc
      .double({ min: -0.75, max: 0.75, noNaN: true })
      .map((value) => value + (value < 0 ? -1e-2 : 1e-2));
    const unknown = fc.array(voltage, { minLength: unknowns.count, maxLength: unknowns.count });
    fc.assert(
      fc.property(unknown, fc.constantFrom(null, 0), (values, time) => {
        const x = Float64Array.from([0, ...values]);
        if (unknowns.names.some((name) => "net" in name && name.net === "D")) {
          x[unknowns.ofNet("D")] = 5 + (x[unknowns.ofNet("D")] ?? 0);
          x[unknowns.ofNet("E")] = -5 + (x[unknowns.ofNet("E")] ?? 0);
        }
        at(x, time);
        const [g, c] = [law.g.slice(), law.c.slice()];
        for (let column = 1; column < x.length; column++) {
          const h = 1e-6;
          const [up, down] = [x.slice(), x.slice()];
          up[column] = (x[column] ?? 0) + h;
          down[column] = (x[column] ?? 0) - h;
          const [high, low] = [at(up, time), at(down, time)];
          law.terminals.forEach((row, t) => {
            if (row === 0 || law.terminals.indexOf(row) !== t) return;
            let [byF, byQ] = [0, 0];
            law.rows.forEach((own, k) => {
              if (own !== row || law.columns[k] !== column) return;
              byF += g[k] ?? 0;
              byQ += c[k] ?? 0;
            });
            const wanted = ((high.f[t] ?? 0) - (low.f[t] ?? 0)) / (2 * h);
            const charge = ((high.q[t] ?? 0) - (low.q[t] ?? 0)) / (2 * h);
            const size = Math.max(...g.map(Math.abs), 1e-3);
            expect(Math.abs(byF - wanted)).toBeLessThanOrEqual(2e-4 * size);
            expect(Math.abs(byQ - charge)).toBeLessThanOrEqual(
              1e-4 * Math.max(...c.map(Math.abs), 1e-6),
            );
          });
        }
      }),
    );
  });

  it.each(parts)("$ref $kind: what flows in flows out", (part) => {
    const circuit = circuitOf([part]);
    const [condition] = circuit.conditions;
    if (condition === undefined) throw new Error("a circuit has a condition");
    const placed = networkOf(circuit, condition);
    const law = placed.parts[0]?.law;
    const pins = placed.parts[0]?.pins.length ?? 0;
    const voltage = fc.double({ min: -0.7, max: 0.7, noNaN: true });
    const count = placed.unknowns.count;
    fc.assert(
      fc.property(fc.array(voltage, { minLength: count, maxLength: count }), (values) => {
        law?.evaluate(Float64Array.from([0, ...values]), stage(null));
        let [sum, most] = [0, 0];
        law?.terminals.forEach((terminal, t) => {
          if (t >= pins && terminal !== 0) return;
          sum += law.f[t] ?? Number.NaN;
          most = Math.max(most, Math.abs(law.f[t] ?? 0));
        });
        expect(Math.abs(sum)).toBeLessThanOrEqual(1e-12 * most);
      }),
    );
  });
});
