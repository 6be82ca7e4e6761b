/** Where a square sparse matrix may have entries: compressed by columns, rows ascending in each column. */
export interface SparsePattern {
  readonly n: number;
  /** n + 1 places: column j holds entries columnStart[j] up to columnStart[j + 1]. */
  readonly columnStart: Int32Array;
  readonly rowIndex: Int32Array;
}

/** A square sparse matrix: a pattern and its values. */
export interface SparseMatrix {
  readonly pattern: SparsePattern;
  readonly values: Float64Array;
}

/** A pattern made from a list of entries, and where in `values` each listed entry is summed. */
export interface PatternOfEntries {
  readonly pattern: SparsePattern;
  /** Entry k of the list adds to values[slot[k]]; repeated entries share a slot. */
  readonly slot: Int32Array;
}

/**
 * The pattern of a list of entries (row, column), so that assembling is symbolic once and numeric
 * often. Two counting sorts, by row and then by column, leave the rows ascending.
 */
export function patternOfEntries(
  n: number,
  rows: readonly number[],
  columns: readonly number[],
): PatternOfEntries {
  const count = rows.length;
  const byRow = countingOrder(n, rows, identity(count));
  const order = countingOrder(n, columns, byRow);
  const columnStart = new Int32Array(n + 1);
  const rowIndex = new Int32Array(count);
  const slot = new Int32Array(count);
  let used = 0;
  let at = 0;
  for (let column = 0; column < n; column++) {
    const start = used;
    for (; at < count && columns[order[at] ?? 0] === column; at++) {
      const entry = order[at] ?? 0;
      const row = rows[entry] ?? 0;
      if (used === start || rowIndex[used - 1] !== row) rowIndex[used++] = row;
      slot[entry] = used - 1;
    }
    columnStart[column + 1] = used;
  }
  return { pattern: { n, columnStart, rowIndex: rowIndex.slice(0, used) }, slot };
}

function identity(count: number): Int32Array {
  return Int32Array.from({ length: count }, (_, index) => index);
}

/** The given order, sorted stably by key. */
function countingOrder(n: number, keys: readonly number[], given: Int32Array): Int32Array {
  const start = new Int32Array(n + 1);
  for (const key of keys) start[key + 1] = (start[key + 1] ?? 0) + 1;
  for (let key = 0; key < n; key++) start[key + 1] = (start[key + 1] ?? 0) + (start[key] ?? 0);
  const order = new Int32Array(given.length);
  for (const entry of given) {
    const key = keys[entry] ?? 0;
    const place = start[key] ?? 0;
    order[place] = entry;
    start[key] = place + 1;
  }
  return order;
}
