import type { Factor } from "./factor";
import { solve } from "./solve";
import type { SparseMatrix } from "./sparse-matrix";

/** Veltkamp's constant for doubles: 2^27 + 1 splits a number into halves whose products are exact. */
const SPLIT = 134217729;

/**
 * b - A x with compensated sums: two-sum (Knuth) and two-product (Dekker, with Veltkamp's split),
 * so that the residual is right although it is almost all cancellation.
 */
export function compensatedResidual(
  matrix: SparseMatrix,
  b: Float64Array,
  x: Float64Array,
): Float64Array {
  const { n, columnStart, rowIndex } = matrix.pattern;
  const high = Float64Array.from(b);
  const low = new Float64Array(n);
  for (let column = 0; column < n; column++) {
    const v = x[column] ?? 0;
    const vHigh = upperHalf(v);
    const vLow = v - vHigh;
    for (let p = columnStart[column] ?? 0; p < (columnStart[column + 1] ?? 0); p++) {
      const a = -(matrix.values[p] ?? 0);
      const row = rowIndex[p] ?? 0;
      const product = a * v;
      const aHigh = upperHalf(a);
      const aLow = a - aHigh;
      const productError = aLow * vLow - (product - aHigh * vHigh - aLow * vHigh - aHigh * vLow);
      const before = high[row] ?? 0;
      const sum = before + product;
      const part = sum - before;
      const sumError = before - (sum - part) + (product - part);
      high[row] = sum;
      low[row] = (low[row] ?? 0) + sumError + productError;
    }
  }
  for (let row = 0; row < n; row++) high[row] = (high[row] ?? 0) + (low[row] ?? 0);
  return high;
}

/** One step of iterative refinement. */
export function refined(
  matrix: SparseMatrix,
  factor: Factor,
  b: Float64Array,
  x: Float64Array,
): Float64Array {
  const correction = solve(factor, compensatedResidual(matrix, b, x));
  return x.map((value, k) => value + (correction[k] ?? 0));
}

function upperHalf(value: number): number {
  const scaled = SPLIT * value;
  // Beyond 2^996 the split overflows; such values carry no low half worth keeping.
  return Number.isFinite(scaled) ? scaled - (scaled - value) : value;
}
