/** What one connection may send. Bytes, and counts over time. */
export const CAPS = {
  frameBytes: 4 << 20,
  /** What a page may send before it is known who it is. */
  early: { frames: 64, bytes: 256 << 10 },
  presenceBytes: 2 << 10,
  unsentBytes: 8 << 20,
  frames: { perSecond: 60, burst: 240 },
  presence: { perSecond: 25, burst: 50 },
  /** Step 1 asks for the whole document: 4 in 20 s. */
  stateRequests: { perSecond: 0.2, burst: 4 },
} as const;

/** Ends of a connection. The page never comes back by itself after 4400 to 4499. */
export const CLOSE = {
  signIn: 4401,
  refused: 4403,
  malformed: 4400,
  /** What an update builds on is missing, or the server goes: come back and send it all. */
  comeBack: 1012,
  notStored: 1013,
  tooSlow: 4508,
  tooMany: 4529,
} as const;

/** Allows a burst, then a rate. */
export class Allowance {
  private left: number;
  private at: number;

  /** `now`: milliseconds */
  constructor(
    private readonly rate: { readonly perSecond: number; readonly burst: number },
    now: number,
  ) {
    this.left = rate.burst;
    this.at = now;
  }

  /** Takes one; false: none is left. */
  take(now: number): boolean {
    const grown = this.left + ((now - this.at) / 1000) * this.rate.perSecond;
    this.left = Math.min(this.rate.burst, grown);
    this.at = now;
    if (!(this.left >= 1)) return false;
    this.left -= 1;
    return true;
  }
}
