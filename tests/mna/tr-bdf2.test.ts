import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { initialState, reinitialise } from "../../lib/mna/analyses/initial-state";
import { emptyState, STAGE, type State, step } from "../../lib/mna/analyses/tr-bdf2";
import { networkOf } from "../../lib/mna/network";
import { System, unbent } from "../../lib/mna/system";
import { circuitOf, solvedOnly, type WrittenPart } from "./random-networks";

const between = (
  ref: string,
  kind: string,
  nets: [string, string],
  params: object,
): WrittenPart => ({
  ref,
  kind,
  pins: { 1: nets[0], 2: nets[1] },
  params,
});

interface Course {
  /** Voltages of a net by step, the first before any step. */
  readonly volts: readonly number[];
  readonly last: State;
  /** What `step` told of each step, an error of 1 V or 1 A counted as 1. */
  readonly errors: readonly number[];
}

/** Steps of one width from given charges and fluxes. */
function stepped(
  parts: readonly WrittenPart[],
  initial: object,
  net: string,
  width: number,
  count: number,
): Course {
  const written = { type: "transient", until: width * count, from: "rest", initial };
  const circuit = circuitOf(parts, { conditions: [{ name: "Time", analysis: written }] });
  const [condition] = circuit.conditions;
  if (condition?.analysis.type !== "transient") throw new Error("the condition is a transient");
  const system = new System(networkOf(circuit, condition), unbent, null);
  let state = initialState(system, condition.analysis, null);
  if (!reinitialise(system, state, 1e-12 * width)) throw new Error("the circuit has a start");
  const node = system.network.unknowns.ofNet(net);
  const volts = [state.x[node] ?? Number.NaN];
  const errors: number[] = [];
  const middle = emptyState(system);
  let end = emptyState(system);
  for (let k = 0; k < count; k++) {
    errors.push(step(system, state, middle, end, width, state.time + width, () => 1));
    [state, end] = [end, state];
    volts.push(state.x[node] ?? Number.NaN);
  }
  return { volts, last: state, errors };
}

const TAU = 1e-3;
const discharge = [
  between("R1", "resistor", ["A", "GND"], { resistance: 1000 }),
  between("C1", "capacitor", ["A", "GND"], { capacitance: 1e-6 }),
];
const discharged = (width: number, count: number): Course =>
  stepped(discharge, { "C1.voltage": 1 }, "A", width, count);

/** Resistor, inductor and capacitor side by side: 1 mH, 100 nF, 500 Ω. */
const ringing = [
  between("R1", "resistor", ["A", "GND"], { resistance: 500 }),
  between("L1", "inductor", ["A", "GND"], { inductance: 1e-3 }),
  between("C1", "capacitor", ["A", "GND"], { capacitance: 1e-7 }),
];

/** v'' + 2 α v' + ω² v = 0 from 1 V and no current in the inductor: any textbook of circuits; from memory. */
function ringingVoltage(t: number): number {
  const alpha = 1 / (2 * 500 * 1e-7);
  const omega = Math.sqrt(1 / (1e-3 * 1e-7) - alpha * alpha);
  return Math.exp(-alpha * t) * (Math.cos(omega * t) - (alpha / omega) * Math.sin(omega * t));
}

/** How the error falls from one width to half of it, as a power of the width. */
const orders = (errors: readonly number[]): readonly number[] =>
  errors.slice(1).map((error, k) => Math.log2((errors[k] ?? Number.NaN) / error));

/**
 * What one step multiplies the solution of y' = λ y by, z = λ h: both stages of Bank and others (1985)
 * written out.
 */
function amplification(z: number): number {
  const middle = (1 + (STAGE * z) / 2) / (1 - (STAGE * z) / 2);
  const part = 1 / (STAGE * (2 - STAGE));
  return (part * (middle - (1 - STAGE) ** 2)) / (1 - ((1 - STAGE) / (2 - STAGE)) * z);
}

