import { fail, ok, type Result } from "../values/result";
import type { Factor } from "./factor";
import type { SparseMatrix } from "./sparse-matrix";

/** With these values the old pivot order is not safe any longer: factor again. */
export interface PivotTooSmall {
  readonly kind: "pivotTooSmall";
  readonly step: number;
}

/** A pivot below this part of its column means that the order no longer fits the values. */
const SMALLEST_PART = 1e-6;

/**
 * Factors other values of the same pattern in the same pivot order, which saves the search. It
 * cannot change pivots, so each is checked against its column.
 */
export function refactor(matrix: SparseMatrix, before: Factor): Result<Factor, PivotTooSmall> {
  const { n, stepOfRow, pivotColumn, lowerStart, lowerIndex, upperStart, upperIndex } = before;
  const { columnStart, rowIndex } = matrix.pattern;
  const lowerValue = new Float64Array(lowerIndex.length);
  const upperValue = new Float64Array(upperIndex.length);
  const diagonal = new Float64Array(n);
  const work = new Float64Array(n);
  for (let k = 0; k < n; k++) {
    const column = pivotColumn[k] ?? 0;
    for (let p = columnStart[column] ?? 0; p < (columnStart[column + 1] ?? 0); p++)
      work[stepOfRow[rowIndex[p] ?? 0] ?? 0] = matrix.values[p] ?? 0;
    for (let q = upperStart[k] ?? 0; q < (upperStart[k + 1] ?? 0); q++) {
      const step = upperIndex[q] ?? 0;
      const u = work[step] ?? 0;
      work[step] = 0;
      upperValue[q] = u;
      if (u === 0) continue;
      for (let t = lowerStart[step] ?? 0; t < (lowerStart[step + 1] ?? 0); t++) {
        const i = lowerIndex[t] ?? 0;
        work[i] = (work[i] ?? 0) - (lowerValue[t] ?? 0) * u;
      }
    }
    const d = work[k] ?? 0;
    work[k] = 0;
    let largest = Math.abs(d);
    for (let t = lowerStart[k] ?? 0; t < (lowerStart[k + 1] ?? 0); t++) {
      const i = lowerIndex[t] ?? 0;
      largest = Math.max(largest, Math.abs(work[i] ?? 0));
      lowerValue[t] = (work[i] ?? 0) / d;
      work[i] = 0;
    }
    // Written so that NaN is refused, and what is infinite.
    if (!(Math.abs(d) > 0 && Math.abs(d) >= SMALLEST_PART * largest && Number.isFinite(largest)))
      return fail({ kind: "pivotTooSmall", step: k });
    diagonal[k] = d;
  }
  return ok({ ...before, lowerValue, upperValue, diagonal });
}
