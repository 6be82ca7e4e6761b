import { describe, expect, it } from "vitest";
import { problemsOfJson } from "../../lib/circuit/plain-json";

const found = (value: unknown): readonly string[] =>
  problemsOfJson(value).map(({ code, at }) => `${code} ${at}`);

describe("problemsOfJson", () => {
  it("finds everything that JSON cannot say, each at its place", () => {
    const value = { a: [Number.NaN, undefined], "\uDC00": 1, b: "\uD83D", c: 1n, d: "😀" };
    expect(found(value)).toEqual([
      "badValue /a/0",
      "wrongType /a/1",
      "badValue /\uDC00",
      "badValue /b",
      "wrongType /c",
    ]);
  });

  it("ends at an object that holds itself", () => {
    const value: Record<string, unknown> = {};
    value["x"] = value;
    value["y"] = value;
    expect(found(value)).toEqual([`tooLarge ${"/x".repeat(200)}`]);
  });
});
