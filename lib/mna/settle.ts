import type { System } from "./system";

/** Whether a part with a memory is in another state than `x` asks for. */
export function isRestless(system: System, x: Float64Array): boolean {
  return system.network.parts.some(({ law }) => law.restless?.(x, system.stage) === true);
}

/** Lets such parts change their state; whether one did. */
export function settled(system: System, x: Float64Array): boolean {
  let changed = false;
  for (const { law } of system.network.parts) {
    if (law.restless?.(x, system.stage) !== true) continue;
    law.flip?.();
    changed = true;
  }
  return changed;
}
