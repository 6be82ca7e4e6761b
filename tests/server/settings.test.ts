import { describe, expect, it } from "vitest";
import { settings } from "../../lib/server/settings";

const SECRET = "x".repeat(32);

describe("what the server is told from outside", () => {
  it("needs a secret of some length, and nothing else", () => {
    expect(() => settings({})).toThrow("AMPERSIGN_SECRET");
    expect(() => settings({ AMPERSIGN_SECRET: SECRET.slice(1) })).toThrow("32 characters");
    expect(settings({ AMPERSIGN_SECRET: SECRET })).toEqual({
      secret: SECRET,
      publicUrl: undefined,
      port: 3000,
      host: "127.0.0.1",
      development: false,
    });
  });

  it.each(["70000", "-1", "3.5", "http"])("refuses %s as a port", (port) => {
    expect(() => settings({ AMPERSIGN_SECRET: SECRET, PORT: port })).toThrow("PORT must be");
  });

  it("takes the origin of a public address, and no other scheme", () => {
    const given = { AMPERSIGN_SECRET: SECRET };
    expect(settings({ ...given, AMPERSIGN_URL: "https://review.example/x" }).publicUrl).toBe(
      "https://review.example",
    );
    expect(() => settings({ ...given, AMPERSIGN_URL: "ftp://review.example" })).toThrow(
      "AMPERSIGN_URL must be",
    );
  });
});
