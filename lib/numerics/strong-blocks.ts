import type { SparsePattern } from "./sparse-matrix";

/** Columns in an order that makes the matched matrix block upper triangular. */
export interface StrongBlocks {
  readonly order: Int32Array;
  /** Block b is order[start[b]] up to order[start[b + 1]]. */
  readonly start: Int32Array;
}

/** The strong components of the matched matrix (Tarjan 1972), without recursion; sinks come first. */
export function strongBlocks(pattern: SparsePattern, rowOfColumn: Int32Array): StrongBlocks {
  const { n, columnStart, rowIndex } = pattern;
  const columnOfRow = new Int32Array(n);
  for (let column = 0; column < n; column++) columnOfRow[rowOfColumn[column] ?? 0] = column;
  const number = new Int32Array(n);
  const low = new Int32Array(n);
  const next = new Int32Array(n);
  const open = new Uint8Array(n);
  const stack: number[] = [];
  const order: number[] = [];
  const start = [0];
  let count = 0;

  const enter = (column: number, path: number[]): void => {
    count += 1;
    number[column] = count;
    low[column] = count;
    next[column] = columnStart[column] ?? 0;
    open[column] = 1;
    stack.push(column);
    path.push(column);
  };

  for (let root = 0; root < n; root++) {
    if (number[root] !== 0) continue;
    const path: number[] = [];
    enter(root, path);
    while (path.length > 0) {
      const column = path[path.length - 1] ?? 0;
      const p = next[column] ?? 0;
      if (p < (columnStart[column + 1] ?? 0)) {
        next[column] = p + 1;
        const to = columnOfRow[rowIndex[p] ?? 0] ?? 0;
        if (number[to] === 0) enter(to, path);
        else if (open[to] === 1) low[column] = Math.min(low[column] ?? 0, number[to] ?? 0);
        continue;
      }
      path.pop();
      const up = path[path.length - 1];
      if (up !== undefined) low[up] = Math.min(low[up] ?? 0, low[column] ?? 0);
      if (low[column] === number[column]) close(column);
    }
  }
  return { order: Int32Array.from(order), start: Int32Array.from(start) };

  function close(column: number): void {
    for (;;) {
      const member = stack.pop() ?? column;
      open[member] = 0;
      order.push(member);
      if (member === column) break;
    }
    start.push(order.length);
  }
}
