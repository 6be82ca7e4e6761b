import { beforeAll, describe, expect, it } from "vitest";
import type { AuditEntry } from "../../lib/record/audit-chain";
import { auditHash } from "../../lib/record/audit-chain";
import type { RecordCheck } from "../../lib/record/record-check";
import type { ReviewRecord } from "../../lib/record/review-record";
import { verifyRecord } from "../../lib/record/verify";
import type { Decision } from "../../lib/review/review-state";
import { auditChain, DECISIONS, divider, FINDING, readBack, recordOf, sealedText } from "./records";

const proposed = divider("1k");
const base = divider("2k");
let record: ReviewRecord;
beforeAll(() => {
  record = recordOf(proposed, base);
});

/** What does not hold of a record that the workspace itself sealed. */
async function faults(given: ReviewRecord): Promise<Partial<Record<RecordCheck["check"], string>>> {
  const { checks, holds } = await verifyRecord(readBack(await sealedText(given)));
  const broken = checks.filter((one) => !one.holds);
  expect(holds).toBe(broken.length === 0);
  return Object.fromEntries(broken.map(({ check, message }) => [check, message]));
}

function signatureOf(meaning: string): Extract<Decision, { kind: "signature" }> {
  for (const one of record.decisions)
    if (one.kind === "signature" && one.meaning === meaning) return one;
  throw new Error(`Nobody signed as ${meaning}`);
}

const without = (meaning: string): readonly Decision[] =>
  record.decisions.filter((one) => one !== signatureOf(meaning));

describe("a sealed record holds", () => {
  it("with all eight checks told, its digest and the fingerprint of its key", async () => {
    const verdict = await verifyRecord(readBack(await sealedText(record)));
    expect(verdict).toMatchObject({ holds: true, design: "DIV-1", revision: "B" });
    expect(verdict.checks.map(({ check }) => check)).toEqual([
      "digest",
      "signature",
      "circuits",
      "bound",
      "signatures",
      "audit",
      "results",
      "comparison",
    ]);
    // The thumbprint of this key: RFC 8037, appendix A.3.
    expect(verdict.fingerprint).toBe("kPrK_qmxVWaYVA9wwBF6Iuo3vVzz7TxHCTwXBygrS4k");
  });

  it("for a first issue, which is compared with nothing", async () => {
    expect(await faults(recordOf(proposed, null))).toEqual({});
  });

  it("for work in progress that nobody has signed", async () => {
    const open = { ...record, decisions: DECISIONS, releasedAt: null };
    expect(await faults(open)).toEqual({});
    expect(await faults({ ...open, comparison: null })).toEqual({});
  });

  it("whatever spaces and order its JSON is written with", async () => {
    const { seal, digest, record: kept } = JSON.parse(await sealedText(record));
    const text = JSON.stringify({ seal, record: kept, digest }, null, 3);
    expect(await verifyRecord(readBack(text))).toMatchObject({ holds: true });
  });
});

