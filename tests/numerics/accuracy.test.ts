import fc from "fast-check";
import { inverse } from "ml-matrix";
import { describe, expect, it } from "vitest";
import type { Factor } from "../../lib/numerics/factor";
import { errorBound } from "../../lib/numerics/skeel-condition";
import { solve } from "../../lib/numerics/solve";
import type { SparseMatrix } from "../../lib/numerics/sparse-matrix";
import {
  assembled,
  dense,
  distance,
  type Entries,
  exactEntries,
  factored,
  largest,
  orderOf,
  product,
} from "./written-matrices";

const UNIT_ROUNDOFF = 2 ** -53;

/** Solved, and refined once with a residual in the same precision, as the last Newton step does. */
function refined(matrix: SparseMatrix, made: Factor, b: Float64Array): Float64Array {
  const x = solve(made, b);
  const back = product(matrix, x);
  const step = solve(
    made,
    b.map((value, i) => value - (back[i] ?? 0)),
  );
  return x.map((value, i) => value + (step[i] ?? 0));
}

/** Small whole numbers, not all zero: with whole entries the right side is exact. */
const wholeNumbers = (n: number): Float64Array =>
  Float64Array.from({ length: n }, (_, i) => 1 + ((i * 5) % 9));

/** Skeel's condition of a solution by a dense inverse. */
function skeelByInverse(entries: Entries, x: Float64Array): number {
  const n = entries.n;
  const matrix = dense(entries);
  const inverted = inverse(matrix);
  const weight = Array.from({ length: n }, (_, i) =>
    x.reduce((sum, value, j) => sum + Math.abs(matrix.get(i, j) * value), 0),
  );
  const sums = Array.from({ length: n }, (_, i) =>
    weight.reduce((sum, value, j) => sum + Math.abs(inverted.get(i, j)) * value, 0),
  );
  return largest(sums) / largest(x);
}

/**
 * Higham, Accuracy and Stability of Numerical Algorithms (2002), theorem 12.4: after refinement the error
 * is at most 2 γ cond(A, x) of the largest unknown, γ by the entries of the longest row. Three times that,
 * as the estimate may fall short of cond.
 */
function allowed(entries: Entries, estimate: number, x: Float64Array): number {
  const length = new Int32Array(entries.n);
  for (const row of entries.rows) length[row] = (length[row] ?? 0) + 1;
  return 3 * 2 * (Math.max(...length) + 1) * estimate * largest(x);
}

describe("the estimate of the error", () => {
  it("covers the true error after one refinement, however the rows are scaled", () => {
    let tried = 0;
    fc.assert(
      fc.property(exactEntries(200, 40), (entries) => {
        const matrix = assembled(entries);
        const made = factored(matrix);
        if (!made.ok) {
          expect(made.error.kind).toMatch(/Singular$/);
          return;
        }
        const wanted = wholeNumbers(entries.n);
        const x = refined(matrix, made.value, product(matrix, wanted));
        const estimate = errorBound(matrix, made.value, x);
        if (estimate > 1e-3) return;
        tried += 1;
        expect(distance(x, wanted)).toBeLessThanOrEqual(allowed(entries, estimate, x));
      }),
      { numRuns: 100 },
    );
    expect(tried).toBeGreaterThan(40);
  });

  it("never exceeds Skeel's condition and mostly comes near it", () => {
    const parts: number[] = [];
    fc.assert(
      fc.property(exactEntries(24, 20), (entries) => {
        const matrix = assembled(entries);
        const made = factored(matrix);
        if (!made.ok) {
          expect(made.error.kind).toMatch(/Singular$/);
          return;
        }
        const x = wholeNumbers(entries.n);
        const estimate = errorBound(matrix, made.value, x) / UNIT_ROUNDOFF;
        if (estimate > 1e8) return;
        const part = estimate / skeelByInverse(entries, x);
        parts.push(part);
        expect(part).toBeLessThanOrEqual(1 + 1e-6);
      }),
      { numRuns: 200 },
    );
    expect(parts.length).toBeGreaterThan(50);
    expect(parts.filter((part) => part > 1 / 3).length).toBeGreaterThan(0.9 * parts.length);
  });

  it("does not depend on the scale of the rows", () => {
    fc.assert(
      fc.property(exactEntries(40, 0), fc.integer({ min: -40, max: 40 }), (entries, exponent) => {
        const scaled: Entries = {
          ...entries,
          values: entries.values.map(
            (value, k) => value * 2 ** (exponent * (((entries.rows[k] ?? 0) % 3) - 1)),
          ),
        };
        const [one, other] = [assembled(entries), assembled(scaled)];
        const [made, madeScaled] = [factored(one), factored(other)];
        if (!made.ok || !madeScaled.ok) return;
        const x = wholeNumbers(entries.n);
        const estimate = errorBound(one, made.value, x);
        if (estimate > 1e-8) return;
        const ratio = errorBound(other, madeScaled.value, x) / estimate;
        expect(ratio).toBeGreaterThan(1 / 3);
        expect(ratio).toBeLessThan(3);
      }),
    );
  });
});

describe("the order of rows and columns", () => {
  it("changes the solution by no more than roundoff, though the elimination differs", () => {
    let compared = 0;
    let different = 0;
    fc.assert(
      fc.property(
        exactEntries(120, 40).chain((entries) =>
          fc.tuple(fc.constant(entries), orderOf(entries.n), orderOf(entries.n)),
        ),
        ([entries, newRow, newColumn]) => {
          const other: Entries = {
            ...entries,
            rows: entries.rows.map((row) => newRow[row] ?? 0),
            columns: entries.columns.map((column) => newColumn[column] ?? 0),
          };
          const [one, two] = [assembled(entries), assembled(other)];
          const [made, madeOther] = [factored(one), factored(two)];
          if (!made.ok || !madeOther.ok) return;
          const b = product(one, wholeNumbers(entries.n));
          const bOther = new Float64Array(entries.n);
          b.forEach((value, row) => {
            bOther[newRow[row] ?? 0] = value;
          });
          const x = refined(one, made.value, b);
          const xOther = refined(two, madeOther.value, bOther);
          const back = x.map((_, column) => xOther[newColumn[column] ?? 0] ?? Number.NaN);
          const estimate = errorBound(one, made.value, x);
          if (estimate > 1e-3) return;
          compared += 1;
          const moved = made.value.pivotColumn.some(
            (column, k) => newColumn[column] !== madeOther.value.pivotColumn[k],
          );
          if (moved) different += 1;
          expect(distance(x, back)).toBeLessThanOrEqual(2 * allowed(entries, estimate, x));
        },
      ),
      { numRuns: 60 },
    );
    expect(compared).toBeGreaterThan(20);
    expect(different).toBeGreaterThan(compared / 2);
  });
});