describe("TR-BDF2", () => {
  it("has the order 2 on R and C", () => {
    const errors = [10, 20, 40, 80, 160].map((count) => {
      const { volts } = discharged((2 * TAU) / count, count);
      return Math.abs((volts.at(-1) ?? Number.NaN) - Math.exp(-2));
    });
    for (const order of orders(errors)) expect(Math.abs(order - 2)).toBeLessThan(0.15);
  });

  it("has the order 2 on R, L and C", () => {
    const until = 1.3e-4;
    const errors = [80, 160, 320, 640].map((count) => {
      const { volts } = stepped(ringing, { "C1.voltage": 1 }, "A", until / count, count);
      return Math.max(
        ...volts.map((value, k) => Math.abs(value - ringingVoltage((until * k) / count))),
      );
    });
    for (const order of orders(errors)) expect(Math.abs(order - 2)).toBeLessThan(0.15);
    expect(errors.at(-1)).toBeLessThan(1e-4);
  });

  it("multiplies by its stability function in every step, however wide", () => {
    fc.assert(
      fc.property(fc.double({ min: -3, max: 6, noNaN: true }), (power) => {
        const z = -(10 ** power);
        const { volts } = discharged(-z * TAU, 1);
        const ratio = (volts[1] ?? Number.NaN) / (volts[0] ?? Number.NaN);
        expect(Math.abs(ratio - amplification(z))).toBeLessThan(1e-9);
        expect(Math.abs(ratio)).toBeLessThan(1);
      }),
    );
  });

  it("is L-stable: what a step is too wide for is gone after it, the more the wider", () => {
    for (const power of [2, 3, 4, 5, 6]) {
      const { volts } = discharged(10 ** power * TAU, 1);
      expect(Math.abs(volts[1] ?? Number.NaN)).toBeLessThan(5 / 10 ** power);
    }
  });

  it("gives no energy to L and C, however wide the steps", () => {
    const [, ...lossless] = ringing;
    const energy = (volts: number, amperes: number): number =>
      (1e-7 * volts * volts + 1e-3 * amperes * amperes) / 2;
    const kept = (width: number): number => {
      const initial = { "C1.voltage": 1, "L1.current": 0.01 };
      const { volts, last } = stepped(lossless, initial, "A", width, 20);
      // The inductor's current is the unknown behind the net's.
      return energy(volts.at(-1) ?? Number.NaN, last.x.at(-1) ?? Number.NaN) / energy(1, 0.01);
    };
    expect(kept(1e-7)).toBeCloseTo(1, 6);
    fc.assert(
      fc.property(fc.double({ min: -8, max: 0, noNaN: true }), (power) => {
        expect(kept(10 ** power)).toBeLessThanOrEqual(1 + 1e-9);
      }),
    );
  });

  it("does not ring on a stiff circuit: the fast part is gone after two steps, the slow one is followed", () => {
    // A fast 1 ns beside a slow 1 ms; the fast capacitor starts 4 V off. Steps of 10 µs.
    const stiff = [
      ...discharge,
      between("R2", "resistor", ["A", "B"], { resistance: 1000 }),
      between("C2", "capacitor", ["B", "GND"], { capacitance: 1e-12 }),
    ];
    const { volts } = stepped(stiff, { "C1.voltage": 1, "C2.voltage": 5 }, "B", 1e-5, 100);
    expect(volts[0]).toBeCloseTo(5, 6);
    for (let k = 2; k <= 100; k++)
      expect(Math.abs((volts[k] ?? Number.NaN) - Math.exp(-k / 100)), `${k}`).toBeLessThan(2e-5);
  });

  it("takes few steps over a stiff circuit once its fast part is gone", () => {
    const { status, transient } = solvedOnly(
      [
        ...discharge,
        between("R2", "resistor", ["A", "B"], { resistance: 1000 }),
        between("C2", "capacitor", ["B", "GND"], { capacitance: 1e-12 }),
      ],
      {
        conditions: [
          {
            name: "Time",
            analysis: {
              type: "transient",
              until: "5 ms",
              from: "rest",
              initial: { "C1.voltage": 1, "C2.voltage": 5 },
            },
          },
        ],
      },
    );
    expect(status).toBe("solved");
    // An explicit method is held to about 2 ns: 2.5 million steps.
    expect(transient?.time.length).toBeLessThan(2000);
    expect(transient?.nets["B"]?.at(-1)).toBeCloseTo(Math.exp(-5), 3);
  });

  it("tells the error of a step as it is where the step is small, and its third power", () => {
    const local = [0.04, 0.02, 0.01].map((part) => {
      const { volts, errors } = discharged(part * TAU, 1);
      const exact = (volts[0] ?? Number.NaN) * Math.exp(-part);
      return { told: errors[0] ?? Number.NaN, made: Math.abs((volts[1] ?? Number.NaN) - exact) };
    });
    for (const { told, made } of local) expect(Math.abs(told / made - 1)).toBeLessThan(0.1);
    for (const order of orders(local.map(({ told }) => told)))
      expect(Math.abs(order - 3)).toBeLessThan(0.1);
  });
});
