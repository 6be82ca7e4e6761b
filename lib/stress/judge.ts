import type { Circuit } from "../kinds/circuit";
import { engineVersion } from "../mna/engine-version";
import type { SolvedCircuit } from "../mna/solution";
import { solveCircuit } from "../mna/solve";
import type { CircuitResult } from "./circuit-result";
import { limitRows } from "./limit-rows";
import { stressRows } from "./stress-rows";

export interface JudgeOptions {
  /** A stress row for each condition instead of the worst alone. */
  readonly everyCondition?: boolean;
  /** Told before each condition: how many are done, of how many, and which comes next. */
  readonly onProgress?: (done: number, of: number, condition: string) => void;
}

/** Solves a circuit in all its conditions and judges it against its derating policy and its limits. */
export function judge(circuit: Circuit, options: JudgeOptions = {}): CircuitResult {
  const { onProgress } = options;
  const solved = solveCircuit(circuit, (done, of) =>
    onProgress?.(done, of, circuit.conditions[done]?.name ?? ""),
  );
  return judgeSolved(circuit, solved, options);
}

/** Judges a circuit that is solved already. */
function judgeSolved(
  circuit: Circuit,
  solved: SolvedCircuit,
  options: JudgeOptions = {},
): CircuitResult {
  return {
    ampersignResult: 1,
    digest: circuit.digest,
    electricalDigest: circuit.electricalDigest,
    engine: engineVersion,
    reference: solved.reference,
    unknowns: solved.unknowns,
    conditions: solved.conditions,
    stress: stressRows(circuit, solved.conditions, options.everyCondition),
    limits: limitRows(circuit, solved.conditions),
    problems: solved.problems,
  };
}
