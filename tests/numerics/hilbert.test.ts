import { describe, expect, it } from "vitest";
import { errorBound } from "../../lib/numerics/skeel-condition";
import { solve } from "../../lib/numerics/solve";
import { assembled, factored, full, largest } from "./written-matrices";

const UNIT_ROUNDOFF = 2 ** -53;

const hilbertRows = (n: number): number[][] =>
  Array.from({ length: n }, (_, i) => Array.from({ length: n }, (__, j) => 1 / (i + j + 1)));

function binomial(n: number, k: number): number {
  let value = 1;
  for (let i = 1; i <= k; i++) value = (value * (n - k + i)) / i;
  return value;
}

/** The inverse in whole numbers (Knuth, The Art of Computer Programming 1, 1.2.3, exercise 45; from memory). */
function inverseEntry(n: number, i: number, j: number): number {
  const sign = (i + j) % 2 === 0 ? 1 : -1;
  return (
    sign *
    (i + j + 1) *
    binomial(n + i, n - j - 1) *
    binomial(n + j, n - i - 1) *
    binomial(i + j, i) ** 2
  );
}

/** Column by column, the inverse as solved. */
function solvedInverse(n: number): readonly Float64Array[] {
  const made = factored(assembled(full(hilbertRows(n))));
  if (!made.ok) throw new Error("a Hilbert matrix is regular");
  return Array.from({ length: n }, (_, j) =>
    solve(
      made.value,
      Float64Array.from({ length: n }, (__, i) => (i === j ? 1 : 0)),
    ),
  );
}

const rowSums = (n: number, entry: (i: number, j: number) => number): number[] =>
  Array.from({ length: n }, (_, i) =>
    Array.from({ length: n }, (__, j) => Math.abs(entry(i, j))).reduce((sum, value) => sum + value),
  );

describe("Hilbert matrices", () => {
  // Condition numbers in the largest row sum: from memory; they agree with the closed form of the inverse.
  it.each([
    [2, 27],
    [3, 748],
    [4, 28375],
    [5, 943656],
    [6, 29070279],
  ])("of %i rows have the condition %i", (n, condition) => {
    const columns = solvedInverse(n);
    const ofInverse = largest(rowSums(n, (i, j) => columns[j]?.[i] ?? Number.NaN));
    const ofMatrix = largest(rowSums(n, (i, j) => 1 / (i + j + 1)));
    expect(ofInverse * ofMatrix).toBeCloseTo(condition, 0);
  });

  it.each([2, 4, 6, 8])("of %i rows are inverted as well as their condition lets", (n) => {
    const columns = solvedInverse(n);
    const most = largest(rowSums(n, (i, j) => inverseEntry(n, i, j)));
    for (let j = 0; j < n; j++)
      for (let i = 0; i < n; i++) {
        const error = Math.abs((columns[j]?.[i] ?? Number.NaN) - inverseEntry(n, i, j));
        expect(error).toBeLessThanOrEqual(8 * n * UNIT_ROUNDOFF * 2 * most * most);
      }
  });

  it.each([2, 3, 4, 5, 6, 7, 8])(
    "of %i rows have the estimated Skeel condition of the closed form",
    (n) => {
      const matrix = assembled(full(hilbertRows(n)));
      const made = factored(matrix);
      if (!made.ok) throw new Error("a Hilbert matrix is regular");
      const weight = rowSums(n, (i, j) => 1 / (i + j + 1));
      const exact = largest(rowSums(n, (i, j) => inverseEntry(n, i, j) * (weight[j] ?? 0)));
      const estimate = errorBound(matrix, made.value, new Float64Array(n).fill(1)) / UNIT_ROUNDOFF;
      expect(estimate / exact).toBeCloseTo(1, 3);
    },
  );

  it.each([13, 16, 20])("of %i rows are told to be beyond the doubles", (n) => {
    const matrix = assembled(full(hilbertRows(n)));
    const made = factored(matrix);
    const estimate = made.ok ? errorBound(matrix, made.value, new Float64Array(n).fill(1)) : 1;
    expect(estimate).toBeGreaterThan(1e-3);
  });
});
