import { readFileSync } from "node:fs";
import { describe, expect, it } from "vitest";
import type { Circuit } from "../../lib/kinds/circuit";
import { readCircuitFile } from "../../lib/kinds/read-circuit";
import { solveCircuit } from "../../lib/mna/solve";

/**
 * The frost-fan controller by a separate solution of the same equations (Newton on nodal equations,
 * currents within 1e-12 A), with K1's temperature coefficient left at zero.
 * Columns: Nominal, Charging, Hot and charging, Cold crank.
 */
const table = {
  A: {
    TREF: [5.391, 5.397, 5.4, 2.861],
    V12: [11.981, 11.993, 11.999, 6.358],
    power: [0.351, 0.501, 0.502, 0.04],
    junction: [51, 63, 108, -27],
  },
  B: {
    TREF: [5.723, 5.729, 5.734, 3.027],
    V12: [12.018, 12.031, 12.042, 6.357],
    power: [0.35, 0.501, 0.502, 0.04],
    junction: [51, 63, 108, -27],
  },
  C: {
    TREF: [6.009, 6.015, 6.021, 3.103],
    V12: [12.018, 12.031, 12.042, 6.207],
    power: [0.631, 0.903, 0.906, 0.073],
    junction: [72, 93, 138, -25],
  },
} as const;

/** V: the table's last digit. Revision C in Cold crank is 6.20646 V here, and 6.207 V there. */
const LAST_DIGIT = 1e-3;

const conditions = ["Nominal", "Charging", "Hot and charging", "Cold crank"];

function demo(revision: string): Circuit {
  const file = JSON.parse(readFileSync(`tests/kept/ffc-2-${revision}.json`, "utf8"));
  for (const part of file.blocks.main.parts) if (part.ref === "K1") part.params.tempco = 0;
  const circuit = readCircuitFile(file);
  if (!circuit.ok) throw new Error(JSON.stringify(circuit.error));
  return circuit.value;
}

describe.each(Object.entries(table))("revision %s of the demo", (revision, rows) => {
  const circuit = demo(revision);
  const solved = solveCircuit(circuit);
  const pass = circuit.parts.find(({ path }) => path === "Q1");

  it.each(conditions.map((name, column) => ({ name, column })))("$name", ({ name, column }) => {
    const condition = solved.conditions.find((one) => one.name === name);
    expect(condition?.status).toBe("solved");
    for (const net of ["TREF", "V12"] as const) {
      const off = Math.abs(
        (condition?.nets[net] ?? Number.NaN) - (rows[net][column] ?? Number.NaN),
      );
      expect(off, net).toBeLessThan(LAST_DIGIT);
    }
    const power = condition?.parts["Q1"]?.power ?? Number.NaN;
    expect(power).toBeCloseTo(rows.power[column] ?? Number.NaN, 3);
    const ambient = condition?.parts["Q1"]?.temperature ?? Number.NaN;
    const junction = ambient + power * (pass?.junctionToAmbient ?? Number.NaN);
    expect(Math.abs(junction - (rows.junction[column] ?? Number.NaN))).toBeLessThanOrEqual(0.5);
  });

  it("lets the relay drop out, its current through the flyback diode", () => {
    const condition = solved.conditions.find(({ name }) => name === "Relay drop-out");
    expect(condition?.status).toBe("solved");
    const { time = [], nets, netExtremes, extremes } = condition?.transient ?? {};
    expect(time[0]).toBe(0);
    expect(time.at(-1)).toBe(0.02);
    for (let k = 1; k < time.length; k++)
      expect(time[k] ?? 0).toBeGreaterThan(time[k - 1] ?? Number.POSITIVE_INFINITY);
    expect(Object.keys(nets ?? {})).toEqual(["RLY", "V12", "Q2B"]);
    // One diode above the supply at most, from the switching on, and back at the supply in the end.
    const supply = condition?.nets["V12"] ?? Number.NaN;
    const peak = netExtremes?.["RLY"];
    expect((peak?.max ?? Number.NaN) - supply).toBeGreaterThan(0.5);
    expect((peak?.max ?? Number.NaN) - supply).toBeLessThan(1.2);
    expect(peak?.atMax).toBeCloseTo(0.002, 6);
    expect(nets?.["RLY"]?.at(-1)).toBeCloseTo(supply, 2);
    // The coil's current goes on in the diode where the transistor leaves it.
    const coil = extremes?.["K1"]?.["current"]?.max ?? Number.NaN;
    expect(extremes?.["D3"]?.["forwardCurrent"]?.max).toBeCloseTo(coil, 3);
  });
});
