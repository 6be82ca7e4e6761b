import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { UnionFind } from "../../lib/numerics/union-find";

const joins = fc
  .integer({ min: 1, max: 40 })
  .chain((n) =>
    fc.tuple(
      fc.constant(n),
      fc.array(fc.tuple(fc.nat(n - 1), fc.nat(n - 1)), { maxLength: 2 * n }),
    ),
  );

/** Which number each is together with, by painting over. */
function painted(n: number, pairs: readonly (readonly [number, number])[]): readonly number[] {
  let colour = [...Array(n).keys()];
  for (const [a, b] of pairs) {
    const [from, to] = [colour[a] ?? -1, colour[b] ?? -1];
    colour = colour.map((one) => (one === from ? to : one));
  }
  return colour;
}

describe("union-find", () => {
  it("keeps together what was joined, and nothing else", () => {
    fc.assert(
      fc.property(joins, ([n, pairs]) => {
        const sets = new UnionFind(n);
        for (const [a, b] of pairs) sets.join(a, b);
        const colour = painted(n, pairs);
        for (let a = 0; a < n; a++)
          for (let b = 0; b < n; b++)
            expect(sets.find(a) === sets.find(b)).toBe(colour[a] === colour[b]);
      }),
    );
  });

  it("has one set less by each join that tells true", () => {
    fc.assert(
      fc.property(joins, ([n, pairs]) => {
        const sets = new UnionFind(n);
        const joined = pairs.filter(([a, b]) => sets.join(a, b)).length;
        const roots = new Set(Array.from({ length: n }, (_, k) => sets.find(k)));
        expect(roots.size).toBe(n - joined);
      }),
    );
  });

  it("stands for a set by a member, and joins the joined no more", () => {
    fc.assert(
      fc.property(joins, ([n, pairs]) => {
        const sets = new UnionFind(n);
        for (const [a, b] of pairs) sets.join(a, b);
        for (const [a, b] of pairs) expect(sets.join(a, b)).toBe(false);
        for (let k = 0; k < n; k++) expect(sets.find(sets.find(k))).toBe(sets.find(k));
      }),
    );
  });

  it("makes the same sets in whatever order pairs are joined", () => {
    fc.assert(
      fc.property(joins, ([n, pairs]) => {
        const [one, other] = [new UnionFind(n), new UnionFind(n)];
        for (const [a, b] of pairs) one.join(a, b);
        for (const [a, b] of pairs.toReversed()) other.join(b, a);
        const groups = (sets: UnionFind) =>
          Array.from({ length: n }, (_, k) =>
            Array.from({ length: n }, (__, m) => sets.find(k) === sets.find(m)),
          );
        expect(groups(one)).toEqual(groups(other));
      }),
    );
  });
});
