import type { Blocks } from "./block";
import type { KnownNets } from "./circuit-addresses";
import type { Flat } from "./flatten";

/** The nets that fitted parts touch, the reference among them, and those of parts that are not fitted. */
export function knownNets(blocks: Blocks, flat: Flat | null, reference: string): KnownNets {
  const fitted = new Set([reference, ...(flat?.looseNets ?? [])]);
  const unfitted = new Set<string>();
  for (const part of flat?.parts ?? []) {
    for (const net of part.pins.values()) {
      if (net !== null) (part.fitted ? fitted : unfitted).add(net);
    }
  }
  const clear = [...blocks.values()].every(
    (block) =>
      block.clear &&
      [...block.entries.values()].every(
        (entry) => entry.entry !== "use" || blocks.has(entry.block),
      ),
  );
  return { fitted, unfitted, clear: flat !== null && clear };
}
