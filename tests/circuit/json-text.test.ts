import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { parseJson } from "../../lib/circuit/json-text";

const failure = (text: string) => {
  const parsed = parseJson(text);
  return parsed.ok ? null : [parsed.error.code, parsed.error.at];
};

describe("parseJson", () => {
  it("agrees with JSON.parse on every JSON text", () => {
    fc.assert(
      fc.property(fc.json({ maxDepth: 5 }), fc.constantFrom(0, 1, 4), (text, indent) => {
        const expected: unknown = JSON.parse(text);
        const parsed = parseJson(JSON.stringify(expected, null, indent));
        expect(parsed.ok && parsed.value).toEqual({ value: expected, duplicates: [] });
      }),
    );
  });

  it("accepts and refuses the same texts as JSON.parse", () => {
    const near = fc.stringMatching(/^[[\]{}",:0-9.eE+\-\\utrfalsn \n]{0,12}$/);
    fc.assert(
      fc.property(fc.oneof(near, fc.string({ unit: "binary" })), (text) => {
        fc.pre(!text.startsWith("\uFEFF"));
        expect(parseJson(text).ok).toBe(isJson(text));
      }),
      { numRuns: 2000 },
    );
  });

  it.each([
    ["", "line 1, column 1"],
    ["{", "line 1, column 2"],
    ['{\n  "a": 1,\n}', "line 3, column 1"],
    ['{"a" 1}', "line 1, column 6"],
    ["[1 2]", "line 1, column 4"],
    ['["a\u0001"]', "line 1, column 4"],
    ['["\\q"]', "line 1, column 4"],
    ['["abc', "line 1, column 6"],
    ["[01]", "line 1, column 3"],
    ["nul", "line 1, column 1"],
    ["{} {}", "line 1, column 4"],
    ['{\r\n"😀": x}', "line 2, column 6"],
    ["'a'", "line 1, column 1"],
  ])("says where %j stops being JSON", (text, at) => {
    expect(failure(text)).toEqual(["notJson", at]);
  });

  it("passes over a byte-order mark", () => {
    expect(parseJson('\uFEFF{"a":1}').ok).toBe(true);
    expect(failure("\uFEFFx")).toEqual(["notJson", "line 1, column 1"]);
  });

  it("names each key that stands twice, and keeps the first", () => {
    const parsed = parseJson('{"a":1,"b":[{"x/y":1,"x/y":2}],"a":3}');
    expect(parsed.ok && parsed.value.value).toEqual({ a: 1, b: [{ "x/y": 1 }] });
    const places = parsed.ok ? parsed.value.duplicates.map((problem) => problem.at) : [];
    expect(places).toEqual(["/b/0/x~1y", "/a"]);
  });

  it("keeps __proto__ and constructor as ordinary keys", () => {
    const parsed = parseJson('{"__proto__":{"polluted":true},"constructor":1}');
    const value = parsed.ok ? parsed.value.value : null;
    expect(Object.keys(value ?? {})).toEqual(["__proto__", "constructor"]);
    expect(Object.getPrototypeOf(value)).toBe(Object.prototype);
    expect("polluted" in {}).toBe(false);
  });

  it("reads a nesting of 200 and refuses one of 201", () => {
    const nested = (depth: number): string => "[".repeat(depth) + "]".repeat(depth);
    expect(failure(nested(200))).toBeNull();
    expect(failure(nested(201))).toEqual(["tooLarge", "/0".repeat(200)]);
    expect(failure("[".repeat(1_000_000))).toEqual(["tooLarge", "/0".repeat(200)]);
  });
});

function isJson(text: string): boolean {
  try {
    JSON.parse(text);
    return true;
  } catch {
    return false;
  }
}
