import { digest } from "../circuit/digest";
import { compare, type Side } from "../comparison/compare";
import { isCircuitFile } from "../comparison/read-side";
import { readCircuitFile } from "../kinds/read-circuit";
import { judge } from "../stress/judge";
import { auditChainFault } from "./audit-chain";
import { type BoundDigests, boundDigest, boundDigests } from "./bound-digest";
import { numberDifferences } from "./number-differences";
import type { CheckableRecord, CheckableSeal } from "./read-record";
import { checkSeal } from "./seal";

/** One thing that was checked, and what was found. */
export interface RecordCheck {
  readonly check:
    | "digest"
    | "signature"
    | "circuits"
    | "bound"
    | "signatures"
    | "audit"
    | "results"
    | "comparison";
  readonly holds: boolean;
  /** One sentence. */
  readonly message: string;
}

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
  const digestHolds = seal.ok || seal.error === "signature";
  const checks: RecordCheck[] = [
    digestHolds
      ? held("digest", "The digest is that of the record.")
      : broken(
          "digest",
          "The record is not the one its digest was taken of: something in it was changed.",
        ),
    seal.ok
      ? held("signature", "The workspace key signed this record.")
      : broken("signature", "The workspace key did not sign this record as it stands."),
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
    fingerprint: seal.ok ? seal.value.fingerprint : null,
    checks,
  };
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
  const now: Readonly<Record<string, string | null>> = { ...boundNow(record) };
  const wrong = Object.entries(record.bound).find(([name, digest]) => now[name] !== digest);
  return wrong === undefined
    ? held(
        "bound",
        "Circuit, base, results, policy, findings and decisions have the digests they were signed under.",
      )
    : broken("bound", `The ${wrong[0]} are not those that were signed.`);
}

function signaturesCheck(record: CheckableRecord): RecordCheck {
  const now = boundNow(record);
  const ours = record.decisions
    .filter(isSignature)
    .filter((signature) => signature.revision === record.revision.letter);
  const wrong = ours.find(
    (signature) => signature.boundDigest !== boundDigest(now, signature.meaning),
  );
  if (wrong !== undefined)
    return broken(
      "signatures",
      `${wrong.name}'s signature (${wrong.meaning}) is bound to something else and is void.`,
    );
  if (record.releasedAt !== null && !ours.some((signature) => signature.meaning === "approved"))
    return broken("signatures", "The record says released, but nobody signed as approver.");
  return held("signatures", `${ours.length} signatures, each bound to what stands here.`);
}

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

function solvedAgainChecks(record: CheckableRecord): readonly RecordCheck[] {
  const proposed = sideOf(record.revision.circuit);
  if (proposed === null) return [broken("results", "The circuit cannot be read.")];
  const solved = judge(proposed.circuit, { everyCondition: true });
  const differences = numberDifferences(record.result, solved);
  const results =
    differences.length === 0
      ? held("results", `Solved again (engine ${solved.engine}): every number agrees.`)
      : broken(
          "results",
          `Solved again (engine ${solved.engine}): ${differences.length} numbers differ, first ${differences[0] ?? ""}.`,
        );
  if (record.base === null || record.comparison === null) return [results];
  const base = sideOf(record.base.circuit);
  if (base === null) return [results, broken("comparison", "The base circuit cannot be read.")];
  const moved = numberDifferences(record.comparison, compare(base, proposed));
  return [
    results,
    moved.length === 0
      ? held("comparison", "Compared again: every shift and cause agrees.")
      : broken(
          "comparison",
          `Compared again: ${moved.length} numbers differ, first ${moved[0] ?? ""}.`,
        ),
  ];
}

function sideOf(file: unknown): Side | null {
  if (!isCircuitFile(file)) return null;
  const circuit = readCircuitFile(file);
  return circuit.ok ? { file, circuit: circuit.value } : null;
}

function held(check: RecordCheck["check"], message: string): RecordCheck {
  return { check, holds: true, message };
}

function broken(check: RecordCheck["check"], message: string): RecordCheck {
  return { check, holds: false, message };
}
