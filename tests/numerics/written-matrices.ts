import fc from "fast-check";
import { Matrix } from "ml-matrix";
import { analyse } from "../../lib/numerics/analyse";
import { factor } from "../../lib/numerics/factor";
import { patternOfEntries, type SparseMatrix } from "../../lib/numerics/sparse-matrix";

/** A square matrix as a list of entries; entries of one place add up. */
export interface Entries {
  readonly n: number;
  readonly rows: readonly number[];
  readonly columns: readonly number[];
  readonly values: readonly number[];
}

/** Every order of 0 to n - 1. */
export const orderOf = (n: number): fc.Arbitrary<number[]> =>
  fc.shuffledSubarray([...Array(n).keys()], { minLength: n, maxLength: n });

/**
 * Matrices of small whole numbers, each row times a power of two: products with small whole numbers
 * are exact, so that the true solution is known however badly the rows are scaled.
 * @param exponent largest power of two, up and down; 40: about 1e±12
 */
export const exactEntries = (most: number, exponent: number): fc.Arbitrary<Entries> =>
  fc
    .integer({ min: 1, max: most })
    .chain((n) =>
      fc.record({
        n: fc.constant(n),
        permutation: orderOf(n),
        diagonal: fc.array(fc.integer({ min: 1, max: 9 }), { minLength: n, maxLength: n }),
        scale: fc.array(fc.integer({ min: -exponent, max: exponent }), {
          minLength: n,
          maxLength: n,
        }),
        more: fc.array(fc.tuple(fc.nat(n - 1), fc.nat(n - 1), fc.integer({ min: -9, max: 9 })), {
          minLength: n,
          maxLength: 3 * n,
        }),
      }),
    )
    .map(({ n, permutation, diagonal, scale, more }) => {
      const rows = [...permutation, ...more.map(([row]) => row)];
      const whole = [...diagonal, ...more.map(([, , value]) => value)];
      return {
        n,
        rows,
        columns: [...permutation.keys(), ...more.map(([, column]) => column)],
        values: whole.map((value, k) => value * 2 ** (scale[rows[k] ?? 0] ?? 0)),
      };
    });

export function assembled(entries: Entries): SparseMatrix {
  const { pattern, slot } = patternOfEntries(entries.n, entries.rows, entries.columns);
  const values = new Float64Array(pattern.rowIndex.length);
  entries.values.forEach((value, k) => {
    const at = slot[k] ?? 0;
    values[at] = (values[at] ?? 0) + value;
  });
  return { pattern, values };
}

export function dense(entries: Entries, transposed = false): Matrix {
  const matrix = Matrix.zeros(entries.n, entries.n);
  entries.values.forEach((value, k) => {
    const row = entries.rows[k] ?? 0;
    const column = entries.columns[k] ?? 0;
    const [i, j] = transposed ? [column, row] : [row, column];
    matrix.set(i, j, matrix.get(i, j) + value);
  });
  return matrix;
}

/** A full matrix as entries. */
export function full(rows: readonly (readonly number[])[]): Entries {
  const n = rows.length;
  return {
    n,
    rows: rows.flatMap((_, i) => Array<number>(n).fill(i)),
    columns: rows.flatMap((row) => [...row.keys()]),
    values: rows.flat(),
  };
}

/** A x */
export function product(matrix: SparseMatrix, x: Float64Array): Float64Array {
  const { n, columnStart, rowIndex } = matrix.pattern;
  const y = new Float64Array(n);
  for (let column = 0; column < n; column++) {
    const factorOfColumn = x[column] ?? 0;
    for (let p = columnStart[column] ?? 0; p < (columnStart[column + 1] ?? 0); p++) {
      const row = rowIndex[p] ?? 0;
      y[row] = (y[row] ?? 0) + (matrix.values[p] ?? 0) * factorOfColumn;
    }
  }
  return y;
}

export function factored(matrix: SparseMatrix) {
  const analysis = analyse(matrix);
  return analysis.ok ? factor(matrix, analysis.value) : analysis;
}

export const largest = (values: ArrayLike<number>): number =>
  Array.from(values).reduce((most, value) => Math.max(most, Math.abs(value)), 0);

/** max |a - b| */
export const distance = (a: Float64Array, b: Float64Array): number =>
  largest(a.map((value, i) => value - (b[i] ?? 0)));
