import type { Projection } from "../../lib/document/projection";
import { limitSubject } from "../../lib/review/limit-words";
import type { PreviewAnswer } from "../preview/preview-answer";
import { voltageWords } from "../wording/numbers";
import { quantityName, quantityUnit } from "../wording/quantities";

/** Something that stands against the draft, worst first. */
export interface DraftProblem {
  readonly weight: "fault" | "hint";
  readonly words: string;
}

/** What projection had to repair, what the reader says of the file, what cannot be solved, and what is over its limit. */
export function draftProblems(
  projection: Projection,
  answer: PreviewAnswer | null,
): readonly DraftProblem[] {
  const repaired = projection.problems.map(
    (problem): DraftProblem => ({ weight: "fault", words: problem.message }),
  );
  if (answer === null) return repaired;
  if (answer.kind === "badFile")
    return [
      ...repaired,
      ...answer.problems.map(
        (problem): DraftProblem => ({
          weight: "fault",
          words: `${problem.message} (${placeOf(projection, problem.at)})`,
        }),
      ),
    ];
  const { result } = answer;
  const unsolved = result.problems.map(
    (problem): DraftProblem => ({
      weight: "fault",
      words: `${problem.condition}: ${problem.message}`,
    }),
  );
  const limits = result.limits
    .filter((row) => row.verdict === "fail")
    .map(
      (row): DraftProblem => ({
        weight: "fault",
        words: `${limitSubject(row)} ${voltageWords(row.low)}${row.low === row.high ? "" : ` to ${voltageWords(row.high)}`} V, allowed ${row.min ?? "any"} to ${row.max ?? "any"} V, ${row.condition}`,
      }),
    );
  const stress = result.stress
    .filter((row) => row.verdict === "fail")
    .map(
      (row): DraftProblem => ({
        weight: "fault",
        words: `${row.part} ${quantityName(row.quantity)} ${row.applied?.toPrecision(4) ?? "?"} ${quantityUnit(row.quantity)}, allowed ${row.limit?.toPrecision(4) ?? "?"}, ${row.condition}`,
      }),
    );
  const unknown = new Set(
    result.stress
      .filter((row) => row.verdict === "unknown")
      .map((row) => `${row.part} cannot be judged: needs ${(row.needs ?? []).join(", ")}`),
  );
  return [
    ...repaired,
    ...unsolved,
    ...limits,
    ...stress,
    ...[...unknown].map((words): DraftProblem => ({ weight: "hint", words })),
  ];
}

/** `/blocks/main/parts/3/params/resistance` as `R2 resistance`. */
function placeOf(projection: Projection, pointer: string): string {
  const [, , block = "", , index = "", ...rest] = pointer.split("/");
  const part = projection.file.blocks[block]?.parts[Number(index)];
  if (!pointer.includes("/parts/") || part === undefined) return pointer;
  return [part.ref, ...rest.filter((word) => word !== "params")].join(" ");
}
