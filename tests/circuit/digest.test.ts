import { describe, expect, it } from "vitest";
import { digest } from "../../lib/circuit/digest";

describe("digest", () => {
  it("is the SHA-256 of the canonical form", () => {
    // SHA-256 of the two bytes "{}": NIST FIPS 180-4 algorithm, value computed with another program.
    expect(digest({})).toBe(
      "sha256:44136fa355b3678a1146ad16f7e8649e94fb4fc21fe77e8310c060f61caaff8a",
    );
  });

  it("does not depend on the order of keys", () => {
    expect(digest({ b: 1, a: [1, 2] })).toBe(digest({ a: [1, 2], b: 1 }));
    expect(digest({ a: [1, 2] })).not.toBe(digest({ a: [2, 1] }));
  });
});
