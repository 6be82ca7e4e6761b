import { UnionFind } from "../numerics/union-find";
import type { Network } from "./network";

/** A loop in which every part fixes a voltage. */
export interface VoltageLoop {
  /** The part that closes it. */
  readonly closing: string;
  /** A short with both ends on one net: no current need flow, and nothing is wrong. */
  readonly harmless: boolean;
  readonly parts: readonly string[];
  readonly nets: readonly string[];
}

interface Branch {
  readonly part: string;
  readonly from: number;
  readonly to: number;
}

/** One loop for each part that fixes a voltage between unknowns whose difference is fixed already. */
export function loopsOf(network: Network): readonly VoltageLoop[] {
  const sets = new UnionFind(network.unknowns.count + 1);
  const tree = new Map<number, Branch[]>();
  const loops: VoltageLoop[] = [];
  for (const { part, law } of network.parts) {
    for (const { tie, from, to } of law.paths) {
      if (tie !== "fixesVoltage") continue;
      const branch = { part: part.path, from, to };
      if (sets.join(from, to)) {
        for (const end of [from, to]) tree.set(end, [...(tree.get(end) ?? []), branch]);
        continue;
      }
      const way = wayBetween(tree, from, to);
      const unknowns = new Set([branch, ...way].flatMap((one) => [one.from, one.to]));
      loops.push({
        closing: part.path,
        harmless: from === to && part.kind !== "voltageSource",
        parts: [...new Set([...way.map((one) => one.part), part.path])],
        nets: [...unknowns].flatMap((unknown) => {
          const name = network.unknowns.names[unknown];
          return name !== undefined && "net" in name ? [name.net] : [];
        }),
      });
    }
  }
  return loops;
}

/** The branches of the forest between two of its nodes, breadth first. */
function wayBetween(
  tree: ReadonlyMap<number, readonly Branch[]>,
  from: number,
  to: number,
): readonly Branch[] {
  const came = new Map<number, Branch | null>([[from, null]]);
  const queue = [from];
  for (const at of queue) {
    if (at === to) break;
    for (const branch of tree.get(at) ?? []) {
      const next = branch.from === at ? branch.to : branch.from;
      if (came.has(next)) continue;
      came.set(next, branch);
      queue.push(next);
    }
  }
  const way: Branch[] = [];
  for (let at = to; ; ) {
    const branch = came.get(at);
    if (branch === null || branch === undefined) return way;
    way.push(branch);
    at = branch.from === at ? branch.to : branch.from;
  }
}
