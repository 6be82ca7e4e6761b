import type { CircuitFile } from "../circuit/circuit-file";
import { digest } from "../circuit/digest";
import type { Comparison } from "../comparison/comparison";
import { database, type TransactionClient } from "../database/client";
import { readFindings } from "../document/findings";
import { type BoundDigests, boundDigest, boundDigests } from "../record/bound-digest";
import { exitCriteria } from "../review/exit-criteria";
import type { ExitCriterion } from "../review/exit-criterion";
import type { Decision, Finding, Role } from "../review/review-state";
import type { Signature } from "../review/signing";
import type { CircuitResult } from "../stress/circuit-result";
import { fail, ok, type Result } from "../values/result";
import { type DesignRow, designOf, type NotFound } from "./commands/design-of";
import { storedDocument } from "./document-state";
import type { ActingMember } from "./sign-in";
import { storedCircuit, storedComparison, storedDecision, storedResult } from "./stored-json";

export interface WorkspacePerson {
  readonly id: string;
  readonly name: string;
  readonly roles: readonly Role[];
}

type RevisionRow = Awaited<ReturnType<typeof revisionsOf>>[number];
type RunRow = NonNullable<Awaited<ReturnType<typeof runOf>>>;

/** Everything that stands about one revision, read for a page, a decision or the record. */
export interface ReviewOf {
  readonly design: DesignRow;
  readonly revisions: readonly RevisionRow[];
  readonly revision: RevisionRow;
  readonly base: RevisionRow | null;
  readonly file: CircuitFile;
  readonly baseFile: CircuitFile | null;
  readonly run: RunRow | null;
  readonly comparisonRun: RunRow | null;
  readonly result: CircuitResult | null;
  readonly baseResult: CircuitResult | null;
  readonly comparison: Comparison | null;
  readonly findings: readonly Finding[];
  readonly decisions: readonly Decision[];
  readonly people: readonly WorkspacePerson[];
  readonly newerUnderReview: readonly string[];
  readonly criteria: readonly ExitCriterion[];
  readonly bound: BoundDigests;
}

const ROLES: readonly Role[] = ["designer", "reviewer", "approver", "observer"];

/** Reads a revision with all that is known about it; another workspace's is not found. */
export async function reviewOf(
  member: ActingMember,
  number: string,
  letter: string,
  client: TransactionClient = database(),
): Promise<Result<ReviewOf, NotFound>> {
  const design = await designOf(member, number, client);
  if (!design.ok) return design;
  const revisions = await revisionsOf(design.value.id, client);
  const revision = revisions.find((one) => one.letter === letter);
  if (revision === undefined) return fail({ kind: "notFound" });
  const base = revisions.find((one) => one.letter === revision.baseLetter) ?? null;
  // One after the other: within a transaction there is one line to the database.
  const run = await runOf(revision.runAddress, client);
  const comparisonRun = await runOf(revision.comparisonAddress, client);
  const baseRun = base === null ? null : await runOf(base.runAddress, client);
  const allDecisions = await decisionsOf(design.value.id, client);
  const people = await peopleOf(member.workspace, client);
  const allFindings = await findingsOf(design.value.id, client);
  const { decisions, findings } = asReleased(letter, allDecisions, allFindings);
  const result = run?.result == null ? null : storedResult(run.result);
  const comparison = comparisonRun?.result == null ? null : storedComparison(comparisonRun.result);
  const file = storedCircuit(revision.circuit);
  const newerUnderReview = revisions
    .filter(
      (one) =>
        // What came after a release does not undo it.
        revision.releasedAt === null &&
        one.frozenAt > revision.frozenAt &&
        one.state === "underReview",
    )
    .map((one) => one.letter);
  return ok({
    design: design.value,
    revisions,
    revision,
    base,
    file,
    baseFile: base === null ? null : storedCircuit(base.circuit),
    run,
    comparisonRun,
    result,
    baseResult: baseRun?.result == null ? null : storedResult(baseRun.result),
    comparison,
    findings,
    decisions,
    people,
    newerUnderReview,
    criteria: exitCriteria({
      revision: letter,
      authors: revision.authors,
      approvers: people.filter((one) => one.roles.includes("approver")).map((one) => one.id),
      result,
      comparison,
      findings,
      decisions,
      newerUnderReview,
    }),
    bound: boundDigests({
      circuit: revision.digest,
      base: base?.digest ?? null,
      results: run?.resultDigest ?? digest(null),
      policy: file.policy ?? null,
      findings,
      decisions,
    }),
  });
}

/** What is stored after a release belongs to a later revision, whatever its date: a released one stays as it was signed. */
function asReleased(
  letter: string,
  decisions: readonly Decision[],
  findings: readonly Finding[],
): { readonly decisions: readonly Decision[]; readonly findings: readonly Finding[] } {
  const end = decisions.findIndex((one) => one.kind === "release" && one.revision === letter);
  const release = decisions[end];
  return release?.kind === "release"
    ? { decisions: decisions.slice(0, end + 1), findings: release.findings }
    : { decisions, findings };
}

/** The signatures of the revision that are bound to what stands now; others are void. */
export function standingSignatures(review: ReviewOf): readonly Signature[] {
  return review.decisions.filter(
    (decision): decision is Signature =>
      decision.kind === "signature" &&
      decision.revision === review.revision.letter &&
      decision.boundDigest === boundDigest(review.bound, decision.meaning),
  );
}

export function revisionsOf(design: string, client: TransactionClient = database()) {
  return client.revision.findMany({
    where: { designId: design },
    orderBy: [{ frozenAt: "asc" }, { letter: "asc" }],
  });
}

export function runOf(address: string, client: TransactionClient = database()) {
  return client.solverRun.findUnique({ where: { address } });
}

async function decisionsOf(
  design: string,
  client: TransactionClient,
): Promise<readonly Decision[]> {
  const rows = await client.decision.findMany({
    where: { designId: design },
    orderBy: { seq: "asc" },
    select: { payload: true },
  });
  return rows.map((row) => storedDecision(row.payload));
}

export async function peopleOf(
  workspace: string,
  client: TransactionClient = database(),
): Promise<readonly WorkspacePerson[]> {
  const members = await client.member.findMany({
    where: { workspaceId: workspace },
    include: { user: { select: { name: true } } },
    orderBy: { userId: "asc" },
  });
  return members.map((one) => ({
    id: one.userId,
    name: one.user.name,
    roles: ROLES.filter((role) => one.roles.includes(role)),
  }));
}

async function findingsOf(design: string, client: TransactionClient): Promise<readonly Finding[]> {
  const doc = await storedDocument(design, client);
  if (doc === null) return [];
  const findings = readFindings(doc);
  doc.destroy();
  return findings;
}
