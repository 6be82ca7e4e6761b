import { describe, expect, it } from "vitest";
import { solveCircuit } from "../../lib/mna/solve";
import { circuitOf, type WrittenPart } from "./random-networks";

const source = (ref: string, plus: string, minus: string, dc: number): WrittenPart => ({
  ref,
  kind: "voltageSource",
  pins: { plus, minus },
  params: { dc },
});
const resistor = (
  ref: string,
  a: string | null,
  b: string | null,
  resistance = 1000,
): WrittenPart => ({
  ref,
  kind: "resistor",
  pins: { 1: a, 2: b },
  params: { resistance },
});
const current = (ref: string, from: string, to: string, dc: number): WrittenPart => ({
  ref,
  kind: "currentSource",
  pins: { from, to },
  params: { dc },
});
const good = [source("V9", "B", "GND", 5), resistor("R9", "B", "C"), resistor("R8", "C", "GND")];

describe("a circuit that has no solution names its nets and parts, and solves the rest", () => {
  it.each([
    {
      name: "a net behind a capacitor",
      parts: [
        { ref: "C1", kind: "capacitor", pins: { 1: "A", 2: "B" }, params: { capacitance: 1e-9 } },
        {
          ref: "M1",
          kind: "mosfet",
          pins: { drain: "B", gate: "A", source: "GND" },
          params: { channel: "n", thresholdVoltage: 2, transconductanceFactor: 1e-3 },
        },
      ],
      code: "noPathToReference",
      nets: ["A"],
      blamed: ["C1", "M1"],
      unknown: ["A"],
    },
    {
      name: "an island of two resistors",
      parts: [resistor("R1", "A", "D"), resistor("R2", "D", "A")],
      code: "noPathToReference",
      nets: ["A", "D"],
      blamed: ["R1", "R2"],
      unknown: ["A", "D"],
    },
    {
      name: "unequal sources in parallel",
      parts: [source("V1", "A", "GND", 5), source("V2", "A", "GND", 6), resistor("R1", "A", "GND")],
      code: "sourcesFight",
      nets: ["A", "GND"],
      blamed: ["V1", "V2"],
      unknown: ["A"],
    },
    {
      name: "equal sources in parallel: the voltage is known, the currents are not",
      parts: [source("V1", "A", "GND", 5), source("V2", "A", "GND", 5), resistor("R1", "A", "GND")],
      code: "sourcesFight",
      nets: ["A", "GND"],
      blamed: ["V1", "V2"],
      unknown: [],
    },
    {
      name: "a loop of three sources between nets",
      parts: [
        source("V1", "A", "GND", 5),
        source("V2", "D", "A", 1),
        source("V3", "D", "GND", 7),
        resistor("R1", "D", "GND"),
      ],
      code: "sourcesFight",
      nets: ["A", "D", "GND"],
      blamed: ["V1", "V2", "V3"],
      unknown: ["D"],
    },
    {
      name: "a source across an inductor",
      parts: [
        source("V1", "A", "GND", 5),
        { ref: "L1", kind: "inductor", pins: { 1: "A", 2: "GND" }, params: { inductance: 1e-3 } },
      ],
      code: "sourcesFight",
      nets: ["A", "GND"],
      blamed: ["L1", "V1"],
      unknown: ["A"],
    },
    {
      name: "a current into a net that holds nothing else",
      parts: [
        current("I1", "GND", "A", 1e-3),
        { ref: "C1", kind: "capacitor", pins: { 1: "A", 2: "GND" }, params: { capacitance: 1e-9 } },
      ],
      code: "currentHasNowhereToGo",
      nets: ["A"],
      blamed: ["I1"],
      unknown: ["A"],
    },
    {
      name: "unequal current sources in series",
      parts: [current("I1", "GND", "A", 1e-3), current("I2", "A", "GND", 2e-3)],
      code: "currentHasNowhereToGo",
      nets: ["A"],
      blamed: ["I1", "I2"],
      unknown: ["A"],
    },
    {
      name: "equal current sources in series: nothing holds the net",
      parts: [current("I1", "GND", "A", 1e-3), current("I2", "A", "GND", 1e-3)],
      code: "noPathToReference",
      nets: ["A"],
      blamed: ["I1", "I2"],
      unknown: ["A"],
    },
  ])("$name", ({ parts, code, nets, blamed, unknown }) => {
    const file = circuitOf([...parts, ...good], {
      conditions: [{ name: "One" }, { name: "Two", set: { "V9.dc": 10 } }],
    });
    const solved = solveCircuit(file);
    expect(solved.conditions.map(({ status }) => status)).toEqual(["unsolvable", "unsolvable"]);
    expect(solved.problems.map((problem) => problem.condition)).toEqual(["One", "Two"]);
    const [problem] = solved.problems;
    expect(problem?.code).toBe(code);
    expect(problem?.nets.toSorted()).toEqual(nets);
    expect(problem?.parts.toSorted()).toEqual(blamed);
    expect(problem?.message).toMatch(/\.$/);
    const [one, two] = solved.conditions;
    const dark = Object.entries(one?.nets ?? {}).filter(([, value]) => value === null);
    for (const net of unknown) expect(dark.map(([name]) => name)).toContain(net);
    expect(one?.nets["C"]).toBeCloseTo(2.5, 9);
    expect(two?.nets["C"]).toBeCloseTo(5, 9);
    expect(one?.certificate).toBeNull();
  });
});

