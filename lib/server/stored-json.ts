import type { CircuitFile } from "../circuit/circuit-file";
import type { Comparison } from "../comparison/comparison";
import { isCircuitFile } from "../comparison/read-side";
import type { Decision } from "../review/review-state";
import type { CircuitResult } from "../stress/circuit-result";

/*
 * What the database keeps as JSON text was written by this program from typed values, under a digest.
 * It is read back by its mark; another mark is a defect, or a database of another program.
 */

/** A frozen circuit file. */
export function storedCircuit(text: string): CircuitFile {
  const value: unknown = JSON.parse(text);
  if (!isCircuitFile(value)) throw new Error("A stored circuit file cannot be read");
  return value;
}

/** The result of a solver run. */
export function storedResult(text: string): CircuitResult {
  const value: unknown = JSON.parse(text);
  if (!isResult(value)) throw new Error("A stored result cannot be read");
  return value;
}

/** The result of a comparison run. */
export function storedComparison(text: string): Comparison {
  const value: unknown = JSON.parse(text);
  if (!isComparison(value)) throw new Error("A stored comparison cannot be read");
  return value;
}

/** A decision's payload. */
export function storedDecision(value: unknown): Decision {
  if (!isDecision(value)) throw new Error("A stored decision cannot be read");
  return value;
}

function isResult(value: unknown): value is CircuitResult {
  return marked(value, "ampersignResult") && "conditions" in value && "stress" in value;
}

function isComparison(value: unknown): value is Comparison {
  return marked(value, "ampersignComparison") && "edits" in value && "nets" in value;
}

function isDecision(value: unknown): value is Decision {
  return (
    typeof value === "object" &&
    value !== null &&
    "id" in value &&
    "kind" in value &&
    "user" in value
  );
}

function marked(value: unknown, mark: string): value is object {
  return (
    typeof value === "object" &&
    value !== null &&
    new Map<string, unknown>(Object.entries(value)).get(mark) === 1
  );
}
