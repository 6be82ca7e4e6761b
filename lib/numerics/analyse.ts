import { fail, ok, type Result } from "../values/result";
import { heaviestMatching } from "./heaviest-matching";
import { minimumDegree } from "./minimum-degree";
import type { SparseMatrix, SparsePattern } from "./sparse-matrix";
import { strongBlocks } from "./strong-blocks";

/** The symbolic half of a solution: which row is matched to which column, blocks, and the pivot order. */
export interface Analysis {
  readonly n: number;
  /** Column eliminated at step k. */
  readonly column: Int32Array;
  /** Row matched to it. */
  readonly row: Int32Array;
  /** Block b is steps blockStart[b] up to blockStart[b + 1]. */
  readonly blockStart: Int32Array;
}

/** No matching covers every column: whatever the values are, the matrix has no inverse. */
export interface StructurallySingular {
  readonly kind: "structurallySingular";
  readonly unmatchedColumns: readonly number[];
  readonly unmatchedRows: readonly number[];
}

/** Chooses pivots by value and pattern: largest product, strong blocks, least degree in each block. */
export function analyse(matrix: SparseMatrix): Result<Analysis, StructurallySingular> {
  const { n } = matrix.pattern;
  const rowOfColumn = heaviestMatching(matrix);
  if (rowOfColumn.includes(-1)) return fail(singular(n, rowOfColumn));
  const blocks = strongBlocks(matrix.pattern, rowOfColumn);
  const column = blocks.order.slice();
  for (let b = 0; b + 1 < blocks.start.length; b++) {
    const from = blocks.start[b] ?? 0;
    const to = blocks.start[b + 1] ?? 0;
    if (to - from < 3) continue;
    const order = orderInBlock(matrix.pattern, rowOfColumn, blocks.order.subarray(from, to));
    column.set(order, from);
  }
  const row = column.map((one) => rowOfColumn[one] ?? -1);
  return ok({ n, column, row, blockStart: blocks.start });
}

/** Least degree on C + C' of a block C of the matched matrix. */
function orderInBlock(
  pattern: SparsePattern,
  rowOfColumn: Int32Array,
  columns: Int32Array,
): Int32Array {
  const size = columns.length;
  const place = new Map<number, number>();
  columns.forEach((column, k) => {
    place.set(rowOfColumn[column] ?? -1, k);
  });
  const next: Set<number>[] = Array.from({ length: size }, () => new Set());
  columns.forEach((column, k) => {
    const end = pattern.columnStart[column + 1] ?? 0;
    for (let p = pattern.columnStart[column] ?? 0; p < end; p++) {
      const other = place.get(pattern.rowIndex[p] ?? -1);
      if (other === undefined || other === k) continue;
      next[k]?.add(other);
      next[other]?.add(k);
    }
  });
  const start = new Int32Array(size + 1);
  next.forEach((set, k) => {
    start[k + 1] = (start[k] ?? 0) + set.size;
  });
  const neighbour = Int32Array.from(next.flatMap((set) => [...set]));
  return minimumDegree(size, start, neighbour).map((k) => columns[k] ?? -1);
}

function singular(n: number, rowOfColumn: Int32Array): StructurallySingular {
  const matched = new Set(rowOfColumn);
  const unmatchedColumns: number[] = [];
  const unmatchedRows: number[] = [];
  for (let k = 0; k < n; k++) {
    if (rowOfColumn[k] === -1) unmatchedColumns.push(k);
    if (!matched.has(k)) unmatchedRows.push(k);
  }
  return { kind: "structurallySingular", unmatchedColumns, unmatchedRows };
}
