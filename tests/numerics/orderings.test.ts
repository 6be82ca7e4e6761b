import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { heaviestMatching } from "../../lib/numerics/heaviest-matching";
import { minimumDegree } from "../../lib/numerics/minimum-degree";
import { strongBlocks } from "../../lib/numerics/strong-blocks";
import { assembled, dense, type Entries, exactEntries, orderOf } from "./written-matrices";

/** Any few entries, zeros among them, so that some columns cannot be matched; close or far in size. */
const fewEntries: fc.Arbitrary<Entries> = fc
  .tuple(fc.integer({ min: 1, max: 6 }), fc.constantFrom(0, 1, 12))
  .chain(([n, exponent]) =>
    fc.record({
      n: fc.constant(n),
      places: fc.subarray([...Array(n * n).keys()], { minLength: Math.floor((n * n) / 3) }),
      digit: fc.array(fc.integer({ min: -9, max: 9 }), { minLength: n * n, maxLength: n * n }),
      power: fc.array(fc.integer({ min: -exponent, max: exponent }), {
        minLength: n * n,
        maxLength: n * n,
      }),
    }),
  )
  .map(({ n, places, digit, power }) => ({
    n,
    rows: places.map((place) => Math.floor(place / n)),
    columns: places.map((place) => place % n),
    values: places.map((_, k) => (digit[k] ?? 0) * 10 ** (power[k] ?? 0)),
  }));

interface Best {
  readonly count: number;
  /** Logarithm of the product of |entries|. */
  readonly size: number;
}

/** Of all matchings the most entries, and among those the largest product. */
function bestByTrying(entries: Entries): Best {
  const matrix = dense(entries);
  const taken = new Set<number>();
  let best: Best = { count: 0, size: 0 };
  const from = (column: number, count: number, size: number): void => {
    if (column === entries.n) {
      if (count > best.count || (count === best.count && size > best.size)) best = { count, size };
      return;
    }
    from(column + 1, count, size);
    for (let row = 0; row < entries.n; row++) {
      const entry = Math.abs(matrix.get(row, column));
      if (entry === 0 || taken.has(row)) continue;
      taken.add(row);
      from(column + 1, count + 1, size + Math.log(entry));
      taken.delete(row);
    }
  };
  from(0, 0, 0);
  return best;
}

describe("the heaviest matching", () => {
  it("has the largest product of all, and as many entries as any", () => {
    let whole = 0;
    fc.assert(
      fc.property(fewEntries, (entries) => {
        const rowOfColumn = heaviestMatching(assembled(entries));
        const matched = [...rowOfColumn.entries()].filter(([, row]) => row !== -1);
        expect(new Set(matched.map(([, row]) => row)).size).toBe(matched.length);
        const matrix = dense(entries);
        const sizes = matched.map(([column, row]) => Math.log(Math.abs(matrix.get(row, column))));
        const best = bestByTrying(entries);
        expect(matched).toHaveLength(best.count);
        if (best.count < entries.n) return;
        whole += 1;
        expect(sizes.reduce((sum, size) => sum + size, 0)).toBeCloseTo(best.size, 9);
      }),
      { numRuns: 1000 },
    );
    expect(whole).toBeGreaterThan(100);
  });

  it("has the same product in whatever order rows and columns come", () => {
    fc.assert(
      fc.property(
        exactEntries(60, 10).chain((entries) =>
          fc.tuple(fc.constant(entries), orderOf(entries.n), orderOf(entries.n)),
        ),
        ([entries, newRow, newColumn]) => {
          const other = {
            ...entries,
            rows: entries.rows.map((row) => newRow[row] ?? 0),
            columns: entries.columns.map((column) => newColumn[column] ?? 0),
          };
          const [size, sizeOther] = [matchedSize(entries), matchedSize(other)];
          expect(Number.isNaN(sizeOther)).toBe(Number.isNaN(size));
          if (!Number.isNaN(size)) expect(sizeOther).toBeCloseTo(size, 8);
        },
      ),
      { numRuns: 200 },
    );
  });
});

/** Logarithm of the product of the matched |entries|. */
function matchedSize(entries: Entries): number {
  const matrix = dense(entries);
  return heaviestMatching(assembled(entries)).reduce(
    (sum, row, column) =>
      row === -1 ? Number.NaN : sum + Math.log(Math.abs(matrix.get(row, column))),
    0,
  );
}

