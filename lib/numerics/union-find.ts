/** Disjoint sets of the numbers 0 to n - 1, joined one pair at a time. */
export class UnionFind {
  private readonly parent: Int32Array;

  constructor(n: number) {
    this.parent = Int32Array.from({ length: n }, (_, index) => index);
  }

  /** The number that stands for the set of k. */
  find(k: number): number {
    let root = k;
    while (this.parent[root] !== root) root = this.parent[root] ?? root;
    for (let at = k; at !== root; ) {
      const up = this.parent[at] ?? root;
      this.parent[at] = root;
      at = up;
    }
    return root;
  }

  /** Joins two sets; false where they were one already. */
  join(a: number, b: number): boolean {
    const one = this.find(a);
    const other = this.find(b);
    if (one === other) return false;
    this.parent[Math.max(one, other)] = Math.min(one, other);
    return true;
  }
}
