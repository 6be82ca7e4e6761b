import fc from "fast-check";
import { LuDecomposition, Matrix } from "ml-matrix";
import { expect, it } from "vitest";
import { networkOf } from "../../lib/mna/network";
import { System } from "../../lib/mna/system";
import {
  circuitOf,
  largestVoltage,
  type Network,
  networks,
  partsOf,
  solvedOnly,
} from "./random-networks";

const RELATIVE = 1e-9;
/** Conductances from 1 µS to 1 S summed on one diagonal: dense elimination itself loses this much. */
const DENSE = 1e-7;

it("agrees with dense nodal analysis, a second method", () => {
  fc.assert(
    fc.property(networks, (network) => {
      const solved = solvedOnly(partsOf(network));
      expect(solved.status).toBe("solved");
      const dense = denseNodal(network);
      const allowed = DENSE * largestVoltage(solved);
      network.nets.forEach((net, k) => {
        expect(Math.abs((solved.nets[net] ?? Number.NaN) - (dense[k] ?? 0))).toBeLessThan(allowed);
      });
    }),
  );
});

it("keeps Kirchhoff's current law at every net, and Tellegen's theorem over all parts", () => {
  fc.assert(
    fc.property(networks, (network) => {
      const parts = partsOf(network);
      const solved = solvedOnly(parts);
      const sums = new Map<string, number>();
      let [power, size, most] = [0, 0, 0];
      for (const { ref, pins } of parts) {
        const result = solved.parts[ref];
        for (const [pin, net] of Object.entries(pins)) {
          const current = result?.currents[pin] ?? Number.NaN;
          sums.set(net ?? "", (sums.get(net ?? "") ?? 0) + current);
          most = Math.max(most, Math.abs(current));
        }
        power += result?.power ?? Number.NaN;
        size += Math.abs(result?.power ?? 0);
      }
      for (const sum of sums.values()) expect(Math.abs(sum)).toBeLessThanOrEqual(1e-12 * most);
      expect(Math.abs(power)).toBeLessThanOrEqual(1e-12 * size);
      expect(solved.certificate?.kclResidual).toBeLessThan(1e-11);
      expect(solved.certificate?.method).toBe("direct");
    }),
  );
});

it("does not depend on names or on the order of parts", () => {
  fc.assert(
    fc.property(networks, (network) => {
      const parts = partsOf(network);
      const one = solvedOnly(parts);
      const renamed = parts
        .map((part, k) => ({
          ...part,
          ref: `Z${parts.length - k}`,
          pins: Object.fromEntries(
            Object.entries(part.pins).map(([pin, net]) => [pin, net === "GND" ? net : `x ${net}`]),
          ),
        }))
        .reverse();
      const other = solvedOnly(renamed);
      for (const net of network.nets) {
        const difference = (one.nets[net] ?? Number.NaN) - (other.nets[`x ${net}`] ?? Number.NaN);
        expect(Math.abs(difference)).toBeLessThan(RELATIVE * largestVoltage(one));
      }
    }),
  );
});

it("superposes and scales: the sum over sources one at a time, each doubled, is twice the whole", () => {
  fc.assert(
    fc.property(networks, (network) => {
      const whole = solvedOnly(partsOf(network));
      const single = network.injected.map((source) =>
        solvedOnly(partsOf({ ...network, injected: [source] }, 2)),
      );
      const most = Math.max(...single.map(largestVoltage));
      for (const net of network.nets) {
        const sum = single.reduce((total, { nets }) => total + (nets[net] ?? Number.NaN), 0);
        expect(Math.abs(sum - 2 * (whole.nets[net] ?? Number.NaN))).toBeLessThan(RELATIVE * most);
      }
    }),
  );
});

it("is reciprocal: a current into one net gives the voltage at another that it gives the other way", () => {
  fc.assert(
    fc.property(networks, fc.nat(), fc.nat(), (network, p, q) => {
      const a = network.nets[p % network.nets.length] ?? "N1";
      const b = network.nets[q % network.nets.length] ?? "N1";
      const into = (net: string) =>
        solvedOnly(partsOf({ ...network, injected: [{ net, amperes: 1e-3 }] }));
      const [there, back] = [into(a), into(b)];
      const allowed = RELATIVE * Math.max(largestVoltage(there), largestVoltage(back));
      const difference = (there.nets[b] ?? Number.NaN) - (back.nets[a] ?? Number.NaN);
      expect(Math.abs(difference)).toBeLessThan(allowed);
    }),
  );
});

