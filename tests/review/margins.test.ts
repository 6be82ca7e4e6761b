import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { conditionMargins, leastMargin } from "../../lib/review/condition-margins";
import { limitMargin } from "../../lib/review/limit-words";
import { judge } from "../../lib/stress/judge";
import { demoRevision } from "../demo-revisions";
import { result } from "./small-review";

describe("the margins of a condition", () => {
  it("of the demo hold stress rows and limits, least first, and name the least that is not waived", () => {
    const margins = conditionMargins(
      judge(demoRevision("B").circuit, { everyCondition: true }),
      "Cold crank",
      (subject) => "part" in subject && subject.part === "K1",
    );
    expect(margins[0]?.subject).toMatchObject({ part: "K1" });
    expect(leastMargin(margins)).toMatchObject({ waived: false });
    const sorted = margins.map(({ margin }) => margin);
    expect(sorted).toEqual(sorted.toSorted((a, b) => a - b));
  });

  it("hold what is judged in it and leave out what is not known", () => {
    const stress = result.stress.map((row, k) => (k === 0 ? { ...row, margin: null } : row));
    const of = (given: typeof result) => conditionMargins(given, "Cool", () => false).length;
    expect(of(result)).toBe(6);
    expect(of({ ...result, stress })).toBe(5);
    expect(conditionMargins(result, "Elsewhere", () => false)).toEqual([]);
    expect(leastMargin([])).toBeNull();
  });

  it("name a waived one only where nothing else is left", () => {
    const one = { margin: -0.2, subject: { limit: "A" }, waived: true };
    const other = { margin: 0.3, subject: { limit: "B" }, waived: false };
    expect(leastMargin([one, other])).toBe(other);
    expect(leastMargin([one])).toBe(one);
  });
});

describe("the margin of a limit", () => {
  const row = { net: "N", condition: "X", min: null, max: null, verdict: "pass" as const };
  const margin = (bounds: object, low: number | null, high = low) =>
    limitMargin({ ...row, ...bounds, low, high });

  it("has the sign of the verdict, wherever the bounds stand", () => {
    fc.assert(
      fc.property(
        fc.double({ min: -50, max: 50, noNaN: true }),
        fc.double({ min: 0.01, max: 50, noNaN: true }),
        fc.double({ min: -100, max: 100, noNaN: true }),
        fc.double({ min: 0, max: 20, noNaN: true }),
        (min, width, low, spread) => {
          const bounds = { min, max: min + width };
          const met = low >= bounds.min && low + spread <= bounds.max;
          const found = margin(bounds, low, low + spread) ?? Number.NaN;
          if (met) expect(found).toBeGreaterThanOrEqual(-1e-12);
          else expect(found).toBeLessThanOrEqual(1e-12);
        },
      ),
    );
  });

  it("of the demo are relative to the bound", () => {
    expect(margin({ max: 5.942 }, 6.021)).toBeCloseTo(-0.0131, 4);
    expect(margin({ min: 5.5 }, 6.127)).toBeCloseTo(0.114, 3);
  });

  it("of a bound at or below zero is measured by its size, of a band across zero by its width", () => {
    expect(margin({ max: 0 }, -0.25)).toBeCloseTo(0.25, 12);
    expect(margin({ max: -4 }, -5)).toBeCloseTo(0.25, 12);
    expect(margin({ min: -4 }, -5)).toBeCloseTo(-0.25, 12);
    expect(margin({ min: -2, max: 2 }, 1)).toBeCloseTo(0.25, 12);
    expect(margin({ min: -2, max: 2 }, 3)).toBeCloseTo(-0.25, 12);
    expect(margin({}, 1)).toBeNull();
    expect(margin({ max: 1 }, null)).toBeNull();
  });
});