it("solves the other conditions when one cannot be", () => {
  const circuit = circuitOf(
    [
      source("V1", "A", "GND", 5),
      { ref: "V2", kind: "voltageSource", pins: { plus: "A", minus: "K" }, params: { dc: 0 } },
      { ref: "S1", kind: "switch", pins: { 1: "K", 2: "GND" }, params: { closed: false } },
      { ref: "R1", kind: "resistor", pins: { 1: "A", 2: "GND" }, params: { resistance: 100 } },
    ],
    {
      conditions: [
        { name: "Open" },
        { name: "Short", set: { "S1.closed": true, "S1.closedResistance": 0 } },
        { name: "Again" },
      ],
    },
  );
  const solved = solveCircuit(circuit);
  expect(solved.conditions.map(({ status }) => status)).toEqual(["solved", "unsolvable", "solved"]);
  expect(solved.conditions[2]?.nets["A"]).toBeCloseTo(5, 12);
});

it("leaves a pin on no net alone: no current, no voltage, and no fault", () => {
  const circuit = circuitOf([
    ...good,
    resistor("R1", "C", null),
    { ref: "C1", kind: "capacitor", pins: { 1: null, 2: "C" }, params: { capacitance: 1e-9 } },
    resistor("R2", null, null),
  ]);
  const [only] = solveCircuit(circuit).conditions;
  expect(only?.status).toBe("solved");
  expect(only?.nets["C"]).toBeCloseTo(2.5, 12);
  expect(only?.parts["R1"]?.currents).toEqual({ 1: 0, 2: 0 });
  expect(Object.keys(only?.nets ?? {}).toSorted()).toEqual(["B", "C", "GND"]);
});

it("names what is singular without a loop or an open net, and gives the rest", () => {
  const sourceOfCurrent = {
    ref: "G1",
    kind: "vccs",
    pins: { plus: "A", minus: "GND", controlPlus: "B", controlMinus: "GND" },
    params: { transconductance: 1e-3 },
  };
  const solved = solveCircuit(circuitOf([...good, sourceOfCurrent]));
  expect(solved.problems).toMatchObject([{ code: "singular", nets: ["A"], parts: ["G1"] }]);
  expect(solved.conditions[0]?.nets["A"]).toBeNull();
  expect(solved.conditions[0]?.nets["C"]).toBeCloseTo(2.5, 9);
});

it("takes a short with both ends on one net for harmless", () => {
  const solved = solveCircuit(circuitOf([...good, resistor("R1", "C", "C", 0)]));
  expect(solved.problems).toEqual([]);
  expect(solved.conditions[0]?.parts["R1"]?.currents).toEqual({ 1: 0, 2: 0 });
});

it("says what it cannot solve yet, with the parts", () => {
  const circuit = circuitOf(good, {
    conditions: [{ name: "Spread", spread: { method: "monteCarlo" } }],
  });
  const solved = solveCircuit(circuit);
  expect(solved.problems.map(({ code }) => code)).toEqual(["notYetSolved"]);
  expect(solved.conditions[0]?.status).toBe("unsolvable");
  expect(solved.conditions[0]?.nets["C"]).toBeCloseTo(2.5, 9);
  const regulator = {
    ref: "U1",
    kind: "linearRegulator",
    pins: { in: "B", out: "D", common: "GND" },
    params: { outputVoltage: 3.3 },
  };
  const lawless = solveCircuit(circuitOf([...good, regulator]));
  expect(lawless.problems).toMatchObject([{ code: "notYetSolved", parts: ["U1"] }]);
  expect(lawless.conditions[0]?.nets).toEqual({ GND: 0, B: null, C: null, D: null });
});
