import type { Circuit, Condition } from "../kinds/circuit";
import { hasLaw } from "../kinds/laws";
import type { Fault } from "./diagnosis";
import { type Kept, operatingPoint } from "./operating-point";
import { problem } from "./problem-sentences";
import type { ConditionResult, PartResult, SolvedCircuit, SolveProblem } from "./solution";

/** One condition's answer, and the solved network from which a like condition may start. */
export interface SolvedCondition {
  readonly result: ConditionResult;
  readonly problems: readonly SolveProblem[];
  readonly unknowns: number;
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
    unknowns: solved[0]?.unknowns ?? 0,
    conditions: solved.map(({ result }) => result),
    problems: solved.flatMap(({ problems }) => problems),
  };
}

/** Solves one condition. Never throws for what a circuit may be: it answers with problems. */
export function solveCondition(
  circuit: Circuit,
  condition: Condition,
  before: Kept | null = null,
): SolvedCondition {
  const lawless = condition.parts.filter((part) => !hasLaw(part.kind)).map((part) => part.path);
  if (lawless.length > 0)
    return refused(circuit, condition, { code: "notYetSolved", nets: [], parts: lawless });
  if (condition.parts.length > MOST_PARTS)
    return refused(circuit, condition, { code: "tooLarge", nets: [], parts: [] });
  if (condition.analysis.type === "frequencyResponse" || condition.spread !== null)
    return refused(circuit, condition, { code: "notYetSolved", nets: [], parts: [] });

  const point = operatingPoint(circuit, condition, null, before);
  return answered(
    condition,
    point.faults,
    {
      name: condition.name,
      status: point.faults.length === 0 ? "solved" : "unsolvable",
      nets: point.nets,
      parts: point.parts,
      certificate: point.certificate,
      sweep: null,
      frequencyResponse: null,
      transient: null,
      spread: null,
    },
    point.kept,
  );
}

function answered(
  condition: Condition,
  faults: readonly Fault[],
  result: ConditionResult,
  kept: Kept | null,
): SolvedCondition {
  return {
    result,
    problems: faults.map(({ code, nets, parts }) => problem(code, condition.name, nets, parts)),
    unknowns: kept?.system.size ?? 0,
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
  return answered(
    condition,
    [fault],
    {
      name: condition.name,
      status: "unsolvable",
      nets: Object.fromEntries(nets),
      parts: Object.fromEntries(parts),
      certificate: null,
      sweep: null,
      frequencyResponse: null,
      transient: null,
      spread: null,
    },
    null,
  );
}
