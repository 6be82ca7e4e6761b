import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { allMet } from "../../lib/review/exit-criteria";
import { returnRevision } from "../../lib/server/commands/return-revision";
import { grantWaiver, waivableMargin } from "../../lib/server/commands/review-decisions";
import { reviewOf, revisionsOf } from "../../lib/server/review-of";
import { COIL, FAN, good, MINUTE_MS, Shop, setResistance } from "./shop";

let shop: Shop;

beforeAll(async () => {
  shop = await Shop.open();
}, 3 * MINUTE_MS);

afterAll(() => shop.close());

async function states(): Promise<readonly string[]> {
  return (await revisionsOf(shop.design)).map(({ letter, state }) => `${letter} ${state}`);
}

async function submitted(letter: string): Promise<void> {
  await shop.checkAll(shop.reviewer, letter);
  good(await shop.sign(shop.designer, letter, "authored"));
  good(await shop.sign(shop.reviewer, letter, "reviewed"));
}

describe("a design from release to release", () => {
  it(
    "is released once, however often the approver signs at the same time",
    async () => {
      await shop.freeze("First issue");
      good(await shop.waive(COIL, "A", "The fan need not start while cranking."));
      await submitted("A");
      const signed = await Promise.all([
        shop.sign(shop.approver, "A", "approved"),
        shop.sign(shop.approver, "A", "approved"),
      ]);
      expect(signed.filter(({ ok }) => ok)).toHaveLength(1);
      expect(await states()).toEqual(["A released"]);
    },
    MINUTE_MS,
  );

  it(
    "carries a waiver while its number gets no worse, and supersedes what was released before",
    async () => {
      await shop.write(shop.designer, setResistance("R7", "30k"));
      await shop.freeze("Trip point");
      await submitted("B");
      good(await shop.sign(shop.approver, "B", "approved"));
      expect(await states()).toEqual(["A superseded", "B released"]);
    },
    MINUTE_MS,
  );

  it(
    "lets the waiver lapse under a larger relay; another one has the next number",
    async () => {
      await shop.write(shop.designer, setResistance("K1", "220 Ω"));
      await shop.freeze("Larger relay");
      await submitted("C");
      const before = good(await reviewOf(shop.approver, FAN, "C"));
      const stress = before.criteria.find(({ id }) => id === "stress");
      expect(stress?.verdict).toBe("fail");
      expect(await shop.sign(shop.approver, "C", "approved")).toMatchObject({
        error: { kind: "criteriaOpen" },
      });
      for (const row of before.result?.stress ?? []) {
        const subject = { part: row.part, rule: row.rule.id, condition: row.condition };
        const margin = waivableMargin(before, subject);
        if (margin === undefined) continue;
        const twice = await Promise.all(
          [1, 2].map(() =>
            grantWaiver(shop.approver, { number: FAN, letter: "C" }, subject, margin, "Known."),
          ),
        );
        expect(twice.filter(({ ok }) => ok)).toHaveLength(1);
      }
      const { decisions } = good(await reviewOf(shop.approver, FAN, "C"));
      const numbers = decisions.flatMap((one) => (one.kind === "waiver" ? [one.number] : []));
      expect(numbers).toEqual(numbers.map((_, index) => `W-${index + 1}`));
      expect(numbers.length).toBeGreaterThan(1);
    },
    MINUTE_MS,
  );

  it(
    "is either approved or returned, when both come at once",
    async () => {
      good(await shop.sign(shop.reviewer, "C", "reviewed"));
      expect(allMet(good(await reviewOf(shop.approver, FAN, "C")).criteria)).toBe(true);
      const [approved, returned] = await Promise.all([
        shop.sign(shop.approver, "C", "approved"),
        returnRevision(shop.reviewer, { number: FAN, letter: "C" }, "Look at K1 again"),
      ]);
      expect(approved.ok).not.toBe(returned.ok);
      expect(await states()).toEqual(
        approved.ok
          ? ["A superseded", "B superseded", "C released"]
          : ["A superseded", "B released", "C returned"],
      );
    },
    MINUTE_MS,
  );

  it(
    "is never reviewed, waived, returned or approved by one of its authors",
    async () => {
      await shop.write(shop.approver, setResistance("R7", "31k6"));
      await shop.write(shop.reviewer, setResistance("R9", "5k1"));
      await shop.freeze("By all three");
      const about = { number: FAN, letter: "D" };
      const author = { error: { kind: "authorOfIt" } };
      good(await shop.sign(shop.designer, "D", "authored"));
      expect(await shop.sign(shop.reviewer, "D", "reviewed")).toMatchObject(author);
      expect(await shop.sign(shop.approver, "D", "approved")).toMatchObject(author);
      expect(await grantWaiver(shop.approver, about, COIL, null, "mine")).toMatchObject(author);
      expect(await returnRevision(shop.reviewer, about, "mine")).toMatchObject(author);
    },
    MINUTE_MS,
  );
});
