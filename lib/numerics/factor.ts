import { fail, ok, type Result } from "../values/result";
import type { Analysis } from "./analyse";
import type { SparseMatrix } from "./sparse-matrix";

/**
 * P A Q = L U. Columns of L (unit diagonal, not stored) and of U (without its diagonal) in pivot
 * numbers; the patterns stay for a refactor with other values.
 */
export interface Factor {
  readonly analysis: Analysis;
  readonly n: number;
  /** Row of A that is pivot k. */
  readonly pivotRow: Int32Array;
  /** Step at which a row of A is the pivot: the inverse of `pivotRow`. */
  readonly stepOfRow: Int32Array;
  /** Column of A eliminated at step k. */
  readonly pivotColumn: Int32Array;
  readonly lowerStart: Int32Array;
  readonly lowerIndex: Int32Array;
  readonly lowerValue: Float64Array;
  readonly upperStart: Int32Array;
  readonly upperIndex: Int32Array;
  readonly upperValue: Float64Array;
  readonly diagonal: Float64Array;
}

/** The values leave no pivot at one step. */
export interface NumericallySingular {
  readonly kind: "numericallySingular";
  /** Column of A without a pivot. */
  readonly column: number;
}

/** A pivot smaller than this part of its column's largest gives way to that one; the matched row is preferred above it. */
const THRESHOLD = 1e-3;

/** Left-looking factorisation (Gilbert and Peierls 1988) with threshold pivoting, in the analysed order. */
export function factor(
  matrix: SparseMatrix,
  analysis: Analysis,
): Result<Factor, NumericallySingular> {
  const { n } = analysis;
  const { columnStart, rowIndex } = matrix.pattern;
  const matchedRow = analysis.row.slice();
  const stepOfMatched = new Int32Array(n);
  for (let k = 0; k < n; k++) stepOfMatched[matchedRow[k] ?? 0] = k;
  const stepOfRow = new Int32Array(n).fill(-1);
  const pivotRow = new Int32Array(n);
  const diagonal = new Float64Array(n);
  const lowerStart = new Int32Array(n + 1);
  const upperStart = new Int32Array(n + 1);
  const lowerRow: number[] = [];
  const lowerValue: number[] = [];
  const upperIndex: number[] = [];
  const upperValue: number[] = [];
  const work = new Float64Array(n);
  const reach = new Reach(n, stepOfRow, lowerStart, lowerRow);

  for (let k = 0; k < n; k++) {
    const column = analysis.column[k] ?? 0;
    const from = columnStart[column] ?? 0;
    const to = columnStart[column + 1] ?? 0;
    reach.of(k, rowIndex.subarray(from, to));
    for (let p = from; p < to; p++) work[rowIndex[p] ?? 0] = matrix.values[p] ?? 0;
    for (let t = reach.solved.length - 1; t >= 0; t--) {
      const step = reach.solved[t] ?? 0;
      const row = pivotRow[step] ?? 0;
      const u = work[row] ?? 0;
      work[row] = 0;
      upperIndex.push(step);
      upperValue.push(u);
      if (u === 0) continue;
      for (let q = lowerStart[step] ?? 0; q < (lowerStart[step + 1] ?? 0); q++) {
        const i = lowerRow[q] ?? 0;
        work[i] = (work[i] ?? 0) - (lowerValue[q] ?? 0) * u;
      }
    }
    upperStart[k + 1] = upperIndex.length;
    const pivot = choosePivot(work, reach.unsolved, matchedRow[k] ?? 0, stepOfRow);
    if (pivot === -1) return fail({ kind: "numericallySingular", column });
    const displaced = matchedRow[k] ?? 0;
    if (pivot !== displaced) {
      // The displaced row becomes the candidate of the column that lost its own: else fill grows.
      const later = stepOfMatched[pivot] ?? 0;
      matchedRow[later] = displaced;
      stepOfMatched[displaced] = later;
    }
    const d = work[pivot] ?? 0;
    diagonal[k] = d;
    pivotRow[k] = pivot;
    stepOfRow[pivot] = k;
    work[pivot] = 0;
    for (const row of reach.unsolved) {
      if (row === pivot) continue;
      lowerRow.push(row);
      lowerValue.push((work[row] ?? 0) / d);
      work[row] = 0;
    }
    lowerStart[k + 1] = lowerRow.length;
  }
  return ok({
    analysis,
    n,
    pivotRow,
    stepOfRow,
    pivotColumn: analysis.column,
    lowerStart,
    lowerIndex: Int32Array.from(lowerRow, (row) => stepOfRow[row] ?? 0),
    lowerValue: Float64Array.from(lowerValue),
    upperStart,
    upperIndex: Int32Array.from(upperIndex),
    upperValue: Float64Array.from(upperValue),
    diagonal,
  });
}

/** The rows a column reaches through L: those that are pivots already, in reverse topological order, and the rest. */
class Reach {
  readonly solved: number[] = [];
  readonly unsolved: number[] = [];
  private readonly mark: Int32Array;

  constructor(
    n: number,
    private readonly stepOfRow: Int32Array,
    private readonly lowerStart: Int32Array,
    private readonly lowerRow: readonly number[],
  ) {
    this.mark = new Int32Array(n).fill(-1);
  }

  of(k: number, rows: Int32Array): void {
    this.solved.length = 0;
    this.unsolved.length = 0;
    for (const row of rows) if (this.mark[row] !== k) this.visit(k, row);
  }

  /** Depth first without recursion: long chains of resistors would overflow the call stack. */
  private visit(k: number, from: number): void {
    this.mark[from] = k;
    const first = this.stepOfRow[from] ?? -1;
    if (first === -1) {
      this.unsolved.push(from);
      return;
    }
    const path = [first];
    const next = [this.lowerStart[first] ?? 0];
    while (path.length > 0) {
      const step = path[path.length - 1] ?? 0;
      const q = next[next.length - 1] ?? 0;
      if (q >= (this.lowerStart[step + 1] ?? 0)) {
        this.solved.push(step);
        path.pop();
        next.pop();
        continue;
      }
      next[next.length - 1] = q + 1;
      const row = this.lowerRow[q] ?? 0;
      if (this.mark[row] === k) continue;
      this.mark[row] = k;
      const other = this.stepOfRow[row] ?? -1;
      if (other === -1) {
        this.unsolved.push(row);
      } else {
        path.push(other);
        next.push(this.lowerStart[other] ?? 0);
      }
    }
  }
}

function choosePivot(
  work: Float64Array,
  rows: readonly number[],
  matched: number,
  stepOfRow: Int32Array,
): number {
  let largest = 0;
  let pivot = -1;
  for (const row of rows) {
    const size = Math.abs(work[row] ?? 0);
    if (size > largest) {
      largest = size;
      pivot = row;
    }
  }
  if (!(largest > 0 && Number.isFinite(largest))) return -1;
  const matchedServes =
    stepOfRow[matched] === -1 && Math.abs(work[matched] ?? 0) >= THRESHOLD * largest;
  return matchedServes ? matched : pivot;
}
