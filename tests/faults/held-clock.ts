import type { SocketClock } from "../../lib/server/document-sockets";

/** A clock that stands until a test lets time pass. */
export class HeldClock implements SocketClock {
  private time = 0;
  private readonly timers = new Set<{ readonly every: number; readonly run: () => void }>();

  now(): number {
    return this.time;
  }

  every(milliseconds: number, run: () => void): () => void {
    const timer = { every: milliseconds, run };
    this.timers.add(timer);
    return () => this.timers.delete(timer);
  }

  /** Lets time pass; what is due runs as often as it is. */
  pass(milliseconds: number): void {
    const before = this.time;
    this.time += milliseconds;
    for (const { every, run } of this.timers)
      for (let due = Math.floor(before / every) + 1; due * every <= this.time; due++) run();
  }
}
