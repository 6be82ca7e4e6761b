import { describe, expect, it } from "vitest";
import { allMet, exitCriteria } from "../../lib/review/exit-criteria";
import type { WaiverSubject } from "../../lib/review/review-state";
import { waiverOfLimit, waiverOfRow, waiverStanding } from "../../lib/review/waivers";
import { checks, decided, result, state } from "./small-review";

describe("a waiver", () => {
  const limits = result.limits.map((row) =>
    row.max === 12 && row.condition === "Warm"
      ? { ...row, high: 12.6, verdict: "fail" as const }
      : row,
  );
  const over = { ...result, limits };
  const waiver = (margin: number | null, subject: WaiverSubject) =>
    decided("waiver", "tove", { number: "W-1", revision: "C", subject, reason: "short", margin });
  const ofLimit = { limit: "A", condition: "Warm" };

  it("[EX2] of a limit lets it pass while its number is no worse, in its condition alone", () => {
    const under = (margin: number, condition = "Warm") => {
      const decisions = [...checks, waiver(margin, { limit: "A", condition })];
      return exitCriteria({ ...state, result: over, decisions }).find(({ id }) => id === "limits");
    };
    // 12 / 12.6 - 1
    expect(under(-0.0476)).toMatchObject({ verdict: "pass", open: [], waived: ["W-1"] });
    expect(under(-0.03)).toMatchObject({ verdict: "fail", open: ["A, Warm"], waived: [] });
    expect(under(-0.0476, "Cool")).toMatchObject({ verdict: "fail" });
  });

  it("[EX4] of an unknown covers it while it is unknown, and no number that turns up", () => {
    const gap = result.stress.map((row, k) =>
      k === 0
        ? { ...row, verdict: "unknown" as const, margin: null, needs: ["rating power"] }
        : row,
    );
    const [first] = gap;
    if (first === undefined) throw new Error("The circuit has stress rows");
    const subject = { part: first.part, rule: first.rule.id, condition: first.condition };
    const decisions = [...checks, waiver(null, subject)];
    const criteria = exitCriteria({ ...state, result: { ...result, stress: gap }, decisions });
    expect(allMet(criteria)).toBe(true);
    expect(criteria.find(({ id }) => id === "ratings")?.waived).toEqual(["W-1"]);
    const failing = { ...first, verdict: "fail" as const, margin: -0.2 };
    expect(waiverOfRow(failing, [waiver(null, subject)])).toBeNull();
    // And a waived number says nothing of an unknown.
    expect(waiverOfRow(first, [waiver(-0.2, subject)])).toBeNull();
  });

  it("is not needed where the number is inside or its subject is gone", () => {
    const held = waiver(-0.1, ofLimit);
    expect(waiverStanding(held, [held], result).kind).toBe("notNeeded");
    const gone = waiver(-0.1, { part: "R9", rule: "cp-res-power", condition: "Warm" });
    expect(waiverStanding(gone, [gone], result).kind).toBe("notNeeded");
    const [row] = result.limits;
    if (row === undefined) throw new Error("The circuit has limits");
    expect(waiverOfLimit(row, [held])).toBeNull();
  });
});
