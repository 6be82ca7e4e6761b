import fc from "fast-check";
import { describe, expect, it } from "vitest";
import type { Circuit } from "../../lib/kinds/circuit";
import { readCircuit, readCircuitFile } from "../../lib/kinds/read-circuit";
import { divider, resistor, source, withParts } from "./divider";

const circuitOf = (file: unknown): Circuit => {
  const read = readCircuitFile(file);
  if (!read.ok) throw new Error(JSON.stringify(read.error));
  return read.value;
};

const parameter = (circuit: Circuit, condition: string, path: string, name: string): unknown => {
  const found = circuit.conditions.find((each) => each.name === condition);
  const part = found?.parts.find((each) => each.path === path);
  return new Map<string, unknown>(Object.entries(part?.params ?? {})).get(name);
};

const tee = {
  ports: ["IN", "OUT"],
  parts: [resistor("R1", "IN", "M"), resistor("R2", "M", "GND"), resistor("R3", "M", "OUT")],
};

const twoTees = (set: unknown, conditions: readonly unknown[] = []): unknown =>
  divider({
    top: "main",
    blocks: {
      main: {
        parts: [
          source,
          { ref: "X1", kind: "block", block: "tee", pins: { IN: "IN", OUT: "J" }, set },
          { ref: "X2", kind: "block", block: "tee", pins: { IN: "J" } },
        ],
      },
      tee,
    },
    conditions,
  });

describe("defaults", () => {
  it("are those of the format", () => {
    const circuit = circuitOf(divider());
    expect(circuit).toMatchObject({
      title: "",
      reference: "GND",
      nets: ["GND", "IN", "OUT"],
      limits: [],
      policy: { use: "common-practice", variant: null, rules: [] },
    });
    expect(circuit.conditions).toMatchObject([
      { name: "Nominal", ambient: 25, selfHeating: false, analysis: { type: "operatingPoint" } },
    ]);
    expect(circuit.parts[1]?.params).toEqual({ resistance: 4700, tolerance: 0, tempco: 0 });
  });

  it("of a transient and a spread", () => {
    const analysis = { type: "transient", until: "20 ms" };
    const [condition] = circuitOf(
      divider({ conditions: [{ name: "T", analysis, spread: { method: "monteCarlo" } }] }),
    ).conditions;
    expect(condition?.analysis).toEqual({
      type: "transient",
      until: 0.02,
      maxStep: 0.02 / 500,
      record: null,
      fromRest: false,
      initial: {},
    });
    expect(condition?.spread).toEqual({
      method: "monteCarlo",
      samples: 1000,
      seed: 1,
      distribution: "uniform",
    });
  });
});

describe("blocks", () => {
  it("put in by hand give the same parts and nets", () => {
    const flat = circuitOf(twoTees({}));
    expect(flat.parts.map(({ path, pins }) => [path, pins])).toEqual([
      ["V1", { plus: "IN", minus: "GND" }],
      ["X1/R1", { "1": "IN", "2": "X1/M" }],
      ["X1/R2", { "1": "X1/M", "2": "GND" }],
      ["X1/R3", { "1": "X1/M", "2": "J" }],
      ["X2/R1", { "1": "J", "2": "X2/M" }],
      ["X2/R2", { "1": "X2/M", "2": "GND" }],
      ["X2/R3", { "1": "X2/M", "2": "X2/OUT" }],
    ]);
    expect(flat.nets).toEqual(["GND", "IN", "J", "X1/M", "X2/M", "X2/OUT"]);
  });

  it("set their own parts, and a condition's set beats theirs", () => {
    const circuit = circuitOf(
      twoTees({ "R1.resistance": "1k" }, [
        { name: "A" },
        { name: "B", set: { "X1/R1.resistance": "2k", "X2/R3.resistance": 5 } },
      ]),
    );
    expect(parameter(circuit, "A", "X1/R1", "resistance")).toBe(1000);
    expect(parameter(circuit, "A", "X2/R1", "resistance")).toBe(4700);
    expect(parameter(circuit, "B", "X1/R1", "resistance")).toBe(2000);
    expect(parameter(circuit, "B", "X2/R3", "resistance")).toBe(5);
    expect(circuit.parts.find(({ path }) => path === "X1/R1")?.params).toMatchObject({
      resistance: 1000,
    });
  });

  it("an outer set beats an inner one", () => {
    const circuit = circuitOf(
      divider({
        top: "a",
        blocks: {
          a: { parts: [{ ref: "X", kind: "block", block: "b", set: { "Y/R1.resistance": 1 } }] },
          b: { parts: [{ ref: "Y", kind: "block", block: "tee", set: { "R1.resistance": 2 } }] },
          tee,
        },
      }),
    );
    expect(parameter(circuit, "Nominal", "X/Y/R1", "resistance")).toBe(1);
  });

  it("that are not fitted take their whole content with them", () => {
    const file = {
      blocks: {
        main: {
          parts: [source, { ref: "X1", kind: "block", block: "tee", pins: {}, fitted: false }],
        },
        tee,
      },
      top: "main",
    };
    const circuit = circuitOf(divider(file));
    expect(circuit.parts.map(({ path }) => path)).toEqual(["V1"]);
    expect(circuit.nets).toEqual(["GND", "IN"]);
  });

  it("lead control and coupling downward", () => {
    const inner = {
      parts: [
        { ref: "L1", kind: "inductor", pins: { "1": "A", "2": "GND" }, params: { inductance: 1 } },
        { ref: "L2", kind: "inductor", pins: { "1": "B", "2": "GND" }, params: { inductance: 1 } },
        { ref: "K1", kind: "coupling", of: ["L1", "L2"], params: { coefficient: 0.5 } },
      ],
    };
    const main = {
      parts: [
        { ref: "X1", kind: "block", block: "inner" },
        {
          ref: "H1",
          kind: "ccvs",
          pins: { plus: "A", minus: "GND" },
          control: "X1/L1",
          params: { transresistance: 1 },
        },
      ],
    };
    const circuit = circuitOf(divider({ top: "main", blocks: { main, inner } }));
    expect(circuit.parts.map(({ path, control, of }) => [path, control, of])).toEqual([
      ["X1/L1", null, null],
      ["X1/L2", null, null],
      ["X1/K1", null, ["X1/L1", "X1/L2"]],
      ["H1", "X1/L1", null],
    ]);
  });
});

