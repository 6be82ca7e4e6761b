import { digest } from "../circuit/digest";
import { auditChainFault } from "./audit-chain";
import { type BoundDigests, boundDigest, boundDigests } from "./bound-digest";
import type { CheckableRecord, CheckableSeal } from "./read-record";
import { broken, held, type RecordCheck } from "./record-check";
import { checkSeal, type SealState } from "./seal";
import { solvedAgainChecks } from "./solved-again";

export interface RecordVerdict {
  readonly holds: boolean;
  readonly design: string;
  readonly revision: string;
  readonly digest: string;
  readonly fingerprint: string | null;
  readonly checks: readonly RecordCheck[];
}

/**
 * Checks a sealed record offline: its digest and signature, the digests of its circuits, what each
 * person's signature is bound to, the audit chain; then solves both circuits again and compares every
 * number. All checks are made and told, not only the first that fails.
 */
export async function verifyRecord(sealed: CheckableSeal): Promise<RecordVerdict> {
  const { record } = sealed;
  const seal = await checkSeal(sealed);
  const checks: RecordCheck[] = [
    seal.digestHolds
      ? held("digest", "The digest is that of the record.")
      : broken("digest", "The digest is of another record: one of the two was changed."),
    signatureCheck(seal),
    circuitsCheck(record),
    boundCheck(record),
    signaturesCheck(record),
    auditCheck(record),
    ...solvedAgainChecks(record),
  ];
  return {
    holds: checks.every((one) => one.holds),
    design: record.design.number,
    revision: record.revision.letter,
    digest: sealed.digest,
    fingerprint: seal.signatureHolds ? seal.fingerprint : null,
    checks,
  };
}

function signatureCheck({ signatureHolds, fingerprint }: SealState): RecordCheck {
  if (!signatureHolds)
    return broken("signature", "The workspace key did not sign this record as it stands.");
  return fingerprint === null
    ? broken("signature", "The fingerprint beside the workspace key is that of another key.")
    : held("signature", `The workspace key ${fingerprint} signed this record.`);
}

function revisionsOf(record: CheckableRecord): readonly CheckableRecord["revision"][] {
  return record.base === null ? [record.revision] : [record.revision, record.base];
}

function circuitsCheck(record: CheckableRecord): RecordCheck {
  const wrong = revisionsOf(record).find(
    (revision) => digest(revision.circuit) !== revision.digest,
  );
  return wrong === undefined
    ? held("circuits", "Each circuit has its own digest.")
    : broken("circuits", `The circuit of Rev ${wrong.letter} is not the one its digest names.`);
}

function boundNow(record: CheckableRecord): BoundDigests {
  return boundDigests({
    circuit: record.revision.digest,
    base: record.base?.digest ?? null,
    results: digest(record.result),
    policy: policyOf(record.revision.circuit),
    findings: record.findings,
    decisions: record.decisions,
  });
}

/** The policy as the circuit file chooses it; null where it leaves the default. */
function policyOf(circuit: unknown): unknown {
  return typeof circuit === "object" && circuit !== null && "policy" in circuit
    ? circuit.policy
    : null;
}

function boundCheck(record: CheckableRecord): RecordCheck {
  const wrong = Object.entries(boundNow(record)).find(
    ([name, digest]) => record.bound[name] !== digest,
  );
  return wrong === undefined
    ? held(
        "bound",
        "Circuit, base, results, policy, findings and decisions have the digests they were signed under.",
      )
    : broken("bound", `The ${wrong[0]} are not those that were signed.`);
}

/** A void signature is told, and holds nothing back once a later one with its meaning stands. */
function signaturesCheck(record: CheckableRecord): RecordCheck {
  const now = boundNow(record);
  const ours = record.decisions
    .filter(isSignature)
    .filter((signature) => signature.revision === record.revision.letter);
  const stands = (signature: Signature): boolean =>
    signature.boundDigest === boundDigest(now, signature.meaning);
  const standing = ours.filter(stands);
  const signed = new Set(standing.map((signature) => signature.meaning));
  const wrong = ours.find((signature) => !stands(signature) && !signed.has(signature.meaning));
  if (wrong !== undefined)
    return broken(
      "signatures",
      `${wrong.name}'s signature (${wrong.meaning}) is bound to something else and is void.`,
    );
  const missing = MEANINGS.find((meaning) => !signed.has(meaning));
  if (record.releasedAt !== null && missing !== undefined)
    return broken("signatures", `The record says released, but nobody signed it as ${missing}.`);
  const voided = ours.length - standing.length;
  return held(
    "signatures",
    `${standing.length} signatures, each bound to what stands here${voided === 0 ? "" : `; ${voided} earlier ones are void`}.`,
  );
}

/** A release needs each of them. */
const MEANINGS = ["authored", "reviewed", "approved"];

type Signature = Extract<CheckableRecord["decisions"][number], { boundDigest: string }>;

function isSignature(decision: CheckableRecord["decisions"][number]): decision is Signature {
  return decision.kind === "signature" && "boundDigest" in decision;
}

function auditCheck(record: CheckableRecord): RecordCheck {
  const fault = auditChainFault(record.audit);
  return fault === null
    ? held("audit", `${record.audit.length} audit entries, chained without a gap.`)
    : broken("audit", `The audit chain is broken: ${fault}.`);
}