describe("strong blocks", () => {
  it("leave nothing below the blocks of the matched matrix", () => {
    fc.assert(
      fc.property(exactEntries(60, 10), (entries) => {
        const matrix = assembled(entries);
        const rowOfColumn = heaviestMatching(matrix);
        if (rowOfColumn.includes(-1)) {
          expect(rowOfColumn).toHaveLength(entries.n);
          return;
        }
        const { order, start } = strongBlocks(matrix.pattern, rowOfColumn);
        expect(order.toSorted()).toEqual(Int32Array.from({ length: entries.n }, (_, k) => k));
        const blockOfRow = new Int32Array(entries.n);
        for (let b = 0; b + 1 < start.length; b++)
          for (const column of order.subarray(start[b], start[b + 1]))
            blockOfRow[rowOfColumn[column] ?? -1] = b;
        const { columnStart, rowIndex } = matrix.pattern;
        let below = 0;
        for (let column = 0; column < entries.n; column++)
          for (const row of rowIndex.subarray(columnStart[column], columnStart[column + 1]))
            if ((blockOfRow[row] ?? 0) > (blockOfRow[rowOfColumn[column] ?? -1] ?? 0)) below += 1;
        expect(below).toBe(0);
      }),
    );
  });
});

type Edge = readonly [number, number];

function adjacent(n: number, edges: readonly Edge[]): readonly Set<number>[] {
  const next: Set<number>[] = Array.from({ length: n }, () => new Set());
  for (const [a, b] of edges) {
    if (a === b) continue;
    next[a]?.add(b);
    next[b]?.add(a);
  }
  return next;
}

function ordered(n: number, edges: readonly Edge[]): Int32Array {
  const next = adjacent(n, edges);
  const start = new Int32Array(n + 1);
  next.forEach((set, node) => {
    start[node + 1] = (start[node] ?? 0) + set.size;
  });
  return minimumDegree(n, start, Int32Array.from(next.flatMap((set) => [...set])));
}

/** Edges that elimination in this order adds. */
function fill(n: number, edges: readonly Edge[], order: Iterable<number>): number {
  const next = adjacent(n, edges);
  let added = 0;
  for (const pivot of order) {
    const members = [...(next[pivot] ?? [])];
    for (const a of members) {
      next[a]?.delete(pivot);
      for (const b of members) {
        if (a >= b || next[a]?.has(b)) continue;
        next[a]?.add(b);
        next[b]?.add(a);
        added += 1;
      }
    }
  }
  return added;
}

/** A square of resistors. */
function grid(side: number): readonly Edge[] {
  const edges: Edge[] = [];
  for (let k = 0; k < side * side; k++) {
    if ((k + 1) % side !== 0) edges.push([k, k + 1]);
    if (k + side < side * side) edges.push([k, k + side]);
  }
  return edges;
}

describe("minimum degree", () => {
  it("puts every node in its order once", () => {
    const graph = fc
      .integer({ min: 1, max: 60 })
      .chain((n) =>
        fc.tuple(
          fc.constant(n),
          fc.array(fc.tuple(fc.nat(n - 1), fc.nat(n - 1)), { maxLength: 3 * n }),
        ),
      );
    fc.assert(
      fc.property(graph, ([n, edges]) => {
        expect(ordered(n, edges).toSorted()).toEqual(Int32Array.from({ length: n }, (_, k) => k));
      }),
    );
  });

  it.each([2, 3, 5, 8, 12, 20])(
    "fills a grid of side %i no more than the natural order",
    (side) => {
      const n = side * side;
      const edges = grid(side);
      expect(fill(n, edges, ordered(n, edges))).toBeLessThanOrEqual(
        fill(n, edges, Array(n).keys()),
      );
    },
  );

  it("fills a large grid less than half as much as the natural order", () => {
    const edges = grid(24);
    const natural = fill(576, edges, Array(576).keys());
    expect(fill(576, edges, ordered(576, edges))).toBeLessThan(natural / 2);
  });

  it("adds nothing to a tree, whatever the numbers of its nodes", () => {
    const tree = fc
      .integer({ min: 1, max: 80 })
      .chain((n) => fc.tuple(orderOf(n), fc.array(fc.nat(), { minLength: n, maxLength: n })));
    fc.assert(
      fc.property(tree, ([name, pick]) => {
        const edges = name
          .slice(1)
          .map((node, k): Edge => [node, name[(pick[k] ?? 0) % (k + 1)] ?? 0]);
        expect(fill(name.length, edges, ordered(name.length, edges))).toBe(0);
      }),
    );
  });
});
