import type { SparseMatrix } from "./sparse-matrix";

/**
 * The matching of largest product of |entries| (Duff and Koster 2001): shortest augmenting paths on
 * the costs log(column maximum / |a|), with dual variables. A plain array serves as the queue: paths
 * are short in circuit matrices.
 * @returns row matched to each column, -1 where none can be
 */
export function heaviestMatching(matrix: SparseMatrix): Int32Array {
  const { n, columnStart, rowIndex } = matrix.pattern;
  const cost = columnCosts(matrix);
  const rowDual = new Float64Array(n).fill(Number.POSITIVE_INFINITY);
  for (let p = 0; p < rowIndex.length; p++) {
    const row = rowIndex[p] ?? 0;
    rowDual[row] = Math.min(rowDual[row] ?? 0, cost[p] ?? 0);
  }
  for (let row = 0; row < n; row++) if (rowDual[row] === Number.POSITIVE_INFINITY) rowDual[row] = 0;
  const columnDual = new Float64Array(n);
  const rowOfColumn = new Int32Array(n).fill(-1);
  const columnOfRow = new Int32Array(n).fill(-1);
  const distance = new Float64Array(n);
  const reachedFrom = new Int32Array(n);
  const reached = new Int32Array(n).fill(-1);
  const finished = new Int32Array(n).fill(-1);

  const reduced = (p: number, column: number): number =>
    (cost[p] ?? 0) - (rowDual[rowIndex[p] ?? 0] ?? 0) - (columnDual[column] ?? 0);

  for (let column = 0; column < n; column++) {
    let least = Number.POSITIVE_INFINITY;
    for (let p = columnStart[column] ?? 0; p < (columnStart[column + 1] ?? 0); p++)
      least = Math.min(least, (cost[p] ?? 0) - (rowDual[rowIndex[p] ?? 0] ?? 0));
    columnDual[column] = Number.isFinite(least) ? least : 0;
    takeTightEdge(column);
  }
  for (let column = 0; column < n; column++) if (rowOfColumn[column] === -1) augment(column);
  return rowOfColumn;

  /** Cheap start: a free row over a tight edge, the diagonal first. */
  function takeTightEdge(column: number): void {
    let pick = -1;
    for (let p = columnStart[column] ?? 0; p < (columnStart[column + 1] ?? 0); p++) {
      const row = rowIndex[p] ?? 0;
      if (columnOfRow[row] === -1 && reduced(p, column) <= 1e-12 && (pick === -1 || row === column))
        pick = row;
    }
    if (pick === -1) return;
    columnOfRow[pick] = column;
    rowOfColumn[column] = pick;
  }

  function augment(source: number): void {
    const queue: number[] = [];
    const done: number[] = [];
    let best = Number.POSITIVE_INFINITY;
    let bestRow = -1;
    let column = source;
    let base = 0;
    for (;;) {
      for (let p = columnStart[column] ?? 0; p < (columnStart[column + 1] ?? 0); p++) {
        const row = rowIndex[p] ?? 0;
        const through = base + reduced(p, column);
        if (finished[row] === source || !(through < best)) continue;
        if (columnOfRow[row] === -1) {
          best = through;
          bestRow = row;
          reachedFrom[row] = column;
        } else if (reached[row] !== source || through < (distance[row] ?? 0)) {
          if (reached[row] !== source) queue.push(row);
          reached[row] = source;
          distance[row] = through;
          reachedFrom[row] = column;
        }
      }
      const next = takeNearest(queue);
      if (next === -1 || (distance[next] ?? 0) >= best) break;
      finished[next] = source;
      done.push(next);
      column = columnOfRow[next] ?? 0;
      base = distance[next] ?? 0;
    }
    if (bestRow === -1) return;
    for (const row of done) {
      rowDual[row] = (rowDual[row] ?? 0) + (distance[row] ?? 0) - best;
    }
    for (let row = bestRow; ; ) {
      const by = reachedFrom[row] ?? 0;
      const before = rowOfColumn[by] ?? -1;
      rowOfColumn[by] = row;
      columnOfRow[row] = by;
      if (by === source) break;
      row = before;
    }
    for (const row of [...done, bestRow]) tighten(columnOfRow[row] ?? 0);
    tighten(source);
  }

  function takeNearest(queue: number[]): number {
    let at = -1;
    for (let k = 0; k < queue.length; k++) {
      const row = queue[k] ?? 0;
      if (at === -1 || (distance[row] ?? 0) < (distance[queue[at] ?? 0] ?? 0)) at = k;
    }
    if (at === -1) return -1;
    const row = queue[at] ?? -1;
    const last = queue.pop() ?? -1;
    if (at < queue.length) queue[at] = last;
    return row;
  }

  /** Makes the matched edge of a column tight again. */
  function tighten(column: number): void {
    const row = rowOfColumn[column] ?? -1;
    for (let p = columnStart[column] ?? 0; p < (columnStart[column + 1] ?? 0); p++)
      if (rowIndex[p] === row) columnDual[column] = (cost[p] ?? 0) - (rowDual[row] ?? 0);
  }
}

function columnCosts(matrix: SparseMatrix): Float64Array {
  const { n, columnStart } = matrix.pattern;
  const cost = new Float64Array(matrix.values.length);
  for (let column = 0; column < n; column++) {
    const start = columnStart[column] ?? 0;
    const end = columnStart[column + 1] ?? 0;
    let largest = 0;
    for (let p = start; p < end; p++) largest = Math.max(largest, Math.abs(matrix.values[p] ?? 0));
    for (let p = start; p < end; p++) {
      const size = Math.abs(matrix.values[p] ?? 0);
      cost[p] = size > 0 ? Math.log(largest) - Math.log(size) : Number.POSITIVE_INFINITY;
    }
  }
  return cost;
}
