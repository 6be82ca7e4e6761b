import type { Stage } from "./law";

/** Steps through the bend of tanh go at most this far beyond it at first; then twice as far each time. */
const BEND = 1;

/**
 * tanh(s), followed by Newton's steps no further than it can be trusted: past the bend the argument
 * grows by doubling, and a change of sign stops at zero, where the amplifier is linear. Without that
 * a saturated amplifier has no slope to come back by.
 */
export class Saturation {
  value = 0;
  slope = 1;
  private last = 0;

  follow(s: number, at: Stage): void {
    const limited = this.followed(s, at.begin);
    if (Math.abs(limited - s) > 1e-9 * (1 + Math.abs(s))) at.limited++;
    this.last = limited;
    const value = Math.tanh(limited);
    this.slope = 1 - value * value;
    this.value = value + this.slope * (s - limited);
  }

  private followed(s: number, begin: Stage["begin"]): number {
    if (begin === "warm") return s;
    return begin === "cold" ? 0 : this.limit(s);
  }

  private limit(s: number): number {
    if (Math.abs(s) <= BEND) return s;
    const { last } = this;
    if (Math.abs(last) > BEND && s * last < 0) return 0;
    const farthest = Math.max(BEND, 2 * Math.abs(last));
    // Beyond 20 tanh is 1 to the last digit: where exactly does not matter any more.
    if (Math.abs(s) > 20 && farthest >= 20) return s;
    return Math.sign(s) * Math.min(Math.abs(s), farthest);
  }
}
