import { randomUUID } from "node:crypto";
import type { Decision } from "../../review/review-state";
import { fail, ok, type Result } from "../../values/result";
import { inTransaction, storeDecision } from "../decide";
import { reviewOf } from "../review-of";
import type { ActingMember } from "../sign-in";
import type { About, NotDecided } from "./review-decisions";

/** Returns a revision to its authors: it stays as it is, and is no longer under review. */
export async function returnRevision(
  member: ActingMember,
  about: About,
  reason: string,
): Promise<Result<Decision, NotDecided>> {
  const review = await reviewOf(member, about.number, about.letter);
  if (!review.ok) return review;
  if (review.value.revision.state !== "underReview") return fail({ kind: "notUnderReview" });
  if (review.value.revision.authors.includes(member.user)) return fail({ kind: "authorOfIt" });
  if (!member.roles.some((role) => role === "reviewer" || role === "approver"))
    return fail({ kind: "noRight" });
  if (reason.trim() === "") return fail({ kind: "noReason" });
  const decision: Decision = {
    id: randomUUID(),
    kind: "return",
    user: member.user,
    at: about.at ?? new Date().toISOString(),
    revision: about.letter,
    reason: reason.trim(),
  };
  const design = review.value.design.id;
  await inTransaction(async (transaction) => {
    await transaction.revision.update({
      where: { designId_letter: { designId: design, letter: about.letter } },
      data: { state: "returned" },
    });
    await storeDecision(transaction, member.workspace, design, decision);
  });
  return ok(decision);
}
