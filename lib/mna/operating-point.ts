import type { Circuit, Condition } from "../kinds/circuit";
import { certify, holds, worstNode } from "./certificate";
import { type Found, findSolution } from "./continuations";
import { type Diagnosis, diagnose, diagnoseSingular, type Fault } from "./diagnosis";
import { type Network, networkOf } from "./network";
import type { NoSolution } from "./newton";
import { type Reading, readSolution } from "./part-results";
import { heatedTemperatures } from "./self-heating";
import { settled } from "./settle";
import type { Certificate } from "./solution";
import { type Bent, System, unbent } from "./system";
import { undetermined } from "./undetermined";

/** A solved network, from which the next condition may start. */
export interface Kept {
  readonly system: System;
  readonly x: Float64Array;
}

/** An operating point, or what can be said all the same. */
export interface OperatingPoint extends Reading {
  readonly certificate: Certificate | null;
  readonly faults: readonly Fault[];
  /** null where there is no solution. */
  readonly kept: Kept | null;
}

const MOST_STATES = 20;
/** A residual above this is worth solving again with every current as an unknown. */
const WORTH_MORE = 1e-12;

/**
 * The operating point of a condition.
 * @param time s, at which waveforms count; null: `dc` counts
 * @param before a solved network to start from
 */
export function operatingPoint(
  circuit: Circuit,
  condition: Condition,
  time: number | null,
  before: Kept | null,
): OperatingPoint {
  let network = networkOf(circuit, condition, before?.system.network.precise ?? false);
  let solved = solveNetwork(network, condition, time, before);
  if (!network.precise && !((solved.certificate?.kclResidual ?? 0) <= WORTH_MORE)) {
    network = networkOf(circuit, condition, true);
    solved = solveNetwork(network, condition, time, before);
  }
  if (condition.selfHeating) {
    for (let round = 0; round < MOST_STATES && solved.kept !== null; round++) {
      const heated = heatedTemperatures(network, solved.parts, condition);
      if (heated === null) break;
      network = networkOf(circuit, condition, network.precise, heated);
      solved = solveNetwork(network, condition, time, solved.kept);
    }
  }
  return solved;
}

function solveNetwork(
  network: Network,
  condition: Condition,
  time: number | null,
  before: Kept | null,
): OperatingPoint {
  const system = new System(network, unbent, null);
  system.stage.time = time;
  const diagnosis = diagnose(network, system.stage);
  const solution = solveBent(network, diagnosis.bent, condition, time, before);
  if (solution.error?.kind === "singular" && diagnosis.faults.length === 0) {
    const singular = diagnoseSingular(network, diagnosis, solution.error.unknowns);
    const rest = solveBent(network, singular.bent, condition, time, null);
    if (rest.error === null)
      return named(network, published(network, singular, rest, condition, time), solution.error);
  }
  if (solution.error !== null) {
    const faults =
      diagnosis.faults.length > 0 ? diagnosis.faults : [faultOf(network, solution.error)];
    return { ...nothing(network), certificate: null, faults, kept: null };
  }
  return published(network, diagnosis, solution, condition, time);
}

/** A singular fault with the nets that came out undetermined, and the parts at them. */
function named(network: Network, point: OperatingPoint, error: NoSolution): OperatingPoint {
  const nets = Object.keys(point.nets).filter((net) => point.nets[net] === null);
  const own = faultOf(network, error);
  const parts = network.parts.filter(({ part }) =>
    Object.values(part.pins).some((net) => net !== null && nets.includes(net)),
  );
  const fault: Fault = {
    code: "singular",
    nets: nets.length > 0 ? nets : own.nets,
    parts: nets.length > 0 ? parts.map(({ part }) => part.path) : own.parts,
  };
  return { ...point, faults: [fault] };
}

interface Solution {
  readonly system: System;
  readonly x: Float64Array;
  readonly found: Found | null;
  readonly error: NoSolution | null;
}

