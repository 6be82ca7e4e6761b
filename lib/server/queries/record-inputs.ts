import { database } from "../../database/client";
import type { RecordInputs } from "../../record/review-record";
import { fail, ok, type Result } from "../../values/result";
import type { NotFound } from "../commands/design-of";
import { type ReviewOf, reviewOf } from "../review-of";
import type { ActingMember } from "../sign-in";

/**
 * What the record of a revision is built from, but for the cautions. The audit entries are the whole
 * workspace's, up to the one that tells of this release: a chain by hash is checked link by link, so that leaving out
 * other designs' entries would leave nothing to check. They are given as stored: a gap is for whoever verifies to see.
 */
export async function recordInputs(
  member: ActingMember,
  number: string,
  letter: string,
): Promise<Result<Omit<RecordInputs, "cautions">, NotFound | { readonly kind: "notSolved" }>> {
  const read = await reviewOf(member, number, letter);
  if (!read.ok) return read;
  const review = read.value;
  if (review.result === null) return fail({ kind: "notSolved" });
  const workspace = await database().workspace.findUniqueOrThrow({
    where: { id: member.workspace },
    select: { name: true },
  });
  const { revision, base, people, file, baseFile } = review;
  const entries = await entriesUntil(member.workspace, review);
  return ok({
    design: { number, title: review.design.title, workspace: workspace.name },
    revision: {
      letter,
      changeNote: revision.changeNote,
      frozenAt: revision.frozenAt.toISOString(),
      authors: revision.authors,
      digest: revision.digest,
      circuit: file,
    },
    base:
      base === null || baseFile === null
        ? null
        : {
            letter: base.letter,
            changeNote: base.changeNote,
            frozenAt: base.frozenAt.toISOString(),
            authors: base.authors,
            digest: base.digest,
            circuit: baseFile,
          },
    result: review.result,
    comparison: review.comparison,
    criteria: review.criteria,
    findings: review.findings,
    decisions: review.decisions,
    people: people.map((person) => ({
      ...person,
      independent: !revision.authors.includes(person.id),
    })),
    audit: entries.map((entry) => ({
      seq: entry.seq,
      at: entry.at.toISOString(),
      actor: entry.actor,
      action: entry.action,
      subject: entry.subject,
      payload: entry.payload,
      previousHash: entry.previousHash,
      hash: entry.hash,
    })),
    releasedAt: revision.releasedAt?.toISOString() ?? null,
    drawnUpAt: new Date().toISOString(),
    policy: file.policy ?? null,
  });
}

/** By the place in the chain and not by time, which may run back between entries. Without a release: all. */
async function entriesUntil(workspace: string, review: ReviewOf) {
  const last = await database().auditEntry.findFirst({
    where: {
      workspaceId: workspace,
      subject: review.design.id,
      action: "release",
      payload: { path: ["revision"], equals: review.revision.letter },
    },
    orderBy: { seq: "desc" },
    select: { seq: true },
  });
  return database().auditEntry.findMany({
    where: { workspaceId: workspace, ...(last !== null && { seq: { lte: last.seq } }) },
    orderBy: { seq: "asc" },
  });
}
