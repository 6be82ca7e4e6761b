import type { Condition } from "../kinds/circuit";
import type { Network } from "./network";
import type { PartResult } from "./solution";

/** K: temperatures that move less are settled. */
const SETTLED = 1e-6;

/**
 * The temperatures that the parts' powers ask for, ambient + power × junctionToAmbient, by path;
 * null where the network has them already.
 */
export function heatedTemperatures(
  network: Network,
  parts: Readonly<Record<string, PartResult>>,
  condition: Condition,
): ReadonlyMap<string, number> | null {
  const heated = new Map<string, number>();
  let moved = 0;
  for (const { part, temperature } of network.parts) {
    if (part.junctionToAmbient === null || part.temperature !== null) continue;
    const power = parts[part.path]?.power ?? 0;
    const asked = condition.ambient + power * part.junctionToAmbient;
    heated.set(part.path, asked);
    moved = Math.max(moved, Math.abs(asked - temperature));
  }
  return moved <= SETTLED ? null : heated;
}
