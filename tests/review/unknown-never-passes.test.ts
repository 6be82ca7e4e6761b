import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { allMet, exitCriteria } from "../../lib/review/exit-criteria";
import type { Decision, Finding } from "../../lib/review/review-state";
import { check, checks, decided, result, state, uncheck, verdict } from "./small-review";

describe("[EX8] what is not known is not met", () => {
  it("whichever stress row or limit is unknown or fails: the whole is not met", () => {
    expect(allMet(exitCriteria(state))).toBe(true);
    fc.assert(
      fc.property(
        fc.nat({ max: result.stress.length - 1 }),
        fc.nat({ max: result.limits.length - 1 }),
        fc.boolean(),
        fc.constantFrom("unknown" as const, "fail" as const),
        (row, limit, ofStress, bad) => {
          const stress = result.stress.map((one, k) =>
            ofStress && k === row ? { ...one, verdict: bad, margin: null } : one,
          );
          const limits = result.limits.map((one, k) =>
            !ofStress && k === limit ? { ...one, verdict: bad } : one,
          );
          const criteria = exitCriteria({ ...state, result: { ...result, stress, limits } });
          const id = ofStress ? "stress" : "limits";
          const broken = criteria.find((criterion) => criterion.id === id);
          expect(broken?.verdict).toBe(bad);
          expect(broken?.open).toHaveLength(1);
          expect(allMet(criteria)).toBe(false);
        },
      ),
    );
  });

  it("with nothing to judge: no condition, no limit, no rule", () => {
    const empty = { ...result, conditions: [], stress: [], limits: [] };
    for (const id of ["solved", "limits", "stress", "ratings"])
      expect(verdict({ ...state, result: empty }, id)).toBe("unknown");
    expect(allMet([])).toBe(false);
  });

  it("[EX1] without a certificate a solved condition is not met", () => {
    const conditions = result.conditions.map((one, k) =>
      k === 0 ? { ...one, certificate: null } : one,
    );
    const criteria = exitCriteria({ ...state, result: { ...result, conditions } });
    expect(criteria.find(({ id }) => id === "solved")).toMatchObject({
      verdict: "fail",
      met: 1,
      of: 2,
      open: ["Cool is not solved"],
    });
  });
});

describe("[EX6] a check", () => {
  it("is asked for every edit but those that only moved something", () => {
    expect(
      exitCriteria({ ...state, decisions: [] }).find(({ id }) => id === "checked"),
    ).toMatchObject({ verdict: "unknown", met: 0, of: 2, open: ["R1 resistance", "A"] });
  });

  it("counts for its own revision, until it is taken back, and not by an author", () => {
    const having = (...more: readonly Decision[]) =>
      verdict({ ...state, decisions: [...checks, ...more] }, "checked");
    expect(having()).toBe("pass");
    expect(having(uncheck("idris", "R1.resistance"))).toBe("unknown");
    expect(having(uncheck("idris", "R1.resistance"), check("tove", "R1.resistance"))).toBe("pass");
    const other = [check("idris", "R1.resistance", "C"), check("idris", "OUT renamed")];
    expect(verdict({ ...state, decisions: other }, "checked")).toBe("unknown");
    expect(verdict({ ...state, authors: ["mara", "idris"] }, "checked")).toBe("unknown");
  });
});

describe("[EX5] a major finding", () => {
  const finding: Finding = {
    id: "f",
    number: 1,
    anchor: { net: "A" },
    severity: "major",
    text: "Too high",
    author: "idris",
    at: "2026-11-28T08:00:00.000Z",
    revision: "C",
    was: null,
    remarks: [],
  };
  const having = (...decisions: readonly Decision[]) =>
    verdict({ ...state, findings: [finding], decisions: [...checks, ...decisions] }, "findings");
  const closure = (user: string) => decided("closure", user, { finding: "f", reason: "mended" });
  const reopening = decided("reopening", "tove", { finding: "f", reason: "no" });

  it("is open until closed, open again when reopened, and the last word counts", () => {
    expect(having()).toBe("fail");
    expect(having(closure("idris"))).toBe("pass");
    expect(having(closure("idris"), reopening)).toBe("fail");
    expect(having(closure("idris"), reopening, closure("tove"))).toBe("pass");
    // Someone without the right closing it again takes nothing for granted.
    expect(having(closure("idris"), closure("jonas"))).toBe("fail");
  });
});
