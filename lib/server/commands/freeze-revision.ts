import type { TransactionClient } from "../../database/client";
import { SolverRuns } from "../../database/solver-runs";
import { project } from "../../document/projection";
import { compareAddress, solveAddress } from "../../jobs/run-address";
import { readCircuitFile } from "../../kinds/read-circuit";
import { engineVersion } from "../../mna/engine-version";
import type { FileProblem } from "../../values/problem";
import { fail, ok, type Result } from "../../values/result";
import { nextRevisionLetter } from "../../values/revision-letter";
import { appendAudit, inTransaction } from "../decide";
import { storedDocument } from "../document-state";
import { draftEditors } from "../draft-editors";
import { revisionsOf } from "../review-of";
import { wakeWorkers } from "../run-requests";
import type { ActingMember } from "../sign-in";
import { lockedDesignOf, type NotFound } from "./design-of";

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
  const at = given.at ?? new Date().toISOString();
  const frozen = await inTransaction(async (transaction) => {
    // Two who freeze at once take turns: the second sees the first one's letter, and the draft as it is then.
    const design = await lockedDesignOf(transaction, member, given.number);
    if (!design.ok) return design;
    const draft = await draftOf(transaction, design.value.id);
    if (!draft.ok) return draft;
    const { circuit, text } = draft.value;
    const revisions = await revisionsOf(design.value.id, transaction);
    const last = revisions.at(-1) ?? null;
    if (last !== null && last.digest === circuit.digest && last.state !== "returned")
      return fail({ kind: "nothingNew" as const, letter: last.letter });
    const base = revisions.filter((one) => one.releasedAt !== null).at(-1) ?? null;
    const letter = nextRevisionLetter(last?.letter ?? null);
    // Everything since the base is under review, what a returned revision brought too.
    const editors = await draftEditors(transaction, design.value.id, base?.frozenAt ?? null);
    const between = revisions.slice(base === null ? 0 : revisions.indexOf(base) + 1);
    const earlier = between.flatMap((one) => one.authors);
    const revision = {
      designId: design.value.id,
      letter,
      circuit: text,
      digest: circuit.digest,
      changeNote,
      authors: [...new Set([member.user, ...editors, ...earlier])],
      frozenAt: new Date(at),
      baseLetter: base?.letter ?? null,
      state: "underReview",
      runAddress: solveAddress(circuit.digest),
      comparisonAddress: compareAddress(circuit.digest, base?.digest ?? null),
    };
    const runs = new SolverRuns(transaction);
    const proposed = { proposed: text, engine: engineVersion };
    await runs.request({ ...proposed, address: revision.runAddress, kind: "solve", base: null });
    await runs.request({
      ...proposed,
      address: revision.comparisonAddress,
      kind: "compare",
      base: base?.circuit ?? null,
    });
    await transaction.revision.create({ data: revision });
    await appendAudit(transaction, member.workspace, {
      at,
      actor: member.user,
      action: "revision frozen",
      subject: design.value.id,
      payload: { letter, digest: circuit.digest, changeNote, base: base?.letter ?? null },
    });
    return ok(revision);
  });
  if (!frozen.ok) return frozen;
  await wakeWorkers([frozen.value.runAddress, frozen.value.comparisonAddress]);
  return ok(frozen.value.letter);
}

async function draftOf(transaction: TransactionClient, design: string) {
  const doc = await storedDocument(design, transaction);
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
