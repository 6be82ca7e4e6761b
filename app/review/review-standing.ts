import type { Edit } from "../../lib/comparison/comparison";
import { changedItems } from "../../lib/review/changed-items";
import { latestChecks } from "../../lib/review/checks";
import { conditionMargins, type IsWaived, leastMargin } from "../../lib/review/condition-margins";
import { exitCriteria } from "../../lib/review/exit-criteria";
import type { ExitCriterion } from "../../lib/review/exit-criterion";
import { type Closure, mayDecideFinding, standingClosures } from "../../lib/review/finding-states";
import { limitSubject } from "../../lib/review/limit-words";
import type { Decision, Finding } from "../../lib/review/review-state";
import { type Meaning, maySign, type Signature } from "../../lib/review/signing";
import type { ReviewView } from "../../lib/review/views";
import { grantedWaivers, waiverOfLimit, waiverOfRow } from "../../lib/review/waivers";
import type { LimitRow, StressRow } from "../../lib/stress/circuit-result";
import { waitsWords } from "../wording/signing";

/** Where a review stands, and what the one who looks may do: computed anew from words and decisions. */
export interface ReviewStanding {
  /** The revision is under review: decisions may be taken. */
  readonly open: boolean;
  readonly criteria: readonly ExitCriterion[];
  readonly items: readonly Edit[];
  readonly checkedBy: ReadonlyMap<string, string>;
  readonly checkedParts: readonly string[];
  readonly closures: ReadonlyMap<string, Closure>;
  readonly signatures: ReadonlyMap<Meaning, Signature>;
  /** What each open signature waits for, in words. */
  readonly waits: ReadonlyMap<Meaning, string>;
  /** The signature that the one who looks may give now. */
  readonly mySignature: Meaning | null;
  readonly mayRaise: boolean;
  readonly mayRemark: boolean;
  readonly mayCheck: boolean;
  readonly mayReturn: boolean;
  readonly mayClose: (finding: Finding) => boolean;
  readonly waiverOfRow: (row: StressRow) => string | null;
  readonly waiverOfLimit: (row: LimitRow) => string | null;
  readonly isWaived: IsWaived;
  readonly worstCondition: string | null;
}

const MEANINGS: readonly Meaning[] = ["authored", "reviewed", "approved"];

/** Puts a review's view, its findings and its decisions together. */
export function reviewStanding(
  view: ReviewView,
  findings: readonly Finding[],
  decisions: readonly Decision[],
): ReviewStanding {
  const { me, proposed, comparison } = view;
  const authors = proposed.authors.map((author) => author.id);
  const criteria = exitCriteria({
    revision: proposed.letter,
    authors,
    approvers: view.people
      .filter((person) => person.roles.includes("approver"))
      .map((person) => person.id),
    result: view.result,
    comparison,
    findings,
    decisions,
    newerUnderReview: view.newerUnderReview,
  });
  const waivers = grantedWaivers(decisions);
  const open = proposed.state === "underReview";
  const checks = latestChecks(decisions, proposed.letter);
  const items = comparison === null ? [] : changedItems(comparison);
  const signatures = signaturesOf(decisions, proposed.letter);
  const signing = { underReview: open, authors, criteria, signatures: [...signatures.values()] };
  const verdicts = MEANINGS.map((meaning) => ({ meaning, may: maySign(meaning, me, signing) }));
  const isWaived: IsWaived = (subject) => waivedSubject(view, waivers, subject);
  const canWrite = me.roles.some((role) => role !== "observer");
  return {
    open,
    criteria,
    items,
    checkedBy: namesOfChecks(view, checks),
    checkedParts: items.flatMap((item) =>
      checks.has(item.id) && item.part !== undefined ? [item.part] : [],
    ),
    closures: standingClosures(decisions),
    signatures,
    waits: new Map(
      verdicts.map(({ meaning, may }) => [meaning, may.ok ? "" : waitsWords(may.error)]),
    ),
    mySignature: verdicts.find(({ may }) => may.ok)?.meaning ?? null,
    mayRaise: open && canWrite,
    mayRemark: canWrite,
    mayCheck: open && !authors.includes(me.id) && canWrite,
    mayReturn:
      open &&
      me.roles.some((role) => role === "reviewer" || role === "approver") &&
      !authors.includes(me.id),
    mayClose: (finding) => open && mayDecideFinding(finding, me),
    waiverOfRow: (row) => waiverOfRow(row, waivers),
    waiverOfLimit: (row) => waiverOfLimit(row, waivers),
    isWaived,
    worstCondition: worstCondition(view, isWaived),
  };
}

function signaturesOf(
  decisions: readonly Decision[],
  revision: string,
): ReadonlyMap<Meaning, Signature> {
  const signatures = new Map<Meaning, Signature>();
  for (const decision of decisions)
    if (decision.kind === "signature" && decision.revision === revision)
      signatures.set(decision.meaning, decision);
  return signatures;
}

function namesOfChecks(
  view: ReviewView,
  checks: ReadonlyMap<string, { readonly user: string }>,
): ReadonlyMap<string, string> {
  const nameOf = new Map(view.people.map((person) => [person.id, person.name]));
  return new Map([...checks].map(([item, check]) => [item, nameOf.get(check.user) ?? "someone"]));
}

function waivedSubject(
  view: ReviewView,
  waivers: ReturnType<typeof grantedWaivers>,
  subject: Parameters<IsWaived>[0],
): boolean {
  if ("limit" in subject) {
    return (view.result?.limits ?? []).some(
      (row) =>
        row.condition === subject.condition &&
        limitSubject(row) === subject.limit &&
        waiverOfLimit(row, waivers) !== null,
    );
  }
  const row = view.result?.stress.find(
    (one) =>
      one.part === subject.part &&
      one.rule.id === subject.rule &&
      one.condition === subject.condition,
  );
  return row !== undefined && waiverOfRow(row, waivers) !== null;
}

/** The condition with the least margin that no waiver covers: where a reviewer begins. */
function worstCondition(view: ReviewView, isWaived: IsWaived): string | null {
  const { result } = view;
  if (result === null) return null;
  let worst: { readonly name: string; readonly margin: number } | null = null;
  for (const { name } of result.conditions) {
    const least = leastMargin(conditionMargins(result, name, isWaived));
    if (least !== null && !least.waived && (worst === null || least.margin < worst.margin))
      worst = { name, margin: least.margin };
  }
  return worst?.name ?? null;
}
