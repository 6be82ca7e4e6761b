import { randomUUID } from "node:crypto";
import { SolverRuns } from "../../database/solver-runs";
import type { Decision } from "../../review/review-state";
import { fail, ok, type Result } from "../../values/result";
import { inTransaction, storeDecision } from "../decide";
import { type ReviewOf, reviewOf } from "../review-of";
import type { ActingMember } from "../sign-in";
import { lockedDesignOf } from "./design-of";
import type { About, NotDecided } from "./review-decisions";

/** Returns a revision to its authors: it stays as it is, and is no longer under review. */
export async function returnRevision(
  member: ActingMember,
  about: About,
  reason: string,
): Promise<Result<Decision, NotDecided>> {
  return inTransaction(async (transaction) => {
    const design = await lockedDesignOf(transaction, member, about.number);
    if (!design.ok) return design;
    const review = await reviewOf(member, about.number, about.letter, transaction);
    if (!review.ok) return review;
    const refusal = mayNotReturn(member, review.value, reason);
    if (refusal !== null) return fail(refusal);
    const decision: Decision = {
      id: randomUUID(),
      kind: "return",
      user: member.user,
      at: about.at ?? new Date().toISOString(),
      revision: about.letter,
      reason: reason.trim(),
    };
    await transaction.revision.update({
      where: { designId_letter: { designId: design.value.id, letter: about.letter } },
      data: { state: "returned" },
    });
    const runs = new SolverRuns(transaction);
    const { runAddress, comparisonAddress } = review.value.revision;
    for (const address of [runAddress, comparisonAddress])
      await runs.cancel(address, "The revision was returned before this was computed.");
    await storeDecision(transaction, member.workspace, design.value.id, decision);
    return ok(decision);
  });
}

function mayNotReturn(member: ActingMember, review: ReviewOf, reason: string): NotDecided | null {
  if (review.revision.state !== "underReview") return { kind: "notUnderReview" };
  if (review.revision.authors.includes(member.user)) return { kind: "authorOfIt" };
  if (!member.roles.some((role) => role === "reviewer" || role === "approver"))
    return { kind: "noRight" };
  return reason.trim() === "" ? { kind: "noReason" } : null;
}
