import type { JWK } from "jose";
import type { Side } from "../../lib/comparison/compare";
import { compare, compareWithNothing } from "../../lib/comparison/compare";
import { type AuditEntry, auditHash, FIRST_PREVIOUS_HASH } from "../../lib/record/audit-chain";
import { boundDigest } from "../../lib/record/bound-digest";
import { type CheckableSeal, readSealedRecord } from "../../lib/record/read-record";
import {
  buildRecord,
  type RecordInputs,
  type RecordRevision,
  type ReviewRecord,
} from "../../lib/record/review-record";
import { sealRecord } from "../../lib/record/seal";
import type { Decision, Finding } from "../../lib/review/review-state";
import { judge } from "../../lib/stress/judge";
import { sideOf } from "../demo-revisions";

/** The key of RFC 8037, appendix A.1: it is that of test 1 in RFC 8032, section 7.1. */
export const KEY: JWK = {
  kty: "OKP",
  crv: "Ed25519",
  d: "nWGxne_9WmC6hEr0kuwsxERJxWl7MmkZcDusAxyuf2A",
  x: "11qYAYKxCrfVS_7TyWQHOg7hcvPapiMlrwIaaPcHURo",
};

const AT = "2026-11-30T09:00:00.000Z";

/** A voltage divider: small enough to be solved again for every change that is tried. */
export function divider(resistance: string): Side {
  const ground = "GND";
  return sideOf({
    ampersign: 1,
    title: "Divider µ, Ω, °C",
    blocks: {
      main: {
        parts: [
          {
            ref: "V1",
            kind: "voltageSource",
            pins: { plus: "IN", minus: ground },
            params: { dc: 9 },
          },
          { ref: "R1", kind: "resistor", pins: { "1": "IN", "2": "OUT" }, params: { resistance } },
          {
            ref: "R2",
            kind: "resistor",
            pins: { "1": "OUT", "2": ground },
            params: { resistance: "2k" },
            ratings: { power: 0.25 },
          },
        ],
      },
    },
    limits: [{ net: "OUT", max: 7 }],
  });
}

export const FINDING: Finding = {
  id: "finding-1",
  number: 1,
  anchor: { net: "OUT" },
  severity: "major",
  text: "OUT stands at 6 V; “5 V ± 2 %” is asked for.",
  author: "idris",
  at: AT,
  revision: "B",
  was: { quantity: "voltage", condition: "Nominal", value: 6, unit: "V", revision: "B" },
  remarks: [{ id: "remark-1", author: "mara", at: AT, text: "Mended." }],
};

const by = (id: string, user: string) => ({ id, user, at: AT });
export const DECISIONS: readonly Decision[] = [
  { ...by("check-1", "idris"), kind: "check", revision: "B", item: "R1.resistance" },
  { ...by("close-1", "idris"), kind: "closure", finding: FINDING.id, reason: "Seen." },
];

/** A chain of audit entries as the database writes it. */
export function auditChain(length: number): readonly AuditEntry[] {
  const entries: AuditEntry[] = [];
  for (let seq = 1; seq <= length; seq += 1) {
    const entry = {
      seq,
      at: AT,
      actor: "idris",
      action: "check",
      subject: "design",
      payload: { seq },
      previousHash: entries.at(-1)?.hash ?? FIRST_PREVIOUS_HASH,
    };
    entries.push({ ...entry, hash: auditHash(entry) });
  }
  return entries;
}

function revision(letter: string, { file, circuit }: Side): RecordRevision {
  const { digest } = circuit;
  return {
    letter,
    changeNote: "Trip point",
    frozenAt: AT,
    authors: ["mara"],
    digest,
    circuit: file,
  };
}

/** The record of Rev B against Rev A, released and signed by three persons; `changes` go in before they sign. */
export function recordOf(
  proposed: Side,
  base: Side | null,
  changes: Partial<RecordInputs> = {},
): ReviewRecord {
  const inputs: RecordInputs = {
    design: { number: "DIV-1", title: "Divider", workspace: "Ours" },
    revision: revision("B", proposed),
    base: base === null ? null : revision("A", base),
    result: judge(proposed.circuit, { everyCondition: true }),
    comparison: base === null ? compareWithNothing(proposed) : compare(base, proposed),
    criteria: [{ id: "solved", verdict: "pass", met: 1, of: 1, open: [], waived: [] }],
    findings: [FINDING],
    decisions: DECISIONS,
    people: [
      { id: "mara", name: "Mara Holt", roles: ["designer"], independent: false },
      { id: "idris", name: "Idris Bello", roles: ["reviewer"], independent: true },
      { id: "tove", name: "Tove Lindqvist", roles: ["approver"], independent: true },
    ],
    audit: auditChain(3),
    cautions: ["Computed from the models and ratings entered."],
    releasedAt: AT,
    drawnUpAt: AT,
    policy: proposed.file.policy ?? null,
    ...changes,
  };
  const { bound } = buildRecord(inputs);
  const signatures = (
    [
      ["authored", "mara", "Mara Holt"],
      ["reviewed", "idris", "Idris Bello"],
      ["approved", "tove", "Tove Lindqvist"],
    ] as const
  ).map(
    ([meaning, user, name]): Decision => ({
      ...by(`signature-${meaning}`, user),
      kind: "signature",
      revision: "B",
      meaning,
      boundDigest: boundDigest(bound, meaning),
      method: "Password",
      name,
    }),
  );
  return buildRecord({ ...inputs, decisions: [...inputs.decisions, ...signatures] });
}

/** Seals whatever is given, so that only what lies under the seal can be at fault. */
export async function sealedText(record: ReviewRecord): Promise<string> {
  return JSON.stringify(await sealRecord(record, KEY));
}

export function readBack(text: string): CheckableSeal {
  const read = readSealedRecord(text);
  if (!read.ok) throw new Error(read.error);
  return read.value;
}