function solveBent(
  network: Network,
  bent: Bent,
  condition: Condition,
  time: number | null,
  before: Kept | null,
): Solution {
  const start = startOf(network, condition);
  const x = new Float64Array(network.unknowns.count + 1);
  let warm = false;
  if (start.size > 0) {
    const held = new System(network, { ...bent, held: new Map([...start, ...bent.held]) }, null);
    held.stage.time = time;
    warm = findSolution(held, x, false).ok;
  } else if (before !== null && before.x.length === x.length) {
    x.set(before.x);
    warm = true;
  }
  const system = new System(network, bent, before?.system.structure ?? null);
  system.stage.time = time;
  let answer = findSolution(system, x, warm);
  for (let round = 0; round < MOST_STATES && answer.ok; round++) {
    if (!settled(system, x)) break;
    answer = findSolution(system, x, true);
  }
  if (!answer.ok) return { system, x, found: null, error: answer.error };
  system.stage.begin = "warm";
  system.assemble(x);
  return { system, x, found: answer.value, error: null };
}

function startOf(network: Network, condition: Condition): ReadonlyMap<number, number> {
  return new Map(
    Object.entries(condition.start).map(([net, volts]) => [network.unknowns.ofNet(net), volts]),
  );
}

function published(
  network: Network,
  diagnosis: Diagnosis,
  { system, x, found }: Solution,
  condition: Condition,
  time: number | null,
): OperatingPoint {
  if (found === null) throw new Error("a solution was found");
  const reading = readSolution(system, x);
  const kept = { system, x };
  if (diagnosis.bent.held.size > 0 || diagnosis.bent.opened.size > 0) {
    const other = solveBent(network, diagnosis.otherwise, condition, time, kept);
    const certain =
      other.error === null
        ? undetermined(reading, readSolution(other.system, other.x), diagnosis, network)
        : nothing(network);
    if (diagnosis.faults.length > 0)
      return { ...certain, certificate: null, faults: diagnosis.faults, kept: null };
    const again = solveBent(network, diagnosis.bent, condition, time, kept);
    return certified(certain, again, network, certify(again.system, again.x, found));
  }
  return certified(reading, { system, x, found, error: null }, network, certify(system, x, found));
}

function certified(
  reading: Reading,
  solution: Solution,
  network: Network,
  certificate: Certificate,
): OperatingPoint {
  const { system, x } = solution;
  if (holds(certificate)) return { ...reading, certificate, faults: [], kept: { system, x } };
  const fault = faultOf(network, { kind: "singular", unknowns: [worstNode(system)] });
  return {
    ...nothing(network),
    certificate,
    faults: [{ ...fault, code: "notTrusted" }],
    kept: null,
  };
}

/** An operating point of which nothing is known but the reference. */
export function unsolved(network: Network): OperatingPoint {
  return { ...nothing(network), certificate: null, faults: [], kept: null };
}

/** No voltage but the reference's. */
function nothing(network: Network): Reading {
  const nets: [string, number | null][] = [];
  network.unknowns.names.forEach((name, unknown) => {
    if ("net" in name) nets.push([name.net, unknown === 0 ? 0 : null]);
  });
  const parts = network.parts.map(({ part, pins, temperature }) => {
    const currents = Object.fromEntries(pins.map((pin) => [pin, null]));
    return [part.path, { voltage: null, power: null, currents, temperature }] as const;
  });
  return { nets: Object.fromEntries(nets), parts: Object.fromEntries(parts) };
}

/** Names what a failed search left: the nets, and the parts that touch them or hold the unknown. */
function faultOf(network: Network, error: NoSolution): Fault {
  const unknowns = error.kind === "singular" ? error.unknowns : [error.unknown];
  const nets: string[] = [];
  const parts = new Set<string>();
  for (const unknown of unknowns) {
    const name = network.unknowns.names[unknown];
    if (name !== undefined && "net" in name) nets.push(name.net);
    for (const { part, law } of network.parts)
      if (law.terminals.includes(unknown)) parts.add(part.path);
  }
  return { code: error.kind, nets, parts: [...parts] };
}
