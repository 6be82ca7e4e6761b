import { database } from "../../database/client";
import type { RecordInputs } from "../../record/review-record";
import { fail, ok, type Result } from "../../values/result";
import type { NotFound } from "../commands/design-of";
import { reviewOf } from "../review-of";
import type { ActingMember } from "../sign-in";

/** What the record of a revision is built from, but for the cautions; the audit entries are those of its design. */
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
  const until = revision.releasedAt ?? new Date();
  const entries = await database().auditEntry.findMany({
    where: { workspaceId: member.workspace, at: { lte: until } },
    orderBy: { seq: "asc" },
  });
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
    audit: consecutive(entries).map((entry) => ({
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

/** The unbroken run of entries up to the first gap: a chain is checked link by link. */
function consecutive<T extends { readonly seq: number }>(entries: readonly T[]): readonly T[] {
  const gap = entries.findIndex(
    (entry, index) => index > 0 && entry.seq !== (entries[index - 1]?.seq ?? 0) + 1,
  );
  return gap === -1 ? entries : entries.slice(0, gap);
}
