const WINDOW_MS = 15 * 60_000;
/** Bounds the memory: beyond it the oldest counts are forgotten. */
const MOST_COUNTS = 10_000;

interface Count {
  failures: number;
  since: number;
}

/**
 * Counts wrong passwords, so that nobody tries a list of them. Kept in the process: a restart forgives.
 * @param most failures of one key within a quarter of an hour
 * @param now clock in ms, given by tests
 */
export class Attempts {
  private readonly counts = new Map<string, Count>();

  constructor(
    private readonly most: number,
    private readonly now: () => number = Date.now,
  ) {}

  /** Whether the key (an account, an address) has failed too often of late. */
  mayTry(key: string): boolean {
    const count = this.counts.get(key);
    return count === undefined || this.isOver(count) || count.failures < this.most;
  }

  failed(key: string): void {
    const count = this.counts.get(key);
    if (count !== undefined && !this.isOver(count)) {
      count.failures += 1;
      return;
    }
    this.counts.delete(key);
    this.counts.set(key, { failures: 1, since: this.now() });
    const oldest = this.counts.keys().next();
    if (this.counts.size > MOST_COUNTS && !oldest.done) this.counts.delete(oldest.value);
  }

  succeeded(key: string): void {
    this.counts.delete(key);
  }

  private isOver(count: Count): boolean {
    return this.now() - count.since >= WINDOW_MS;
  }
}
