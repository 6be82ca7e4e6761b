import fc from "fast-check";
import { LuDecomposition, Matrix } from "ml-matrix";
import { describe, expect, it } from "vitest";
import { analyse } from "../../lib/numerics/analyse";
import { refactor } from "../../lib/numerics/refactor";
import { errorBound } from "../../lib/numerics/skeel-condition";
import { solve, solveTransposed } from "../../lib/numerics/solve";
import { assembled, dense, type Entries, factored, largest, product } from "./written-matrices";

/** Random sparse matrices whose diagonal lies on a random permutation, so that most are regular. */
const someEntries: fc.Arbitrary<Entries> = fc
  .integer({ min: 1, max: 24 })
  .chain((n) =>
    fc.record({
      n: fc.constant(n),
      permutation: fc.shuffledSubarray([...Array(n).keys()], { minLength: n, maxLength: n }),
      size: fc.array(fc.integer({ min: -6, max: 6 }), { minLength: n, maxLength: n }),
      more: fc.array(
        fc.tuple(fc.nat(n - 1), fc.nat(n - 1), fc.double({ min: -4, max: 4, noNaN: true })),
        { maxLength: 4 * n },
      ),
    }),
  )
  .map(({ n, permutation, size, more }) => ({
    n,
    rows: [...permutation, ...more.map(([row]) => row)],
    columns: [...permutation.keys(), ...more.map(([, column]) => column)],
    values: [...size.map((exponent) => 10 ** exponent), ...more.map(([, , value]) => value)],
  }));

describe("sparse LU", () => {
  it("solves as well as dense LU, whatever the order of rows and columns", () => {
    let solved = 0;
    fc.assert(
      fc.property(someEntries, (entries) => {
        const matrix = assembled(entries);
        const made = factored(matrix);
        const wanted = Float64Array.from({ length: entries.n }, (_, i) => Math.sin(i + 1));
        const b = product(matrix, wanted);
        if (!made.ok) {
          expect(Math.abs(new LuDecomposition(dense(entries)).determinant)).toBeLessThan(1e-3);
          return;
        }
        const x = solve(made.value, b);
        const bound = errorBound(matrix, made.value, x);
        const error = largest(x.map((value, i) => value - (wanted[i] ?? 0)));
        expect(error).toBeLessThanOrEqual(Math.max(64 * entries.n * bound, 1e-13));
        solved += 1;
      }),
    );
    expect(solved).toBeGreaterThan(20);
  });

  it("solves the transposed system with the same factor", () => {
    fc.assert(
      fc.property(someEntries, (entries) => {
        const made = factored(assembled(entries));
        if (!made.ok) {
          expect(made.ok).toBe(false);
          return;
        }
        const b = Float64Array.from({ length: entries.n }, (_, i) => Math.cos(i));
        const x = solveTransposed(made.value, b);
        const back = dense(entries, true).mmul(Matrix.columnVector(Array.from(x)));
        const size = dense(entries, true)
          .abs()
          .mmul(Matrix.columnVector(Array.from(x, Math.abs)));
        for (let i = 0; i < entries.n; i++) {
          const scale = size.get(i, 0) + Math.abs(b[i] ?? 0);
          expect(Math.abs(back.get(i, 0) - (b[i] ?? 0))).toBeLessThanOrEqual(
            1e-9 * Math.max(scale, largest(x)),
          );
        }
      }),
    );
  });

  it("gives by refactoring what factoring gives", () => {
    fc.assert(
      fc.property(someEntries, fc.double({ min: 0.5, max: 2, noNaN: true }), (entries, scale) => {
        const matrix = assembled(entries);
        const made = factored(matrix);
        if (!made.ok) {
          expect(made.ok).toBe(false);
          return;
        }
        const other = { ...matrix, values: matrix.values.map((value) => value * scale) };
        const again = refactor(other, made.value);
        expect(again.ok || again.error.kind === "pivotTooSmall").toBe(true);
        if (!again.ok) return;
        const b = new Float64Array(entries.n).fill(1);
        const one = solve(made.value, b);
        const two = solve(again.value, b);
        expect(largest(two.map((value, i) => value * scale - (one[i] ?? 0)))).toBeLessThanOrEqual(
          1e-9 * Math.max(largest(one), 1e-300),
        );
      }),
    );
  });

  it("names rows and columns of a matrix that no values could mend", () => {
    const entries: Entries = { n: 3, rows: [0, 1, 0], columns: [0, 0, 1], values: [1, 1, 1] };
    const analysis = analyse(assembled(entries));
    expect(analysis.ok).toBe(false);
    if (analysis.ok) return;
    expect(analysis.error.unmatchedColumns).toEqual([2]);
    expect(analysis.error.unmatchedRows).toEqual([2]);
  });

  it("finds no pivot in a matrix of two equal rows", () => {
    const entries: Entries = {
      n: 2,
      rows: [0, 0, 1, 1],
      columns: [0, 1, 0, 1],
      values: [1, 2, 1, 2],
    };
    const made = factored(assembled(entries));
    expect(made.ok).toBe(false);
  });
});
