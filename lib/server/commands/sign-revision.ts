import { randomUUID } from "node:crypto";
import type { TransactionClient } from "../../database/client";
import { boundDigest } from "../../record/bound-digest";
import type { Decision } from "../../review/review-state";
import { type MayNotSign, type Meaning, maySign } from "../../review/signing";
import { fail, ok, type Result } from "../../values/result";
import { inTransaction, storeDecision } from "../decide";
import { type ReviewOf, reviewOf, standingSignatures } from "../review-of";
import type { ActingMember, Proof } from "../sign-in";
import { lockedDesignOf, type NotFound } from "./design-of";
import type { About } from "./review-decisions";

export type NotSigned =
  | NotFound
  | MayNotSign
  | { readonly kind: "notSolved" }
  | { readonly kind: "proofOfAnother" }
  /** Something that the signature would bind differs from what the person saw. */
  | { readonly kind: "changedMeanwhile"; readonly what: readonly string[] };

/**
 * Signs a revision: name, time, meaning, bound to the digests of circuit, base, results, policy,
 * findings and decisions as they stand at this moment. The approver's signature releases the revision
 * and supersedes the one before. `seen`: the digests that the person's page showed.
 */
export async function signRevision(
  member: ActingMember,
  about: About,
  meaning: Meaning,
  proof: Proof,
  seen: Readonly<Record<string, string | null>>,
): Promise<Result<Decision, NotSigned>> {
  if (proof.user !== member.user) return fail({ kind: "proofOfAnother" });
  return inTransaction(async (transaction) => {
    const design = await lockedDesignOf(transaction, member, about.number);
    if (!design.ok) return design;
    const read = await reviewOf(member, about.number, about.letter, transaction);
    if (!read.ok) return read;
    const review = read.value;
    if (review.result === null || review.comparison === null) return fail({ kind: "notSolved" });
    const may = maySign(
      meaning,
      { id: member.user, roles: member.roles },
      {
        underReview: review.revision.state === "underReview",
        authors: review.revision.authors,
        criteria: review.criteria,
        signatures: standingSignatures(review),
      },
    );
    if (!may.ok) return may;
    // What was not shown counts as changed: nobody signs unseen.
    const changed = Object.entries(review.bound).filter(([name, digest]) => seen[name] !== digest);
    if (changed.length > 0)
      return fail({ kind: "changedMeanwhile", what: changed.map(([name]) => name) });
    const at = about.at ?? new Date().toISOString();
    const signature: Decision = {
      id: randomUUID(),
      kind: "signature",
      user: member.user,
      at,
      revision: about.letter,
      meaning,
      boundDigest: boundDigest(review.bound, meaning),
      method: proof.method,
      name: member.name,
    };
    const signed = { workspace: member.workspace, design: design.value.id, user: member.user };
    await storeDecision(transaction, signed.workspace, signed.design, signature);
    if (meaning === "approved") await release(transaction, signed, review, at);
    return ok(signature);
  });
}

/** The revision is released, and the one released before is superseded. */
async function release(
  transaction: TransactionClient,
  by: { readonly workspace: string; readonly design: string; readonly user: string },
  review: ReviewOf,
  at: string,
): Promise<void> {
  const { letter } = review.revision;
  await transaction.revision.updateMany({
    where: { designId: by.design, state: "released" },
    data: { state: "superseded" },
  });
  await transaction.revision.update({
    where: { designId_letter: { designId: by.design, letter } },
    data: { state: "released", releasedAt: new Date(at) },
  });
  await storeDecision(transaction, by.workspace, by.design, {
    id: randomUUID(),
    kind: "release",
    user: by.user,
    at,
    revision: letter,
    findings: review.findings,
  });
}
