import type { CircuitFile } from "../circuit/circuit-file";
import { parseJson } from "../circuit/json-text";
import { readCircuit, readCircuitFile } from "../kinds/read-circuit";
import type { FileProblem } from "../values/problem";
import { fail, ok, type Result } from "../values/result";
import type { Side } from "./compare";

/** Reads the text of a circuit file as one side of a comparison. */
export function readSide(text: string): Result<Side, readonly FileProblem[]> {
  const circuit = readCircuit(text);
  if (!circuit.ok) return circuit;
  const parsed = parseJson(text);
  if (!parsed.ok) return fail([parsed.error]);
  const { value } = parsed.value;
  if (!isCircuitFile(value)) return fail([]);
  return ok({ file: value, circuit: circuit.value });
}

/** Whether a JSON value is a circuit file: what its reader accepts has its shape. */
export function isCircuitFile(value: unknown): value is CircuitFile {
  return readCircuitFile(value).ok;
}
