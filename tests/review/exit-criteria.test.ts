import { describe, expect, it } from "vitest";
import { compare } from "../../lib/comparison/compare";
import { changedItems } from "../../lib/review/changed-items";
import { allMet, exitCriteria } from "../../lib/review/exit-criteria";
import type { Decision, Finding, ReviewState } from "../../lib/review/review-state";
import { grantedWaivers, type Waiver, waiverOfRow, waiverStanding } from "../../lib/review/waivers";
import { judge } from "../../lib/stress/judge";
import { demoRevision } from "../demo-revisions";

const COIL = { part: "K1", rule: "cp-relay-coil", condition: "Cold crank" };
const A = judge(demoRevision("A").circuit, { everyCondition: true });
const B = judge(demoRevision("B").circuit, { everyCondition: true });
const C = judge(demoRevision("C").circuit, { everyCondition: true });
/** C with the coil as it was and the trip point between: what the designer freezes next. */
const mended = demoRevision("C", {
  R7: { resistance: "31k6" },
  K1: { resistance: "400 Ω", inductance: "0.6 H" },
});
const D = judge(mended.circuit, { everyCondition: true });
const comparison = compare(demoRevision("B"), mended);

const coilMargin = (result: typeof A): number =>
  result.stress.find((row) => row.rule.id === COIL.rule && row.condition === COIL.condition)
    ?.margin ?? Number.NaN;

const waiver: Waiver = {
  id: "w",
  kind: "waiver",
  user: "tove",
  at: "2026-09-04T07:30:00.000Z",
  number: "W-1",
  revision: "A",
  subject: COIL,
  reason: "The fan need not start while cranking.",
  margin: coilMargin(A),
};

const finding: Finding = {
  id: "f",
  number: 1,
  anchor: { net: "TREF" },
  severity: "major",
  text: "Too late",
  author: "idris",
  at: "2026-11-28T08:00:00.000Z",
  revision: "C",
  was: null,
  remarks: [],
};

const checks = (user: string): readonly Decision[] =>
  changedItems(comparison).map((item, index) => ({
    id: `c${index}`,
    kind: "check",
    user,
    at: "2026-11-29T08:00:00.000Z",
    revision: "D",
    item: item.id,
  }));

const closure = (user: string): Decision => ({
  id: "x",
  kind: "closure",
  user,
  at: "2026-11-29T09:00:00.000Z",
  finding: "f",
  reason: "mended",
});

const whole: ReviewState = {
  revision: "D",
  authors: ["mara"],
  approvers: ["tove"],
  result: D,
  comparison,
  findings: [finding],
  decisions: [waiver, ...checks("idris"), closure("idris")],
  newerUnderReview: [],
};

const verdicts = (state: ReviewState) =>
  Object.fromEntries(exitCriteria(state).map(({ id, verdict }) => [id, verdict]));