describe("the reference", () => {
  it("is the net with the most pins where nothing touches the named one", () => {
    const parts = [resistor("R1", "B", "A"), resistor("R2", "B", "C"), resistor("R3", "C", null)];
    expect(circuitOf(withParts(...parts)).reference).toBe("B");
  });

  it("breaks ties by code point, not by UTF-16", () => {
    expect(circuitOf(withParts(resistor("R1", "\u{10000}", "\uFF5E"))).reference).toBe("\uFF5E");
  });

  it("does not count parts that are not fitted", () => {
    const parts = [resistor("R1", "A", "B"), resistor("R2", "B", "GND", { fitted: false })];
    expect(circuitOf(withParts(...parts)).reference).toBe("A");
  });
});

describe("parts", () => {
  it("bear names that JavaScript has other plans for", () => {
    const named = `{"ref":"__proto__","kind":"connector","pins":{"__proto__":"constructor"}}`;
    const text = `{"ampersign":1,"blocks":{"__proto__":{"parts":[${named}]}},
      "conditions":[{"name":"toString","start":{"nets":{"constructor":1}}}]}`;
    const read = readCircuit(text);
    const circuit = read.ok ? read.value : null;
    expect(circuit?.parts[0]?.path).toBe("__proto__");
    expect(Object.entries(circuit?.parts[0]?.pins ?? {})).toEqual([["__proto__", "constructor"]]);
    expect(circuit?.reference).toBe("constructor");
    expect(circuit?.conditions[0]?.start).toEqual({ constructor: 1 });
  });

  it("take the tolerance of a letter code, in params and in set", () => {
    const first = resistor("R1", "IN", "GND", { params: { resistance: "4K7J" } });
    const conditions = [{ name: "A", set: { "R2.resistance": "1K0F" } }];
    const circuit = circuitOf(
      divider({
        conditions,
        blocks: { main: { parts: [source, first, resistor("R2", "IN", "GND")] } },
      }),
    );
    expect(parameter(circuit, "A", "R1", "tolerance")).toBe(0.05);
    expect(parameter(circuit, "A", "R2", "tolerance")).toBe(0.01);
    expect(parameter(circuit, "A", "R2", "resistance")).toBe(1000);
  });

  it("are set flags, waveforms, none and their own temperature", () => {
    const parts = [
      source,
      { ref: "S1", kind: "switch", pins: { "1": "IN", "2": "GND" }, params: { closed: true } },
      {
        ref: "C1",
        kind: "capacitor",
        pins: { "1": "IN", "2": "GND" },
        params: { capacitance: "100n", leakageResistance: "1M" },
      },
    ];
    const set = {
      "S1.closed": false,
      "S1.waveform": { step: { from: 0, to: 1, at: "2 ms" } },
      "C1.leakageResistance": null,
      "C1.temperature": "85 °C",
    };
    const circuit = circuitOf(
      divider({ blocks: { main: { parts } }, conditions: [{ name: "A", set }] }),
    );
    expect(parameter(circuit, "A", "S1", "closed")).toBe(false);
    expect(parameter(circuit, "A", "S1", "waveform")).toEqual({
      shape: "step",
      from: 0,
      to: 1,
      at: 2e-3,
    });
    expect(parameter(circuit, "A", "C1", "leakageResistance")).toBeNull();
    expect(circuit.conditions[0]?.parts[2]?.temperature).toBe(85);
    expect(circuit.conditions[0]?.set).toEqual(set);
    expect(circuit.parts[2]?.params).toMatchObject({ leakageResistance: 1e6 });
  });
});

describe("names", () => {
  it("may be anything without slash, dot and control characters", () => {
    const name = fc
      .string({ unit: "binary", minLength: 1, maxLength: 8 })
      .filter((text) => !/[/.]|\p{Cc}/u.test(text));
    fc.assert(
      fc.property(name, (net) => {
        expect(circuitOf(withParts(resistor("R1", net, "GND"))).nets).toContain(net);
      }),
    );
  });
});
