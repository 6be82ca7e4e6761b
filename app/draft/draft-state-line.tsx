import type { PreviewAnswer } from "../preview/preview-answer";
import { tinyWords } from "../wording/numbers";

/** The line at the foot of a draft: how fresh the voltages are, their certificate, and that they are a preview. */
export function DraftStateLine(props: {
  readonly answer: PreviewAnswer | null;
  readonly stale: boolean;
  readonly condition: string;
}) {
  const { answer, stale, condition } = props;
  const certificate =
    answer?.kind === "solved"
      ? (answer.result.conditions.find((one) => one.name === condition)?.certificate ?? null)
      : null;
  return (
    <div className="state" role="status">
      {certificate !== null && !stale && <span className="lamp" aria-hidden="true" />}
      <b>{stateWords(answer, stale)}</b>
      {certificate !== null && (
        <>
          <span>
            {condition}, {certificate.iterations} iterations
          </span>
          <span>
            Kirchhoff residual <span className="num">{tinyWords(certificate.kclResidual)}</span>
          </span>
          <span>
            power balance <span className="num">{tinyWords(certificate.powerBalance)}</span>
          </span>
        </>
      )}
      <span className="right">
        Preview, computed in this browser; a revision is solved again on the server
      </span>
    </div>
  );
}

function stateWords(answer: PreviewAnswer | null, stale: boolean): string {
  if (answer === null || stale) return "Solving …";
  if (answer.kind === "badFile") return "Cannot be solved: see the problems";
  const unsolved = answer.result.problems.length;
  if (unsolved > 0) return "Not every condition has a solution";
  return `Solved in ${Math.max(1, Math.round(answer.milliseconds))} ms`;
}