describe("exit criteria", () => {
  it("are all met by the mended revision under W-1, checked and closed by the right people", () => {
    expect(exitCriteria(whole).flatMap(({ open }) => open)).toEqual([]);
    expect(allMet(exitCriteria(whole))).toBe(true);
    expect(exitCriteria(whole).find(({ id }) => id === "stress")?.waived).toEqual(["W-1"]);
  });

  it("need both mends: the relay and the trip point, and leave R9 as C has it", () => {
    const openWith = (values: Parameters<typeof demoRevision>[1]) =>
      exitCriteria({
        ...whole,
        result: judge(demoRevision("C", values).circuit, { everyCondition: true }),
      }).flatMap(({ open }) => open);
    const relay = { K1: { resistance: "400 Ω", inductance: "0.6 H" } };
    const trip = { R7: { resistance: "31k6" } };
    expect(openWith(relay)).toEqual(["TREF, Hot and charging", "TREF, Nominal"]);
    expect(openWith(trip)).toEqual([
      "Q1 junctionTemperature, Hot and charging",
      "K1 voltage, Cold crank",
    ]);
    // With B's 10k for R9 it would pass too; with C's 4k7 the coil is no worse than what was waived.
    expect(openWith({ ...relay, ...trip, R9: { resistance: "10k" } })).toEqual([]);
    expect(coilMargin(D)).toBeGreaterThanOrEqual(coilMargin(A));
    expect(coilMargin(D)).toBeCloseTo(coilMargin(A), 2);
  });

  it("[EX1] [EX8] know nothing without results, and unknown is not met", () => {
    const waiting = verdicts({ ...whole, result: null, comparison: null });
    for (const id of ["solved", "limits", "stress", "ratings", "checked"] as const)
      expect(waiting[id]).toBe("unknown");
    expect(allMet(exitCriteria({ ...whole, result: null }))).toBe(false);
    expect(verdicts({ ...whole, result: { ...D, limits: [] } })["limits"]).toBe("unknown");
    const unsolved = D.conditions.map((one) => ({ ...one, status: "unsolvable" as const }));
    expect(verdicts({ ...whole, result: { ...D, conditions: unsolved } })["solved"]).toBe("fail");
  });

  it("[EX2] [EX3] see the limits and margins that C breaks", () => {
    const broken = exitCriteria({ ...whole, result: C });
    expect(broken.find(({ id }) => id === "limits")?.verdict).toBe("fail");
    expect(broken.find(({ id }) => id === "stress")?.open).toEqual([
      "Q1 junctionTemperature, Hot and charging",
      "K1 voltage, Cold crank",
    ]);
  });

  it("[EX4] ask for every rating that a rule needs", () => {
    const stress = D.stress.map((row) =>
      row.part === "R1" && row.quantity === "power"
        ? { ...row, verdict: "unknown" as const, margin: null, needs: ["rating power"] }
        : row,
    );
    const asked = exitCriteria({ ...whole, result: { ...D, stress } });
    expect(asked.find(({ id }) => id === "ratings")).toMatchObject({
      verdict: "unknown",
      open: ["R1 needs rating power"],
    });
    expect(allMet(asked)).toBe(false);
  });

  it("[EX5] count a major finding closed only by who raised it or an approver", () => {
    const closedBy = (user: string) =>
      verdicts({ ...whole, decisions: [waiver, ...checks("idris"), closure(user)] })["findings"];
    expect(closedBy("idris")).toBe("pass");
    expect(closedBy("tove")).toBe("pass");
    expect(closedBy("mara")).toBe("fail");
    const minor = { ...finding, severity: "minor" as const };
    expect(verdicts({ ...whole, findings: [minor], decisions: [] })["findings"]).toBe("pass");
  });

  it("[EX6] count a check only by someone other than the author", () => {
    const checkedBy = (user: string) =>
      verdicts({ ...whole, decisions: [waiver, ...checks(user), closure("idris")] })["checked"];
    expect(checkedBy("idris")).toBe("pass");
    expect(checkedBy("mara")).toBe("unknown");
  });

  it("[EX7] give way to a newer revision", () => {
    expect(verdicts({ ...whole, newerUnderReview: ["E"] })["newest"]).toBe("fail");
  });
});

describe("waiver W-1", () => {
  it("stands in B, where the number is no worse, and lapses in C, where it is", () => {
    expect(waiverStanding(waiver, [waiver], A).kind).toBe("stands");
    expect(waiverStanding(waiver, [waiver], B).kind).toBe("stands");
    expect(waiverStanding(waiver, [waiver], C)).toMatchObject({
      kind: "lapsed",
      was: coilMargin(A),
    });
    expect(waiverStanding(waiver, [waiver], D).kind).toBe("stands");
  });

  it("covers nothing once it is withdrawn, and no other row", () => {
    const withdrawal: Decision = {
      id: "v",
      kind: "withdrawal",
      user: "tove",
      at: "2026-12-01T08:00:00.000Z",
      waiver: "W-1",
      reason: "no",
    };
    expect(waiverStanding(waiver, [waiver, withdrawal], B).kind).toBe("withdrawn");
    expect(grantedWaivers([waiver, withdrawal])).toEqual([]);
    const covered = B.stress.filter((row) => waiverOfRow(row, [waiver]) !== null);
    expect(covered.map(({ part, condition }) => `${part} ${condition}`)).toEqual(["K1 Cold crank"]);
  });
});
