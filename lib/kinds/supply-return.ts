import type { Site } from "./law";

/** Where an amplifier's output current comes from and goes to, and the ends of its output. */
export interface Supplies {
  /** Unknown of the supply; 0, the reference, where the pin is on no net. */
  readonly plus: number;
  readonly minus: number;
  /** Both pins are on nets: the output is bounded by them. */
  readonly bounded: boolean;
}

/** A supply pin on no net means: unlimited, and the current returns through the reference. */
export function suppliesOf(site: Site): Supplies {
  const plus = site.connected("supplyPlus");
  const minus = site.connected("supplyMinus");
  return {
    plus: plus ? site.pin("supplyPlus") : 0,
    minus: minus ? site.pin("supplyMinus") : 0,
    bounded: plus && minus,
  };
}
