import fc from "fast-check";
import { Matrix } from "ml-matrix";
import { describe, expect, it } from "vitest";
import type { Factor } from "../../lib/numerics/factor";
import { refactor } from "../../lib/numerics/refactor";
import { solve } from "../../lib/numerics/solve";
import {
  assembled,
  dense,
  distance,
  type Entries,
  exactEntries,
  factored,
  full,
  largest,
  product,
} from "./written-matrices";

const UNIT_ROUNDOFF = 2 ** -53;

function triangles(made: Factor): { lower: Matrix; upper: Matrix } {
  const lower = Matrix.identity(made.n, made.n);
  const upper = Matrix.zeros(made.n, made.n);
  for (let k = 0; k < made.n; k++) {
    upper.set(k, k, made.diagonal[k] ?? Number.NaN);
    for (let q = made.lowerStart[k] ?? 0; q < (made.lowerStart[k + 1] ?? 0); q++)
      lower.set(made.lowerIndex[q] ?? 0, k, made.lowerValue[q] ?? Number.NaN);
    for (let q = made.upperStart[k] ?? 0; q < (made.upperStart[k + 1] ?? 0); q++)
      upper.set(made.upperIndex[q] ?? 0, k, made.upperValue[q] ?? Number.NaN);
  }
  return { lower, upper };
}

/** Higham, Accuracy and Stability of Numerical Algorithms (2002), theorem 9.3: |P A Q - L U| ≤ γ |L| |U|. */
function expectProduct(entries: Entries, made: Factor): void {
  const { lower, upper } = triangles(made);
  const permuted = dense(entries).selection(
    Array.from(made.pivotRow),
    Array.from(made.pivotColumn),
  );
  const error = Matrix.sub(lower.mmul(upper), permuted).abs();
  // Once for the factorisation, once for the product taken here.
  const allowed = Matrix.abs(lower)
    .mmul(Matrix.abs(upper))
    .mul(2 * (made.n + 2) * UNIT_ROUNDOFF);
  let excess = 0;
  for (let i = 0; i < made.n; i++)
    for (let j = 0; j < made.n; j++)
      if (!(error.get(i, j) <= allowed.get(i, j))) excess = Math.max(excess, 1);
  expect(excess).toBe(0);
}

const isOrder = (order: Int32Array): boolean =>
  order.toSorted().every((value, index) => value === index);

describe("the factors", () => {
  it("multiply to the matrix in pivot order, up to 200 unknowns and rows scaled by 1e±12", () => {
    let made = 0;
    fc.assert(
      fc.property(exactEntries(200, 40), (entries) => {
        const result = factored(assembled(entries));
        if (!result.ok) {
          expect(result.error.kind).toMatch(/Singular$/);
          return;
        }
        made += 1;
        expect(isOrder(result.value.pivotRow)).toBe(true);
        expect(isOrder(result.value.pivotColumn)).toBe(true);
        expectProduct(entries, result.value);
      }),
      { numRuns: 60 },
    );
    expect(made).toBeGreaterThan(20);
  });

  it("hold no multiplier above the inverse of the pivot threshold", () => {
    fc.assert(
      fc.property(exactEntries(60, 40), (entries) => {
        const result = factored(assembled(entries));
        if (!result.ok) {
          expect(result.ok).toBe(false);
          return;
        }
        expect(largest(result.value.lowerValue)).toBeLessThanOrEqual(1e3 * (1 + 1e-12));
      }),
    );
  });

  it("multiply to the matrix of other values too, or those values are refused", () => {
    let kept = 0;
    fc.assert(
      fc.property(
        exactEntries(40, 20).chain((entries) =>
          fc.record({
            entries: fc.constant(entries),
            scale: fc.array(fc.integer({ min: -3000, max: 3000 }), {
              minLength: entries.values.length,
              maxLength: entries.values.length,
            }),
          }),
        ),
        ({ entries, scale }) => {
          const before = factored(assembled(entries));
          if (!before.ok) {
            expect(before.ok).toBe(false);
            return;
          }
          const other: Entries = {
            ...entries,
            values: entries.values.map((value, k) => (value * (scale[k] ?? 0)) / 1000),
          };
          const after = refactor(assembled(other), before.value);
          if (!after.ok) {
            expect(after.error.kind).toBe("pivotTooSmall");
            return;
          }
          kept += 1;
          expectProduct(other, after.value);
        },
      ),
    );
    expect(kept).toBeGreaterThan(10);
  });
});

describe("a pivot order that no longer fits the values", () => {
  const before = factored(
    assembled(
      full([
        [4, 1],
        [1, 3],
      ]),
    ),
  );
  const withCorner = (corner: number) =>
    assembled(
      full([
        [corner, 1],
        [1, corner],
      ]),
    );

  it.each([1e-9, 0, Number.NaN, Number.POSITIVE_INFINITY])(
    "is refused for pivots of %s",
    (corner) => {
      if (!before.ok) throw new Error("the first matrix is regular");
      const again = refactor(withCorner(corner), before.value);
      expect(again.ok ? null : again.error).toEqual({ kind: "pivotTooSmall", step: 0 });
    },
  );

  it("gives way to a new one, which solves", () => {
    const matrix = withCorner(1e-9);
    const made = factored(matrix);
    if (!made.ok) throw new Error("the matrix is regular");
    const wanted = Float64Array.of(3, -7);
    expect(distance(solve(made.value, product(matrix, wanted)), wanted)).toBeLessThan(1e-14);
  });

  it("is kept while the pivots stay above a millionth of their columns", () => {
    if (!before.ok) throw new Error("the first matrix is regular");
    expect(refactor(withCorner(2e-6), before.value).ok).toBe(true);
  });
});

describe("a singular matrix", () => {
  it("has no pivot, or one that is rounding, where one equation is a sum of others", () => {
    const made = factored(
      assembled(
        full([
          [1, 2, 3],
          [4, 5, 6],
          [5, 7, 9],
        ]),
      ),
    );
    const smallest = made.ok ? Math.min(...made.value.diagonal.map(Math.abs)) : 0;
    expect(smallest).toBeLessThan(1e-14);
  });

  it("is named by the column that holds nothing but zeros", () => {
    fc.assert(
      fc.property(fc.integer({ min: 2, max: 12 }), fc.nat(11), (n, pick) => {
        const zero = pick % n;
        const rows = Array.from({ length: n }, (_, i) =>
          Array.from({ length: n }, (__, j) => (j === zero ? 0 : i === j ? 2 * n : 1)),
        );
        const made = factored(assembled(full(rows)));
        if (made.ok || made.error.kind !== "structurallySingular")
          throw new Error("a column of zeros has no pivot");
        expect(made.error.unmatchedColumns).toEqual([zero]);
        expect(made.error.unmatchedRows).toHaveLength(1);
      }),
    );
  });

  it("is named by one of two equal columns", () => {
    const made = factored(
      assembled(
        full([
          [1, 2, 1],
          [0, 4, 0],
          [3, 1, 3],
        ]),
      ),
    );
    if (made.ok || made.error.kind !== "numericallySingular")
      throw new Error("two equal columns leave no pivot");
    expect([0, 2]).toContain(made.error.column);
  });
});
