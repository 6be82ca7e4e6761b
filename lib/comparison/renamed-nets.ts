import type { CircuitFile } from "../circuit/circuit-file";
import type { Matching } from "./matching";

/**
 * Nets that only changed their name, as `block\nname` of the base to the new name: a net that the
 * proposed revision no longer has, whose pins (of matched parts) all went to one net that the base
 * did not have.
 */
export function renamedNets(
  base: CircuitFile,
  proposed: CircuitFile,
  matching: Matching,
): ReadonlyMap<string, string> {
  const renamed = new Map<string, string>();
  for (const block of Object.keys(base.blocks)) {
    const before = netsOf(base, block);
    const after = netsOf(proposed, block);
    for (const [net, targets] of destinations(matching, block)) {
      const [target] = targets;
      if (after.has(net) || targets.size !== 1) continue;
      if (typeof target === "string" && !before.has(target))
        renamed.set(`${block}\n${net}`, target);
    }
  }
  return renamed;
}

/** For each net of a block, the nets that its pins are on now; null: a pin that is on none. */
function destinations(
  matching: Matching,
  block: string,
): ReadonlyMap<string, ReadonlySet<string | null>> {
  const found = new Map<string, Set<string | null>>();
  for (const { was, is } of matching.pairs.filter((pair) => pair.block === block)) {
    for (const [pin, net] of Object.entries(was.pins ?? {})) {
      if (net === null) continue;
      const targets = found.get(net) ?? new Set();
      targets.add(is.pins?.[pin] ?? null);
      found.set(net, targets);
    }
  }
  return found;
}

function netsOf(file: CircuitFile, block: string): ReadonlySet<string> {
  const nets = (file.blocks[block]?.parts ?? []).flatMap((part) => Object.values(part.pins ?? {}));
  return new Set(nets.filter((net) => net !== null));
}
