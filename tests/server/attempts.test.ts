import { describe, expect, it } from "vitest";
import { Attempts } from "../../lib/server/attempts";

const QUARTER_MS = 15 * 60_000;

describe("counting wrong passwords", () => {
  it("stops at the limit, for that account alone", () => {
    const attempts = new Attempts(3, () => 0);
    for (let tried = 0; tried < 3; tried += 1) {
      expect(attempts.mayTry("ada")).toBe(true);
      attempts.failed("ada");
    }
    expect(attempts.mayTry("ada")).toBe(false);
    expect(attempts.mayTry("ben")).toBe(true);
  });

  it("forgives after a quarter of an hour, and at the right password", () => {
    let now = 0;
    const attempts = new Attempts(1, () => now);
    attempts.failed("ada");
    attempts.failed("ben");
    attempts.succeeded("ben");
    expect(attempts.mayTry("ben")).toBe(true);
    now = QUARTER_MS - 1;
    expect(attempts.mayTry("ada")).toBe(false);
    now = QUARTER_MS;
    expect(attempts.mayTry("ada")).toBe(true);
  });

  it("keeps a bounded number of counts", () => {
    const attempts = new Attempts(1, () => 0);
    for (let stranger = 0; stranger <= 10_000; stranger += 1)
      attempts.failed(`stranger ${stranger}`);
    expect(attempts.mayTry("stranger 0")).toBe(true);
    expect(attempts.mayTry("stranger 10000")).toBe(false);
  });
});
