import type { Circuit, Condition } from "../kinds/circuit";
import { hasLaw } from "../kinds/laws";
import { courseInTime } from "./analyses/course-in-time";
import { sweep } from "./analyses/sweep";
import type { Fault } from "./diagnosis";
import { networkOf } from "./network";
import { type Kept, type OperatingPoint, operatingPoint } from "./operating-point";
import { problem } from "./problem-sentences";
import type { ConditionResult, PartResult, SolvedCircuit, SolveProblem } from "./solution";

/** One condition's answer, and the solved network from which a like condition may start. */
export interface SolvedCondition {
  readonly result: ConditionResult;
  readonly problems: readonly SolveProblem[];
  readonly kept: Kept | null;
}

/** Parts beyond this are not taken on: a result would be too large to hold. */
const MOST_PARTS = 100_000;

/**
 * Solves every condition, each from the nearest one solved before it.
 * @param onProgress called before each condition and once at the end
 */
export function solveCircuit(
  circuit: Circuit,
  onProgress?: (done: number, all: number) => void,
): SolvedCircuit {
  const all = circuit.conditions.length;
  const solved: SolvedCondition[] = [];
  let kept: Kept | null = null;
  for (const condition of circuit.conditions) {
    onProgress?.(solved.length, all);
    const one: SolvedCondition = solveCondition(circuit, condition, kept);
    kept = one.kept ?? kept;
    solved.push(one);
  }
  onProgress?.(all, all);
  return {
    reference: circuit.reference,
    unknowns: unknownsOf(circuit),
    conditions: solved.map(({ result }) => result),
    problems: solved.flatMap(({ problems }) => problems),
  };
}

/** Unknowns of the first condition; 0 where a part of it has no law yet. */
function unknownsOf(circuit: Circuit): number {
  const [first] = circuit.conditions;
  if (first === undefined || first.parts.some((part) => !hasLaw(part.kind))) return 0;
  return networkOf(circuit, first).unknowns.count;
}

/** Solves one condition. Never throws for what a circuit may be: it answers with problems. */
function solveCondition(
  circuit: Circuit,
  condition: Condition,
  before: Kept | null = null,
): SolvedCondition {
  const lawless = condition.parts.filter((part) => !hasLaw(part.kind)).map((part) => part.path);
  if (lawless.length > 0)
    return refused(circuit, condition, { code: "notYetSolved", nets: [], parts: lawless });
  if (condition.parts.length > MOST_PARTS)
    return refused(circuit, condition, { code: "tooLarge", nets: [], parts: [] });
  const solved = analysed(circuit, condition, before);
  return condition.spread === null ? solved : notYet(condition, solved);
}

function analysed(circuit: Circuit, condition: Condition, before: Kept | null): SolvedCondition {
  const { analysis } = condition;
  switch (analysis.type) {
    case "operatingPoint": {
      const point = operatingPoint(circuit, condition, null, before);
      return answered(condition, point.faults, resultOf(condition, point), point.kept);
    }
    case "sweep": {
      const point = operatingPoint(circuit, condition, null, before);
      const swept = sweep(circuit, condition, analysis, point, before);
      const result = { ...resultOf(condition, point), sweep: swept.sweep };
      return answered(condition, swept.faults, result, swept.kept);
    }
    case "transient": {
      const { point, transient, faults } = courseInTime(circuit, condition, analysis, before);
      return answered(condition, faults, { ...resultOf(condition, point), transient }, point.kept);
    }
    case "frequencyResponse": {
      const point = operatingPoint(circuit, condition, null, before);
      const result = resultOf(condition, point);
      return notYet(condition, answered(condition, point.faults, result, point.kept));
    }
  }
}

/** The operating point stands, but what else is asked for cannot be computed yet: never silently. */
function notYet(condition: Condition, solved: SolvedCondition): SolvedCondition {
  const row = problem("notYetSolved", condition.name, [], []);
  if (solved.problems.some(({ code }) => code === row.code)) return solved;
  return {
    result: { ...solved.result, status: "unsolvable" },
    problems: [...solved.problems, row],
    kept: solved.kept,
  };
}

function resultOf(condition: Condition, point: OperatingPoint): ConditionResult {
  return {
    name: condition.name,
    status: "solved",
    nets: point.nets,
    parts: point.parts,
    certificate: point.certificate,
    sweep: null,
    frequencyResponse: null,
    transient: null,
    spread: null,
  };
}

function answered(
  condition: Condition,
  faults: readonly Fault[],
  result: ConditionResult,
  kept: Kept | null,
): SolvedCondition {
  return {
    result: { ...result, status: faults.length === 0 ? "solved" : "unsolvable" },
    problems: faults.map(({ code, nets, parts }) => problem(code, condition.name, nets, parts)),
    kept,
  };
}

function refused(circuit: Circuit, condition: Condition, fault: Fault): SolvedCondition {
  const nets = circuit.nets.map((net) => [net, net === circuit.reference ? 0 : null]);
  const parts = condition.parts.map((part): [string, PartResult] => {
    const currents = Object.fromEntries(Object.keys(part.pins).map((pin) => [pin, null]));
    const temperature = part.temperature ?? condition.ambient;
    return [part.path, { voltage: null, power: null, currents, temperature }];
  });
  const point = {
    nets: Object.fromEntries(nets),
    parts: Object.fromEntries(parts),
    certificate: null,
    faults: [],
    kept: null,
  };
  return answered(condition, [fault], resultOf(condition, point), null);
}
