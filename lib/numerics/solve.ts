import type { Factor } from "./factor";

/** Solves A x = b. */
export function solve(factor: Factor, b: Float64Array): Float64Array {
  const { n, pivotRow, pivotColumn, lowerStart, lowerIndex, lowerValue } = factor;
  const { upperStart, upperIndex, upperValue, diagonal } = factor;
  const y = new Float64Array(n);
  for (let k = 0; k < n; k++) y[k] = b[pivotRow[k] ?? 0] ?? 0;
  for (let k = 0; k < n; k++) {
    const v = y[k] ?? 0;
    if (v === 0) continue;
    for (let q = lowerStart[k] ?? 0; q < (lowerStart[k + 1] ?? 0); q++) {
      const i = lowerIndex[q] ?? 0;
      y[i] = (y[i] ?? 0) - (lowerValue[q] ?? 0) * v;
    }
  }
  for (let k = n - 1; k >= 0; k--) {
    const v = (y[k] ?? 0) / (diagonal[k] ?? 0);
    y[k] = v;
    if (v === 0) continue;
    for (let q = upperStart[k] ?? 0; q < (upperStart[k + 1] ?? 0); q++) {
      const i = upperIndex[q] ?? 0;
      y[i] = (y[i] ?? 0) - (upperValue[q] ?? 0) * v;
    }
  }
  const x = new Float64Array(n);
  for (let k = 0; k < n; k++) x[pivotColumn[k] ?? 0] = y[k] ?? 0;
  return x;
}

/** Solves A' x = b with the same factor: the adjoint system. */
export function solveTransposed(factor: Factor, b: Float64Array): Float64Array {
  const { n, pivotRow, pivotColumn, lowerStart, lowerIndex, lowerValue } = factor;
  const { upperStart, upperIndex, upperValue, diagonal } = factor;
  const y = new Float64Array(n);
  for (let k = 0; k < n; k++) {
    let sum = b[pivotColumn[k] ?? 0] ?? 0;
    for (let q = upperStart[k] ?? 0; q < (upperStart[k + 1] ?? 0); q++)
      sum -= (upperValue[q] ?? 0) * (y[upperIndex[q] ?? 0] ?? 0);
    y[k] = sum / (diagonal[k] ?? 0);
  }
  for (let k = n - 1; k >= 0; k--) {
    let sum = y[k] ?? 0;
    for (let q = lowerStart[k] ?? 0; q < (lowerStart[k + 1] ?? 0); q++)
      sum -= (lowerValue[q] ?? 0) * (y[lowerIndex[q] ?? 0] ?? 0);
    y[k] = sum;
  }
  const x = new Float64Array(n);
  for (let k = 0; k < n; k++) x[pivotRow[k] ?? 0] = y[k] ?? 0;
  return x;
}

/** Smallest over largest pivot: information only, never a judgement. */
export function pivotRatio(factor: Factor): number {
  let least = Number.POSITIVE_INFINITY;
  let largest = 0;
  for (const d of factor.diagonal) {
    least = Math.min(least, Math.abs(d));
    largest = Math.max(largest, Math.abs(d));
  }
  return factor.n === 0 ? 1 : least / largest;
}
