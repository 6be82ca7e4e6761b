import type { ReviewView } from "../../review/views";
import { ok, type Result } from "../../values/result";
import type { NotFound } from "../commands/design-of";
import { reviewOf } from "../review-of";
import type { ActingMember } from "../sign-in";
import { designView, memberView, personView, revisionView, runView } from "./design-view";

/** The review of a revision, for its page. */
export async function reviewView(
  member: ActingMember,
  number: string,
  letter: string,
): Promise<Result<ReviewView, NotFound>> {
  const read = await reviewOf(member, number, letter);
  if (!read.ok) return read;
  const review = read.value;
  const { revision, base, people } = review;
  return ok({
    design: await designView(review.design, review.revisions, people),
    me: memberView(member),
    people: people.map(personView),
    proposed: revisionView(revision, people),
    proposedFile: review.file,
    run: runView(revision.runAddress, review.run),
    result: review.result,
    base: base === null ? null : revisionView(base, people),
    baseFile: review.baseFile,
    baseResult: review.baseResult,
    comparisonRun: runView(revision.comparisonAddress, review.comparisonRun),
    comparison: review.comparison,
    findings: review.findings,
    decisions: review.decisions,
    newerUnderReview: review.newerUnderReview,
    bound: { ...review.bound },
  });
}
