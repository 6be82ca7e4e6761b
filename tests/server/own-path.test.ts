import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { ownPath } from "../../lib/server/own-path";

const HOME = "http://127.0.0.1:3000";

describe("where to go after signing in", () => {
  it.each(["/designs/FFC-2", "/designs/FFC-2/review?base=B", "/"])("keeps %s", (path) => {
    expect(ownPath(path)).toBe(path);
  });

  it.each([
    "https://evil.example/",
    "//evil.example",
    "/\\evil.example",
    "/\t/evil.example",
    "/%2e//evil.example",
    "/.//evil.example",
    "javascript:alert(1)",
    "designs",
    "",
    "/sign-in?next=/sign-in",
    "/sign-out",
    "/api/theme",
  ])("goes home instead of to %j", (path) => {
    expect(ownPath(path)).toBe("/");
  });

  it("never leaves this site, whatever is asked for", async () => {
    const nasty = fc.string({
      unit: fc.constantFrom("/", "\\", ".", "%2e", "\t", "\n", "@", ":", "a", "?", "#"),
    });
    await fc.assert(
      fc.property(nasty, (path) => {
        expect(new URL(ownPath(`/${path}`), HOME).origin).toBe(HOME);
      }),
    );
  });
});