describe("a record that was sealed wrong says what does not hold", () => {
  it("of a circuit that is not the one its digest names", async () => {
    const swapped = { ...record.revision, circuit: base.file };
    expect(Object.keys(await faults({ ...record, revision: swapped }))).toEqual([
      "circuits",
      "results",
      "comparison",
    ]);
    const before = { ...recordOf(proposed, base).revision, letter: "A", circuit: proposed.file };
    expect(
      (await faults({ ...record, base: { ...before, digest: base.circuit.digest } })).circuits,
    ).toBe("The circuit of Rev A is not the one its digest names.");
  });

  it("of a number that the solver does not find", async () => {
    const conditions = record.result.conditions.map((one) => ({
      ...one,
      nets: { ...one.nets, OUT: 5 },
    }));
    const forged = recordOf(proposed, base, { result: { ...record.result, conditions } });
    const found = await faults(forged);
    expect(Object.keys(found)).toEqual(["results"]);
    expect(found.results).toMatch(/conditions\[0\]\.nets\.OUT: 5 in the record, 6(\.0+\d)? now/);
  });

  it("of a shift that the comparison does not find, of a base and of none", async () => {
    for (const before of [base, null]) {
      const { comparison } = recordOf(proposed, before);
      if (comparison === null) throw new Error("It is compared");
      const forged = recordOf(proposed, before, { comparison: { ...comparison, edits: [] } });
      const found = await faults(forged);
      expect(Object.keys(found)).toEqual(["comparison"]);
      expect(found.comparison).toContain("edits: 0 rows in the record");
    }
  });

  it("of findings, decisions, policy or results that came after the signatures", async () => {
    const later = { ...FINDING, text: "All is well." };
    expect(await faults({ ...record, findings: [later] })).toEqual({
      bound: "The findings are not those that were signed.",
      signatures: "Idris Bello's signature (reviewed) is bound to something else and is void.",
    });
    const [, ...decisions] = record.decisions;
    expect((await faults({ ...record, decisions })).bound).toMatch(/decisions/);
    const missing = { ...record, bound: { ...record.bound, policy: record.bound.results } };
    expect(Object.keys(await faults(missing))).toEqual(["bound"]);
  });

  it("of a digest that is missing where it is bound", async () => {
    const { results, ...rest } = record.bound;
    expect(results).toMatch(/^sha256:/);
    const text = JSON.stringify({ ...record, bound: rest });
    expect((await faults(JSON.parse(text))).bound).toMatch(/results/);
  });

  it("of a signature that is bound to something else", async () => {
    const author = signatureOf("authored");
    // An author's digest leaves findings and decisions out: it is no reviewer's.
    const moved: Decision = { ...signatureOf("reviewed"), boundDigest: author.boundDigest };
    const decisions = [...without("reviewed"), moved];
    expect(await faults({ ...record, decisions })).toEqual({
      signatures: "Idris Bello's signature (reviewed) is bound to something else and is void.",
    });
  });

  it("of a release that lacks a signature", async () => {
    for (const meaning of ["authored", "reviewed", "approved"])
      expect(await faults({ ...record, decisions: without(meaning) })).toEqual({
        signatures: `The record says released, but nobody signed it as ${meaning}.`,
      });
    expect(Object.keys(await faults({ ...record, comparison: null }))).toEqual(["comparison"]);
  });

  it("but not of a void signature that was given again", async () => {
    const old: Decision = {
      ...signatureOf("reviewed"),
      id: "signature-0",
      boundDigest: signatureOf("authored").boundDigest,
    };
    const decisions = [...DECISIONS, old, ...record.decisions.slice(DECISIONS.length)];
    expect(await faults({ ...record, decisions })).toEqual({});
  });
});

describe("an audit chain", () => {
  const chain = auditChain(6);
  const again = (entry: AuditEntry): AuditEntry => ({ ...entry, hash: auditHash(entry) });

  it.each<[string, readonly AuditEntry[], RegExp]>([
    ["an entry out", chain.filter(({ seq }) => seq !== 4), /missing between 3 and 5/],
    ["two changed places", [...chain].reverse(), /missing between 6 and 5/],
    [
      "an entry rewritten",
      chain.map((one) => (one.seq === 3 ? { ...one, actor: "mara" } : one)),
      /entry 3 does not have its own hash/,
    ],
    [
      "an entry rewritten with its hash",
      chain.map((one) => (one.seq === 3 ? again({ ...one, actor: "mara" }) : one)),
      /entry 4 does not follow entry 3/,
    ],
    [
      "a beginning that names another",
      chain.slice(0, 1).map((one) => again({ ...one, previousHash: one.hash })),
      /names an entry before it/,
    ],
  ])("with %s is broken, and the place is named", async (_what, audit, place) => {
    const found = await faults({ ...record, audit });
    expect(Object.keys(found)).toEqual(["audit"]);
    expect(found.audit).toMatch(place);
  });
});
