/**
 * A minimum degree ordering of a symmetric pattern (without its diagonal) by the quotient graph:
 * an eliminated node becomes an element that stands for the clique it makes, and absorbs the
 * elements it was next to. Degrees are bounded as in Amestoy, Davis and Duff (1996): each element
 * counts in full, less what it shares with the pivot's.
 * @param start n + 1 places into `neighbour`
 * @returns the nodes in the order of elimination
 */
export function minimumDegree(n: number, start: Int32Array, neighbour: Int32Array): Int32Array {
  const nodes: Set<number>[] = [];
  const elementsOf: Set<number>[] = [];
  const membersOf = new Map<number, Set<number>>();
  for (let i = 0; i < n; i++) {
    nodes.push(new Set(neighbour.subarray(start[i] ?? 0, start[i + 1] ?? 0)));
    elementsOf.push(new Set());
  }
  const buckets = new DegreeBuckets(n);
  for (let i = 0; i < n; i++) buckets.put(i, nodes[i]?.size ?? 0);
  const order = new Int32Array(n);
  for (let k = 0; k < n; k++) {
    const pivot = buckets.takeLeast();
    order[k] = pivot;
    const members = cliqueOf(pivot);
    for (const element of elementsOf[pivot] ?? []) {
      for (const node of membersOf.get(element) ?? []) elementsOf[node]?.delete(element);
      membersOf.delete(element);
    }
    membersOf.set(pivot, members);
    for (const node of members) update(node, pivot, members);
  }
  return order;

  function cliqueOf(pivot: number): Set<number> {
    const members = new Set(nodes[pivot]);
    for (const element of elementsOf[pivot] ?? [])
      for (const node of membersOf.get(element) ?? []) members.add(node);
    members.delete(pivot);
    return members;
  }

  function update(node: number, pivot: number, members: ReadonlySet<number>): void {
    const own = nodes[node] ?? new Set();
    own.delete(pivot);
    // What the new element holds need not be held one by one any longer.
    for (const other of own) if (members.has(other)) own.delete(other);
    const elements = elementsOf[node] ?? new Set();
    elements.add(pivot);
    let degree = own.size + members.size - 1;
    for (const element of elements)
      if (element !== pivot) degree += (membersOf.get(element)?.size ?? 1) - 1;
    buckets.put(node, Math.min(degree, n - 1));
  }
}

/** Nodes by degree, the least taken first. */
class DegreeBuckets {
  private readonly bucket: Set<number>[] = [];
  private readonly degree: Int32Array;
  private least = 0;

  constructor(n: number) {
    for (let d = 0; d <= n; d++) this.bucket.push(new Set());
    this.degree = new Int32Array(n).fill(-1);
  }

  put(node: number, degree: number): void {
    const before = this.degree[node] ?? -1;
    if (before >= 0) this.bucket[before]?.delete(node);
    this.degree[node] = degree;
    this.bucket[degree]?.add(node);
    this.least = Math.min(this.least, degree);
  }

  takeLeast(): number {
    while (this.bucket[this.least]?.size === 0) this.least++;
    for (const node of this.bucket[this.least] ?? []) {
      this.bucket[this.least]?.delete(node);
      return node;
    }
    return -1;
  }
}
