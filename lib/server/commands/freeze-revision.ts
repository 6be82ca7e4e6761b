import { project } from "../../document/projection";
import { compareAddress, solveAddress } from "../../jobs/run-address";
import { readCircuitFile } from "../../kinds/read-circuit";
import type { FileProblem } from "../../values/problem";
import { fail, ok, type Result } from "../../values/result";
import { nextRevisionLetter } from "../../values/revision-letter";
import { appendAudit, inTransaction } from "../decide";
import { storedDocument } from "../document-state";
import { requestRun } from "../run-requests";
import type { ActingMember } from "../sign-in";
import { designOf, type NotFound } from "./design-of";

export type NotFrozen =
  | NotFound
  | { readonly kind: "notADesigner" }
  | { readonly kind: "noChangeNote" }
  /** The draft is no circuit file that could be solved: each problem with its place. */
  | { readonly kind: "draftHasProblems"; readonly problems: readonly FileProblem[] }
  /** A merge left something to mend by hand. */
  | { readonly kind: "draftNeedsRepair"; readonly sentences: readonly string[] }
  /** Nothing was edited since the last revision. */
  | { readonly kind: "nothingNew"; readonly letter: string };

/**
 * Freezes the draft as it is stored now: the next letter, its circuit file and digest, a review against
 * the latest released revision, and the runs that solve and compare it. @returns the letter
 */
export async function freezeRevision(
  member: ActingMember,
  given: { readonly number: string; readonly changeNote: string; readonly at?: string },
): Promise<Result<string, NotFrozen>> {
  if (!member.roles.includes("designer")) return fail({ kind: "notADesigner" });
  const changeNote = given.changeNote.trim();
  if (changeNote === "") return fail({ kind: "noChangeNote" });
  const design = await designOf(member, given.number);
  if (!design.ok) return design;
  const draft = await draftOf(design.value.id);
  if (!draft.ok) return draft;
  const { circuit, text } = draft.value;
  const at = given.at ?? new Date().toISOString();
  const frozen = await inTransaction(async (transaction) => {
    // Two who freeze at once take turns: the second sees the first one's letter.
    await transaction.$queryRaw`select id from "Design" where id = ${design.value.id} for update`;
    const revisions = await transaction.revision.findMany({
      where: { designId: design.value.id },
      orderBy: { frozenAt: "asc" },
    });
    const last = revisions.at(-1) ?? null;
    if (last !== null && last.digest === circuit.digest && last.state !== "returned")
      return fail({ kind: "nothingNew" as const, letter: last.letter });
    const base = revisions.filter((one) => one.releasedAt !== null).at(-1) ?? null;
    const letter = nextRevisionLetter(last?.letter ?? null);
    const revision = {
      designId: design.value.id,
      letter,
      circuit: text,
      digest: circuit.digest,
      changeNote,
      authors: await authorsSince(
        transaction,
        design.value.id,
        last?.frozenAt ?? null,
        member.user,
      ),
      frozenAt: new Date(at),
      baseLetter: base?.letter ?? null,
      state: "underReview",
      runAddress: solveAddress(circuit.digest),
      comparisonAddress: compareAddress(circuit.digest, base?.digest ?? null),
    };
    await transaction.revision.create({ data: revision });
    await appendAudit(transaction, member.workspace, {
      at,
      actor: member.user,
      action: "revision frozen",
      subject: design.value.id,
      payload: { letter, digest: circuit.digest, changeNote, base: base?.letter ?? null },
    });
    return ok({ letter, base: base?.circuit ?? null, revision });
  });
  if (!frozen.ok) return frozen;
  const { letter, base, revision } = frozen.value;
  await requestRun({ address: revision.runAddress, kind: "solve", proposed: text, base: null });
  await requestRun({ address: revision.comparisonAddress, kind: "compare", proposed: text, base });
  return ok(letter);
}

async function draftOf(design: string) {
  const doc = await storedDocument(design);
  if (doc === null) return fail({ kind: "notFound" as const });
  const { file, problems } = project(doc);
  doc.destroy();
  if (problems.length > 0)
    return fail({
      kind: "draftNeedsRepair" as const,
      sentences: problems.map((problem) => problem.message),
    });
  const circuit = readCircuitFile(file);
  if (!circuit.ok) return fail({ kind: "draftHasProblems" as const, problems: circuit.error });
  return ok({ circuit: circuit.value, text: JSON.stringify(file) });
}

/** Whoever edited the circuit since the last freeze, and the one who freezes. */
async function authorsSince(
  transaction: Parameters<Parameters<typeof inTransaction>[0]>[0],
  design: string,
  since: Date | null,
  freezer: string,
): Promise<string[]> {
  const members = await transaction.documentUpdate.findMany({
    where: {
      designId: design,
      author: { not: null },
      ...(since !== null && { at: { gt: since } }),
    },
    distinct: ["author"],
    select: { author: true },
  });
  const editors = members.flatMap(({ author }) => (author === null ? [] : [author]));
  const designers = await transaction.member.findMany({
    where: { userId: { in: editors }, roles: { has: "designer" } },
    select: { userId: true },
  });
  return [...new Set([freezer, ...designers.map(({ userId }) => userId)])];
}