it("does not change when a source of zero volts is put into a lead", () => {
  fc.assert(
    fc.property(networks, (network) => {
      const parts = partsOf(network);
      const [first, ...rest] = parts;
      if (first === undefined) throw new Error("there is a resistor");
      const cut = { ...first, pins: { 1: first.pins["1"] ?? null, 2: "between" } };
      const source = {
        ref: "V0",
        kind: "voltageSource",
        pins: { plus: "between", minus: first.pins["2"] ?? null },
        params: { dc: 0 },
      };
      const [one, other] = [solvedOnly(parts), solvedOnly([cut, source, ...rest])];
      for (const net of network.nets) {
        const difference = (one.nets[net] ?? Number.NaN) - (other.nets[net] ?? Number.NaN);
        expect(Math.abs(difference)).toBeLessThan(RELATIVE * largestVoltage(one));
      }
      const carried = other.parts["V0"]?.currents["plus"] ?? Number.NaN;
      const through = one.parts[first.ref]?.currents["1"] ?? Number.NaN;
      expect(Math.abs(carried - through)).toBeLessThanOrEqual(1e-9 * (Math.abs(through) + 1e-3));
    }),
  );
});

it("lets passive parts only take power", () => {
  fc.assert(
    fc.property(networks, (network) => {
      const solved = solvedOnly(partsOf(network));
      network.resistors.forEach((_, k) => {
        expect(solved.parts[`R${k + 1}`]?.power).toBeGreaterThanOrEqual(0);
      });
    }),
  );
});

it("assembles passive networks with sources symmetrically", () => {
  fc.assert(
    fc.property(networks, (network) => {
      const circuit = circuitOf([
        ...partsOf(network),
        { ref: "L1", kind: "inductor", pins: { 1: "N1", 2: "N2" }, params: { inductance: 1e-3 } },
        { ref: "V1", kind: "voltageSource", pins: { plus: "N2", minus: "GND" }, params: { dc: 1 } },
      ]);
      const [condition] = circuit.conditions;
      if (condition === undefined) throw new Error("a circuit has a condition");
      const system = new System(
        networkOf(circuit, condition),
        { held: new Map(), opened: new Set() },
        null,
      );
      system.rate = 1e3;
      system.assemble(new Float64Array(system.size + 1));
      const dense = denseOf(system);
      expect(Matrix.sub(dense, dense.transpose()).norm()).toBe(0);
      expect(dense.max()).toBeGreaterThan(0);
    }),
  );
});

function denseNodal(network: Network): readonly number[] {
  const n = network.nets.length;
  const conductance = Matrix.zeros(n, n);
  const currents = Matrix.zeros(n, 1);
  const at = (net: string): number => network.nets.indexOf(net);
  const add = (row: number, column: number, value: number): void => {
    if (row >= 0 && column >= 0) conductance.set(row, column, conductance.get(row, column) + value);
  };
  for (const { a, b, ohms } of network.resistors) {
    const [i, j] = [at(a), at(b)];
    add(i, i, 1 / ohms);
    add(j, j, 1 / ohms);
    add(i, j, -1 / ohms);
    add(j, i, -1 / ohms);
  }
  for (const { net, amperes } of network.injected)
    currents.set(at(net), 0, currents.get(at(net), 0) + amperes);
  return new LuDecomposition(conductance).solve(currents).to1DArray();
}

function denseOf(system: System): Matrix {
  const { n, columnStart, rowIndex } = system.matrix.pattern;
  const dense = Matrix.zeros(n, n);
  for (let column = 0; column < n; column++)
    for (let p = columnStart[column] ?? 0; p < (columnStart[column + 1] ?? 0); p++)
      dense.set(rowIndex[p] ?? 0, column, system.matrix.values[p] ?? 0);
  return dense;
}
