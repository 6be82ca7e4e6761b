import { describe, expect, it } from "vitest";
import { compare } from "../../lib/comparison/compare";
import { changedItems } from "../../lib/review/changed-items";
import { conditionMargins, leastMargin } from "../../lib/review/condition-margins";
import { allMet, exitCriteria } from "../../lib/review/exit-criteria";
import { mayDecideFinding } from "../../lib/review/finding-states";
import { limitMargin } from "../../lib/review/limit-words";
import type { Decision, Finding, ReviewState } from "../../lib/review/review-state";
import { maySign, type Signature } from "../../lib/review/signing";
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

describe("signing", () => {
  const signature = (meaning: Signature["meaning"]): Signature => ({
    id: meaning,
    kind: "signature",
    user: "x",
    at: "2026-12-01T08:00:00.000Z",
    revision: "D",
    meaning,
    boundDigest: "",
    method: "password",
    name: "X",
  });
  const state = (signed: readonly Signature["meaning"][], criteria = exitCriteria(whole)) => ({
    underReview: true,
    authors: ["mara"],
    criteria,
    signatures: signed.map(signature),
  });
  const mara = { id: "mara", roles: ["designer", "reviewer", "approver"] as const };
  const idris = { id: "idris", roles: ["reviewer"] as const };
  const tove = { id: "tove", roles: ["approver"] as const };

  it("goes author, reviewer, approver, and never twice or by the author", () => {
    expect(maySign("authored", mara, state([])).ok).toBe(true);
    expect(maySign("authored", idris, state([]))).toMatchObject({ error: { kind: "notAnAuthor" } });
    expect(maySign("reviewed", idris, state([]))).toMatchObject({ error: { kind: "waitsFor" } });
    expect(maySign("reviewed", idris, state(["authored"])).ok).toBe(true);
    expect(maySign("reviewed", mara, state(["authored"]))).toMatchObject({
      error: { kind: "authorOfIt" },
    });
    expect(maySign("approved", mara, state(["authored", "reviewed"]))).toMatchObject({
      error: { kind: "authorOfIt" },
    });
    expect(maySign("approved", idris, state(["authored", "reviewed"]))).toMatchObject({
      error: { kind: "notAnApprover" },
    });
    expect(maySign("approved", tove, state(["authored"]))).toMatchObject({
      error: { kind: "waitsFor" },
    });
    expect(maySign("approved", tove, state(["authored", "reviewed"])).ok).toBe(true);
    expect(maySign("approved", tove, state(["authored", "reviewed", "approved"]))).toMatchObject({
      error: { kind: "alreadySigned" },
    });
  });

  it("approves nothing while a criterion stands open", () => {
    const open = exitCriteria({ ...whole, newerUnderReview: ["E"] });
    expect(maySign("approved", tove, state(["authored", "reviewed"], open))).toMatchObject({
      error: { kind: "criteriaOpen" },
    });
    expect(maySign("approved", tove, state(["authored", "reviewed"], []))).toMatchObject({
      error: { kind: "criteriaOpen" },
    });
  });

  it("leaves a major finding to who raised it and to approvers", () => {
    expect(mayDecideFinding(finding, idris)).toBe(true);
    expect(mayDecideFinding(finding, tove)).toBe(true);
    expect(mayDecideFinding(finding, { id: "jonas", roles: ["reviewer", "designer"] })).toBe(false);
    expect(
      mayDecideFinding({ ...finding, severity: "question" }, { id: "jonas", roles: ["designer"] }),
    ).toBe(true);
  });
});

describe("margins of a condition", () => {
  it("hold stress rows and limits, least first, and name the least that is not waived", () => {
    const margins = conditionMargins(
      B,
      "Cold crank",
      (subject) => "part" in subject && subject.part === "K1",
    );
    expect(margins[0]?.subject).toMatchObject({ part: "K1" });
    expect(leastMargin(margins)).toMatchObject({ waived: false });
    const sorted = margins.map(({ margin }) => margin);
    expect(sorted).toEqual(sorted.toSorted((a, b) => a - b));
  });

  it("of a limit is relative to the bound, and falls back to the width around zero", () => {
    const row = {
      net: "N",
      condition: "X",
      min: null,
      max: null,
      low: null,
      high: null,
      verdict: "pass" as const,
    };
    expect(limitMargin({ ...row, max: 5.942, low: 6.021, high: 6.021 })).toBeCloseTo(-0.0131, 4);
    expect(limitMargin({ ...row, min: 5.5, low: 6.127, high: 6.127 })).toBeCloseTo(0.114, 3);
    expect(limitMargin({ ...row, min: -1, max: 1, low: 0, high: 0.5 })).toBeCloseTo(0.25, 12);
    expect(limitMargin({ ...row, max: 1 })).toBeNull();
  });
});
