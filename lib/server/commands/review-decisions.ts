import { randomUUID } from "node:crypto";
import { changedItems } from "../../review/changed-items";
import { mayDecideFinding, standingClosures } from "../../review/finding-states";
import { limitMargin, limitSubject } from "../../review/limit-words";
import type { Decision, WaiverSubject } from "../../review/review-state";
import { grantedWaivers, waiverOfLimit, waiverOfRow } from "../../review/waivers";
import { fail, ok, type Result } from "../../values/result";
import { inTransaction, storeDecision } from "../decide";
import { type ReviewOf, reviewOf } from "../review-of";
import type { ActingMember } from "../sign-in";
import { lockedDesignOf, type NotFound } from "./design-of";

export type NotDecided =
  | NotFound
  | { readonly kind: "notUnderReview" }
  | { readonly kind: "noRight" }
  /** Nobody checks, waives or closes for the own revision. */
  | { readonly kind: "authorOfIt" }
  | { readonly kind: "noReason" }
  | { readonly kind: "noSuchItem" }
  | { readonly kind: "noSuchFinding" }
  | { readonly kind: "alreadySo" }
  | { readonly kind: "nothingToWaive" }
  /** The number to be waived is not the one that the person saw. */
  | { readonly kind: "changedMeanwhile" };

type Decided = Promise<Result<Decision, NotDecided>>;

/** Which revision a decision is about. */
export interface About {
  readonly number: string;
  readonly letter: string;
  /** ISO 8601, UTC; now where absent. The seed tells a story that has already happened. */
  readonly at?: string;
}

/** Marks a changed item as checked, or takes the mark away. */
export async function checkItem(
  member: ActingMember,
  about: About,
  item: string,
  checked: boolean,
): Decided {
  return decide(member, about, (review, common) => {
    if (review.revision.authors.includes(member.user)) return fail({ kind: "authorOfIt" });
    if (!canWrite(member)) return fail({ kind: "noRight" });
    const known =
      review.comparison !== null && changedItems(review.comparison).some((one) => one.id === item);
    if (!known) return fail({ kind: "noSuchItem" });
    return ok({ ...common, kind: checked ? "check" : "uncheck", revision: about.letter, item });
  });
}

/** Closes a finding with a disposition, or opens it again. */
export async function decideFinding(
  member: ActingMember,
  about: About,
  finding: string,
  decision: "closure" | "reopening",
  reason: string,
): Decided {
  return decide(member, about, (review, common) => {
    const found = review.findings.find((one) => one.id === finding);
    if (found === undefined) return fail({ kind: "noSuchFinding" });
    if (!mayDecideFinding(found, { id: member.user, roles: member.roles }))
      return fail({ kind: "noRight" });
    if (reason.trim() === "") return fail({ kind: "noReason" });
    const closed = standingClosures(review.decisions).has(finding);
    if (closed === (decision === "closure")) return fail({ kind: "alreadySo" });
    return ok({ ...common, kind: decision, finding, reason: reason.trim() });
  });
}

/**
 * Grants a waiver for a margin or a limit that is not met, at the number it has now.
 * @param shown the margin that the person saw (null: unknown); another one is not waived
 */
export async function grantWaiver(
  member: ActingMember,
  about: About,
  subject: WaiverSubject,
  shown: number | null,
  reason: string,
): Decided {
  return decide(member, about, (review, common) => {
    if (!member.roles.includes("approver")) return fail({ kind: "noRight" });
    if (review.revision.authors.includes(member.user)) return fail({ kind: "authorOfIt" });
    if (reason.trim() === "") return fail({ kind: "noReason" });
    const margin = waivableMargin(review, subject);
    if (margin === undefined) return fail({ kind: "nothingToWaive" });
    if (isWaived(review, subject)) return fail({ kind: "alreadySo" });
    if (!Object.is(margin, shown)) return fail({ kind: "changedMeanwhile" });
    const granted = review.decisions.filter((decision) => decision.kind === "waiver").length;
    return ok({
      ...common,
      kind: "waiver",
      number: `W-${granted + 1}`,
      revision: about.letter,
      subject,
      reason: reason.trim(),
      margin,
    });
  });
}

/** Takes a waiver back. */
export async function withdrawWaiver(
  member: ActingMember,
  about: About,
  waiver: string,
  reason: string,
): Decided {
  return decide(member, about, (review, common) => {
    if (!member.roles.includes("approver")) return fail({ kind: "noRight" });
    if (reason.trim() === "") return fail({ kind: "noReason" });
    const granted = grantedWaivers(review.decisions).some((one) => one.number === waiver);
    if (!granted) return fail({ kind: "nothingToWaive" });
    return ok({ ...common, kind: "withdrawal", waiver, reason: reason.trim() });
  });
}

/** The margin that a waiver would cover, as its dialog shows it; null: unknown; undefined: there is nothing to waive. */
export function waivableMargin(
  review: ReviewOf,
  subject: WaiverSubject,
): number | null | undefined {
  if ("limit" in subject) {
    const row = review.result?.limits.find(
      (one) => one.condition === subject.condition && limitSubject(one) === subject.limit,
    );
    return row === undefined || row.verdict === "pass" ? undefined : limitMargin(row);
  }
  const row = review.result?.stress.find(
    (one) =>
      one.part === subject.part &&
      one.rule.id === subject.rule &&
      one.condition === subject.condition,
  );
  return row === undefined || row.verdict === "pass" ? undefined : row.margin;
}

/** Whether a waiver covers the subject at the number it has now. */
function isWaived(review: ReviewOf, subject: WaiverSubject): boolean {
  const waivers = grantedWaivers(review.decisions);
  if ("limit" in subject)
    return (review.result?.limits ?? []).some(
      (row) =>
        row.condition === subject.condition &&
        limitSubject(row) === subject.limit &&
        waiverOfLimit(row, waivers) !== null,
    );
  return (review.result?.stress ?? []).some(
    (row) =>
      row.part === subject.part &&
      row.rule.id === subject.rule &&
      row.condition === subject.condition &&
      waiverOfRow(row, waivers) !== null,
  );
}

function canWrite(member: ActingMember): boolean {
  return member.roles.some((role) => role !== "observer");
}

interface Common {
  readonly id: string;
  readonly user: string;
  readonly at: string;
}

async function decide(
  member: ActingMember,
  about: About,
  make: (review: ReviewOf, common: Common) => Result<Decision, NotDecided>,
): Decided {
  return inTransaction(async (transaction) => {
    const design = await lockedDesignOf(transaction, member, about.number);
    if (!design.ok) return design;
    const review = await reviewOf(member, about.number, about.letter, transaction);
    if (!review.ok) return review;
    if (review.value.revision.state !== "underReview") return fail({ kind: "notUnderReview" });
    const decision = make(review.value, {
      id: randomUUID(),
      user: member.user,
      at: about.at ?? new Date().toISOString(),
    });
    if (!decision.ok) return decision;
    await storeDecision(transaction, member.workspace, design.value.id, decision.value);
    return decision;
  });
}
