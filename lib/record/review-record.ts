import type { CircuitFile } from "../circuit/circuit-file";
import { digest } from "../circuit/digest";
import type { Comparison } from "../comparison/comparison";
import type { ExitCriterion } from "../review/exit-criterion";
import type { Decision, Finding, Role } from "../review/review-state";
import type { CircuitResult } from "../stress/circuit-result";
import type { AuditEntry } from "./audit-chain";
import { type BoundDigests, boundDigests } from "./bound-digest";

/** A person who took part: name and function as they stood, and whether independent of the authors. */
export interface RecordPerson {
  readonly id: string;
  readonly name: string;
  readonly roles: readonly Role[];
  readonly independent: boolean;
}

/** One revision as the record keeps it: whole, so that it can be solved again without the workspace. */
export interface RecordRevision {
  readonly letter: string;
  readonly changeNote: string;
  readonly frozenAt: string;
  readonly authors: readonly string[];
  readonly digest: string;
  readonly circuit: CircuitFile;
}

/** Everything a review stands on and came to. Plain JSON; its digest is over the RFC 8785 form. */
export interface ReviewRecord {
  readonly ampersignRecord: 1;
  readonly design: { readonly number: string; readonly title: string; readonly workspace: string };
  readonly revision: RecordRevision;
  readonly base: RecordRevision | null;
  readonly engine: string;
  readonly result: CircuitResult;
  readonly resultDigest: string;
  readonly comparison: Comparison | null;
  readonly bound: BoundDigests;
  readonly criteria: readonly ExitCriterion[];
  readonly findings: readonly Finding[];
  readonly decisions: readonly Decision[];
  readonly people: readonly RecordPerson[];
  readonly audit: readonly AuditEntry[];
  readonly cautions: readonly string[];
  /** null: a record of work in progress, not of a release. */
  readonly releasedAt: string | null;
  /** When this record was drawn up; ISO 8601, UTC. */
  readonly drawnUpAt: string;
}

/** What the workspace knows and the record is built from. */
export type RecordInputs = Omit<
  ReviewRecord,
  "ampersignRecord" | "engine" | "resultDigest" | "bound"
> & {
  /** The policy as the circuit file chooses it. */
  readonly policy: unknown;
};

/** Builds the record: adds the digests of what the signatures are bound to. */
export function buildRecord(inputs: RecordInputs): ReviewRecord {
  const { policy, ...kept } = inputs;
  const resultDigest = digest(inputs.result);
  return {
    ampersignRecord: 1,
    ...kept,
    engine: inputs.result.engine,
    resultDigest,
    bound: boundDigests({
      circuit: inputs.revision.digest,
      base: inputs.base?.digest ?? null,
      results: resultDigest,
      policy,
      findings: inputs.findings,
      decisions: inputs.decisions,
    }),
  };
}
