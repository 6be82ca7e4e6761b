import type { Blocks } from "./block";
import type { KnownNets } from "./circuit-addresses";
import type { FlatPart } from "./flatten";

/** The nets that fitted parts touch, the reference among them, and those of parts that are not fitted. */
export function knownNets(
  blocks: Blocks,
  flat: readonly FlatPart[] | null,
  reference: string,
): KnownNets {
  const fitted = new Set([reference]);
  const unfitted = new Set<string>();
  for (const part of flat ?? []) {
    for (const net of part.pins.values()) {
      if (net !== null) (part.fitted ? fitted : unfitted).add(net);
    }
  }
  const whole = [...blocks.values()].every((block) =>
    [...block.entries.values()].every((entry) => entry.entry !== "broken"),
  );
  return { fitted, unfitted, clear: flat !== null && whole };
}
