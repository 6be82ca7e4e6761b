import type { CircuitFile } from "../circuit/circuit-file";
import type { Circuit } from "../kinds/circuit";
import { readCircuitFile } from "../kinds/read-circuit";
import type { CircuitResult } from "../stress/circuit-result";
import { judge } from "../stress/judge";
import { type Band, toleranceBands } from "./band";
import { causesOf } from "./causes";
import type { Comparison, ComparisonProblem, StressShift } from "./comparison";
import type { FileEdit } from "./file-edit";
import { fileEdits } from "./file-edits";
import { matchParts, partName } from "./matching";
import { renamedNets } from "./renamed-nets";
import { renameBase, renamingEdits } from "./renaming";
import { netShifts } from "./shifts";
import { stressShifts } from "./stress-shifts";

/** A revision as written and as read. */
export interface Side {
  readonly file: CircuitFile;
  readonly circuit: Circuit;
}

/**
 * Compares a proposed revision with its base: the edits, the voltages and margins that moved, whether
 * by more than the base's tolerances allow, and which edit moved them. Renaming and renumbering are
 * said to be just that: the base is laid beside the proposed revision under the new names.
 */
export function compare(
  base: Side,
  proposed: Side,
  onProgress?: (done: number, of: number, step: string) => void,
): Comparison {
  const byName = matchParts(base.file, proposed.file);
  const nets = renamedNets(base.file, proposed.file, byName);
  const matching = matchParts(base.file, proposed.file, nets);
  const renamed = renameBase(base.file, matching, nets);
  const read = readCircuitFile(renamed);
  // A renamed base that cannot be read any longer is compared under its old names.
  const file = read.ok ? renamed : base.file;
  const circuit = read.ok ? read.value : base.circuit;
  const edits = fileEdits(file, proposed.file, matchParts(file, proposed.file));
  onProgress?.(0, 4, "base");
  const was = judge(circuit, { everyCondition: true });
  onProgress?.(1, 4, "proposed revision");
  const is = judge(proposed.circuit, { everyCondition: true });
  onProgress?.(2, 4, "tolerance bands");
  const bands = bandsOf(circuit, edits);
  const shifts = netShifts(was, is, bands);
  const stress = stressShifts(was, is);
  onProgress?.(3, 4, "causes");
  const loud = shifts.filter((shift) => shift.significant || shift.crosses.length > 0);
  const causes = causesOf(
    file,
    edits,
    loud,
    stress.filter((shift) => hasShrunk(shift, circuit)),
  );
  onProgress?.(4, 4, "");
  return {
    ampersignComparison: 1,
    base: base.circuit.digest,
    proposed: proposed.circuit.digest,
    edits: [...renamingEdits(base.file, matching, nets), ...edits.map(({ edit }) => edit)],
    nets: shifts,
    stress,
    causes: causes.causes,
    problems: [...sideProblems("base", was), ...sideProblems("proposed", is), ...causes.problems],
  };
}

/** A first issue has nothing before it: every part is an item of its own. */
export function compareWithNothing(proposed: Side): Comparison {
  const edits = Object.entries(proposed.file.blocks).flatMap(([block, { parts }]) =>
    parts.map((part) => ({
      id: `${partName(proposed.file, block, part.ref)} added`,
      change: "added" as const,
      part: partName(proposed.file, block, part.ref),
      is: Object.values(part.params ?? {})[0] ?? part.kind,
    })),
  );
  return {
    ampersignComparison: 1,
    base: "",
    proposed: proposed.circuit.digest,
    edits,
    nets: [],
    stress: [],
    causes: [],
    problems: [],
  };
}

function bandsOf(
  circuit: Circuit,
  edits: readonly FileEdit[],
): ReadonlyMap<string, ReadonlyMap<string, Band>> {
  // Without an edit nothing moves, and no band is asked for.
  if (!edits.some((edit) => edit.electrical)) return new Map();
  return new Map(
    circuit.conditions.map((condition) => [condition.name, toleranceBands(circuit, condition)]),
  );
}

/** A margin at an operating point that has become less. */
function hasShrunk(shift: StressShift, circuit: Circuit): boolean {
  const condition = circuit.conditions.find((one) => one.name === shift.condition);
  if (condition?.analysis.type !== "operatingPoint") return false;
  return shift.was !== null && shift.is !== null && shift.is < shift.was - 1e-6;
}

function sideProblems(side: string, result: CircuitResult): readonly ComparisonProblem[] {
  return result.problems.map((problem) => ({
    code: problem.code,
    message: `${side}: ${problem.message}`,
  }));
}
