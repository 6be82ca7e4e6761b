import { compare, compareWithNothing, type Side } from "../comparison/compare";
import { isCircuitFile } from "../comparison/read-side";
import { readCircuitFile } from "../kinds/read-circuit";
import { judge } from "../stress/judge";
import { numberDifferences } from "./number-differences";
import type { CheckableRecord } from "./read-record";
import { broken, held, type RecordCheck } from "./record-check";

/** Solves and compares the circuits of a record again, and lays every number beside the recorded one. */
export function solvedAgainChecks(record: CheckableRecord): readonly RecordCheck[] {
  const proposed = sideOf(record.revision.circuit);
  if (proposed === null) return [broken("results", "The circuit cannot be read.")];
  const solved = judge(proposed.circuit, { everyCondition: true });
  const differences = numberDifferences(record.result, solved);
  const [first] = differences;
  return [
    first === undefined
      ? held("results", `Solved again (engine ${solved.engine}): every number agrees.`)
      : broken(
          "results",
          `Solved again (engine ${solved.engine}): ${differences.length} differ, first ${first}.`,
        ),
    comparedAgain(record, proposed),
  ];
}

function comparedAgain(record: CheckableRecord, proposed: Side): RecordCheck {
  if (record.comparison === null)
    return record.releasedAt === null
      ? held("comparison", "Not compared yet.")
      : broken("comparison", "The record says released, but holds no comparison.");
  const base = record.base === null ? null : sideOf(record.base.circuit);
  if (record.base !== null && base === null)
    return broken("comparison", "The base circuit cannot be read.");
  const again = base === null ? compareWithNothing(proposed) : compare(base, proposed);
  const differences = numberDifferences(record.comparison, again);
  const [first] = differences;
  return first === undefined
    ? held("comparison", "Compared again: every edit, shift and cause agrees.")
    : broken("comparison", `Compared again: ${differences.length} differ, first ${first}.`);
}

function sideOf(file: unknown): Side | null {
  if (!isCircuitFile(file)) return null;
  const circuit = readCircuitFile(file);
  return circuit.ok ? { file, circuit: circuit.value } : null;
}
