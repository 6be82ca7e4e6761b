import type { CircuitResult, StressRow } from "../stress/circuit-result";
import { type Verdict, worst } from "../values/verdict";
import { changedItems } from "./changed-items";
import { latestChecks } from "./checks";
import type { CriterionId, ExitCriterion } from "./exit-criterion";
import { standingClosures } from "./finding-states";
import { limitSubject } from "./limit-words";
import type { ReviewState } from "./review-state";
import { grantedWaivers, waiverOfLimit, waiverOfRow } from "./waivers";

/*
 * The laws, each with the number that tests quote:
 * [EX1] solved: every condition is solved and has a certificate.
 * [EX2] limits: every limit is met, or stands under a waiver.
 * [EX3] stress: every margin is at or above zero, or stands under a waiver.
 * [EX4] ratings: every part with a rule has what the rule needs, or the gap stands under a waiver.
 * [EX5] findings: every major finding is closed by the person who raised it or by an approver.
 * [EX6] checked: every changed item is checked by someone who did not author the revision.
 * [EX7] newest: no newer revision of the design is under review.
 * [EX8] What is not known is not met: without results, or with nothing to judge, the verdict is unknown.
 */

/** The exit criteria of one revision, in the order of the title block. */
export function exitCriteria(state: ReviewState): readonly ExitCriterion[] {
  return [
    solved(state),
    limits(state),
    stress(state),
    ratings(state),
    findings(state),
    checked(state),
    newest(state),
  ];
}

/** Whether every criterion is met: only then may an approver sign. */
export function allMet(criteria: readonly ExitCriterion[]): boolean {
  return criteria.length > 0 && criteria.every((criterion) => criterion.verdict === "pass");
}

interface Judged {
  readonly verdict: Verdict;
  readonly words: string;
  readonly waiver: string | null;
}

const NOT_SOLVED = ["waits for the solver's results"];

/** Puts judged things together; nothing judged is unknown. */
function criterion(id: CriterionId, judged: readonly Judged[], whenNothing: string): ExitCriterion {
  const open = judged.filter((one) => one.verdict !== "pass" && one.waiver === null);
  return {
    id,
    verdict: worst(judged.map((one) => (one.waiver === null ? one.verdict : "pass"))),
    met: judged.length - open.length,
    of: judged.length,
    open: judged.length === 0 ? [whenNothing] : open.map((one) => one.words),
    waived: judged.flatMap((one) => (one.waiver === null ? [] : [one.waiver])),
  };
}

function waiting(id: CriterionId): ExitCriterion {
  return { id, verdict: "unknown", met: 0, of: 0, open: NOT_SOLVED, waived: [] };
}

function solved({ result }: ReviewState): ExitCriterion {
  if (result === null) return waiting("solved");
  const judged = result.conditions.map(
    (condition): Judged => ({
      verdict: condition.status === "solved" && condition.certificate !== null ? "pass" : "fail",
      words: `${condition.name} is not solved`,
      waiver: null,
    }),
  );
  return criterion("solved", judged, "there is no condition to solve");
}

function limits({ result, decisions }: ReviewState): ExitCriterion {
  if (result === null) return waiting("limits");
  const waivers = grantedWaivers(decisions);
  const judged = result.limits.map(
    (row): Judged => ({
      verdict: row.verdict,
      words: `${limitSubject(row)}, ${row.condition}`,
      waiver: waiverOfLimit(row, waivers),
    }),
  );
  return criterion("limits", judged, "no limit is set: nothing holds the results");
}

function stress({ result, decisions }: ReviewState): ExitCriterion {
  if (result === null) return waiting("stress");
  const waivers = grantedWaivers(decisions);
  const judged = [...worstOpenRows(result, (row) => waiverOfRow(row, waivers)).values()].map(
    (row): Judged => ({
      verdict: row.verdict,
      words: `${row.part} ${row.quantity}, ${row.condition}`,
      waiver: waiverOfRow(row, waivers),
    }),
  );
  return criterion("stress", judged, "no rule of the policy applies to any part");
}

/** One row for each part and rule: one that nothing covers before one that is waived, fail before unknown before pass. */
function worstOpenRows(
  result: CircuitResult,
  waiver: (row: StressRow) => string | null,
): ReadonlyMap<string, StressRow> {
  const rank = (row: StressRow): number => {
    if (row.verdict === "pass") return 3;
    if (waiver(row) !== null) return 2;
    return row.verdict === "fail" ? 0 : 1;
  };
  const worst = new Map<string, StressRow>();
  for (const row of result.stress) {
    const key = `${row.part}\n${row.rule.id}`;
    const held = worst.get(key);
    if (held === undefined || rank(row) < rank(held)) worst.set(key, row);
  }
  return worst;
}

function ratings({ result, decisions }: ReviewState): ExitCriterion {
  if (result === null) return waiting("ratings");
  const waivers = grantedWaivers(decisions);
  const parts = new Map<string, Judged>();
  for (const row of result.stress) {
    const missing = row.verdict === "unknown" && (row.needs?.length ?? 0) > 0;
    const waiver = missing ? waiverOfRow(row, waivers) : null;
    const held = parts.get(row.part);
    if (held !== undefined && (!missing || (held.verdict !== "pass" && held.waiver === null)))
      continue;
    parts.set(row.part, {
      verdict: missing ? "unknown" : "pass",
      words: `${row.part} needs ${(row.needs ?? []).join(", ")}`,
      waiver,
    });
  }
  return criterion("ratings", [...parts.values()], "no rule of the policy applies to any part");
}

function findings(state: ReviewState): ExitCriterion {
  const closures = standingClosures(state.decisions);
  const judged = state.findings
    .filter((finding) => finding.severity === "major")
    .map((finding): Judged => {
      const closure = closures.get(finding.id);
      const rightful =
        closure !== undefined &&
        (closure.user === finding.author || state.approvers.includes(closure.user));
      return {
        verdict: rightful ? "pass" : "fail",
        words: `finding ${finding.number}`,
        waiver: null,
      };
    });
  const result = criterion("findings", judged, "");
  // No major finding at all is what one hopes for.
  return judged.length === 0 ? { ...result, verdict: "pass", open: [] } : result;
}

function checked(state: ReviewState): ExitCriterion {
  if (state.comparison === null) return waiting("checked");
  const checks = latestChecks(state.decisions, state.revision);
  const judged = changedItems(state.comparison).map((item): Judged => {
    const check = checks.get(item.id);
    const independent = check !== undefined && !state.authors.includes(check.user);
    return {
      verdict: independent ? "pass" : "unknown",
      words: [item.part ?? item.net ?? item.condition ?? item.limit ?? "circuit", item.key]
        .filter((word) => word !== undefined)
        .join(" "),
      waiver: null,
    };
  });
  const result = criterion("checked", judged, "");
  return judged.length === 0 ? { ...result, verdict: "pass", open: [] } : result;
}

function newest({ newerUnderReview }: ReviewState): ExitCriterion {
  return {
    id: "newest",
    verdict: newerUnderReview.length === 0 ? "pass" : "fail",
    met: 0,
    of: 0,
    open: newerUnderReview.map((letter) => `Rev ${letter} is under review`),
    waived: [],
  };
}
