import { afterAll, beforeAll, describe, expect, it } from "vitest";
import * as Y from "yjs";
import { database } from "../../lib/database/client";
import { PostgresDocumentStore } from "../../lib/database/document-store";
import { decisionUpdate } from "../../lib/document/decision-update";
import { raiseFinding, readFindings } from "../../lib/document/findings";
import type { Decision } from "../../lib/review/review-state";
import { freezeRevision } from "../../lib/server/commands/freeze-revision";
import { returnRevision } from "../../lib/server/commands/return-revision";
import { checkItem, decideFinding, grantWaiver } from "../../lib/server/commands/review-decisions";
import { signRevision } from "../../lib/server/commands/sign-revision";
import { storedDocument } from "../../lib/server/document-state";
import { reviewOf, standingSignatures } from "../../lib/server/review-of";
import { provePassword } from "../../lib/server/sign-in";
import { COIL, FAN, good, MINUTE_MS, PASSWORD, Shop, setResistance } from "./shop";

let shop: Shop;

beforeAll(async () => {
  shop = await Shop.open();
}, 3 * MINUTE_MS);

afterAll(() => shop.close());

describe("decisions about a revision", () => {
  it(
    "go from a first issue to a release, step by step and by the right people",
    async () => {
      expect(await shop.freeze("First issue")).toBe("A");
      const about = { number: FAN, letter: "A" };
      const { comparison } = good(await reviewOf(shop.designer, FAN, "A"));
      const item = comparison?.edits[0]?.id ?? "";
      expect(await checkItem(shop.designer, about, item, true)).toMatchObject({
        error: { kind: "authorOfIt" },
      });
      expect(await checkItem(shop.reviewer, about, "nothing of this", true)).toMatchObject({
        error: { kind: "noSuchItem" },
      });
      await shop.checkAll(shop.reviewer, "A");
      expect(await shop.sign(shop.reviewer, "A", "reviewed")).toMatchObject({
        error: { kind: "waitsFor", meaning: "authored" },
      });
      good(await shop.sign(shop.designer, "A", "authored"));
      good(await shop.sign(shop.reviewer, "A", "reviewed"));
      // K1's coil has too little voltage in Cold crank, and nobody has waived it yet.
      expect(await shop.sign(shop.approver, "A", "approved")).toMatchObject({
        error: { kind: "criteriaOpen" },
      });
      expect(await grantWaiver(shop.reviewer, about, COIL, null, "because")).toMatchObject({
        error: { kind: "noRight" },
      });
      expect(await grantWaiver(shop.approver, about, COIL, 0, "unseen")).toMatchObject({
        error: { kind: "changedMeanwhile" },
      });
      good(await shop.waive(COIL, "A", "The fan need not start while cranking."));
      expect(await shop.waive(COIL, "A", "again")).toMatchObject({
        error: { kind: "alreadySo" },
      });
      // The waiver is a decision that the review did not know of: it has to be signed again.
      expect(await shop.sign(shop.approver, "A", "approved")).toMatchObject({
        error: { kind: "waitsFor", meaning: "reviewed" },
      });
      good(await shop.sign(shop.reviewer, "A", "reviewed"));
      good(await shop.sign(shop.approver, "A", "approved"));
      const { revision } = good(await reviewOf(shop.designer, FAN, "A"));
      expect(revision.state).toBe("released");
      expect(await checkItem(shop.reviewer, about, item, false)).toMatchObject({
        error: { kind: "notUnderReview" },
      });
    },
    MINUTE_MS,
  );

  it(
    "know who edited the circuit, and who only wrote a finding",
    async () => {
      await shop.write(shop.designer, setResistance("R7", "30k"));
      await shop.write(shop.reviewer, (doc) => {
        raiseFinding(doc, {
          anchor: { net: "TREF" },
          severity: "major",
          text: "Too high?",
          was: null,
          revision: "A",
          author: shop.reviewer.user,
          at: new Date().toISOString(),
        });
      });
      expect(await shop.freeze("Trip point")).toBe("B");
      const { revision } = good(await reviewOf(shop.designer, FAN, "B"));
      expect(revision.authors).toEqual([shop.designer.user]);

      // Folded into a snapshot, the log still tells of everybody who wrote.
      await shop.write(shop.reviewer, setResistance("R9", "4k7"));
      const store = new PostgresDocumentStore(database(), shop.fresh.url);
      const kept = await store.load(shop.design);
      const doc = await storedDocument(shop.design);
      if (kept === null || doc === null) throw new Error("The design is there");
      await store.snapshot(
        shop.design,
        Y.encodeStateAsUpdate(doc),
        kept.updates.map(({ seq }) => seq),
      );
      expect(await shop.freeze("Gate resistor")).toBe("C");
      const later = good(await reviewOf(shop.designer, FAN, "C"));
      expect(later.revision.authors).toEqual(
        expect.arrayContaining([shop.designer.user, shop.reviewer.user]),
      );
      expect(later.criteria.find(({ id }) => id === "newest")?.verdict).toBe("pass");
      const older = good(await reviewOf(shop.designer, FAN, "B"));
      expect(older.criteria.find(({ id }) => id === "newest")?.verdict).toBe("fail");
    },
    MINUTE_MS,
  );

  it("leave a released revision and the numbers it settled alone, however late findings are dated", async () => {
    const raise = (text: string, at: string) =>
      shop.write(shop.reviewer, (doc) => {
        raiseFinding(doc, {
          anchor: { net: "TREF" },
          severity: "observation",
          text,
          was: null,
          revision: "A",
          author: shop.reviewer.user,
          at,
        });
      });
    const before = good(await reviewOf(shop.designer, FAN, "A"));
    await raise("Written on the train, long ago", "2020-01-01T00:00:00.000Z");
    const after = good(await reviewOf(shop.designer, FAN, "A"));
    expect(after.bound).toEqual(before.bound);
    expect(standingSignatures(after).map(({ meaning }) => meaning)).toEqual([
      "authored",
      "reviewed",
      "approved",
    ]);
  });

  it("settle the numbers of findings at a release", () => {
    const doc = new Y.Doc();
    const raise = (text: string, at: string) =>
      raiseFinding(doc, {
        anchor: { net: "TREF" },
        severity: "observation",
        text,
        was: null,
        revision: "A",
        author: "somebody",
        at,
      });
    const at = "2026-05-01T00:00:00.000Z";
    raise("first", at);
    const findings = readFindings(doc);
    const release: Decision = { id: "r", kind: "release", user: "u", at, revision: "A", findings };
    Y.applyUpdate(doc, decisionUpdate(release));
    raise("merged later, dated earlier", "2020-01-01T00:00:00.000Z");
    expect(readFindings(doc).map(({ text, number }) => [number, text])).toEqual([
      [1, "first"],
      [2, "merged later, dated earlier"],
    ]);
  });

  it("refuse a signature on something else than what was seen", async () => {
    const proof = good(await provePassword(shop.designer, PASSWORD));
    const { bound } = good(await reviewOf(shop.designer, FAN, "C"));
    const signed = await signRevision(
      shop.designer,
      { number: FAN, letter: "C" },
      "authored",
      proof,
      {
        ...bound,
        findings: "sha256:other",
      },
    );
    expect(signed).toMatchObject({ error: { kind: "changedMeanwhile", what: ["findings"] } });
    const unseen = await signRevision(
      shop.designer,
      { number: FAN, letter: "C" },
      "authored",
      proof,
      {},
    );
    expect(unseen).toMatchObject({
      error: { kind: "changedMeanwhile", what: Object.keys(bound) },
    });
  });

  it("take turns: of two who freeze, return or close at once, one does", async () => {
    const about = { number: FAN, letter: "B" };
    const finding = good(await reviewOf(shop.reviewer, FAN, "B")).findings[0]?.id ?? "";
    const closed = await Promise.all([
      decideFinding(shop.reviewer, about, finding, "closure", "as designed"),
      decideFinding(shop.approver, about, finding, "closure", "as designed"),
    ]);
    expect(closed.filter(({ ok }) => ok)).toHaveLength(1);
    const returned = await Promise.all([
      returnRevision(shop.reviewer, about, "superseded by C"),
      returnRevision(shop.approver, about, "superseded by C"),
    ]);
    expect(returned.filter(({ ok }) => ok)).toHaveLength(1);
    await shop.write(shop.designer, setResistance("R7", "31k6"));
    const frozen = await Promise.all([
      freezeRevision(shop.designer, { number: FAN, changeNote: "one" }),
      freezeRevision(shop.designer, { number: FAN, changeNote: "other" }),
    ]);
    expect(frozen.map((one) => (one.ok ? one.value : one.error.kind)).sort()).toEqual([
      "D",
      "nothingNew",
    ]);
  });
});
