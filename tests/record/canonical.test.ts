import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { canonicalBytes } from "../../lib/record/canonical";

const canonical = (value: unknown): string => new TextDecoder().decode(canonicalBytes(value));

describe("the canonical form agrees with RFC 8785", () => {
  it("section 3.2.2: numbers, strings and literals", () => {
    const given = String.raw`{
      "numbers": [333333333.33333329, 1E30, 4.50, 2e-3, 0.000000000000000000000000001],
      "string": "\u20ac$\u000F\u000aA'\u0042\u0022\u005c\\\"\/",
      "literals": [null, true, false]
    }`;
    expect(canonical(JSON.parse(given))).toBe(
      String.raw`{"literals":[null,true,false],"numbers":[333333333.3333333,1e+30,4.5,0.002,1e-27],"string":"€$\u000f\nA'B\"\\\\\"/"}`,
    );
  });

  it("section 3.2.3: keys by UTF-16 code units, so that a surrogate pair comes before U+FB33", () => {
    const given = String.raw`{"\u20ac":"Euro Sign","\r":"Carriage Return","\ufb33":"Hebrew Letter Dalet With Dagesh",
      "1":"One","\ud83d\ude00":"Emoji: Grinning Face","\u0080":"Control","\u00f6":"Latin Small Letter O With Diaeresis"}`;
    const said = [...canonical(JSON.parse(given)).matchAll(/:"([^"]+)"/g)].map(([, name]) => name);
    expect(said).toEqual([
      "Carriage Return",
      "One",
      "Control",
      "Latin Small Letter O With Diaeresis",
      "Euro Sign",
      "Emoji: Grinning Face",
      "Hebrew Letter Dalet With Dagesh",
    ]);
  });

  // Rows of appendix B, from memory: the bits of a double and how it is written.
  it.each([
    ["0000000000000000", "0"],
    ["8000000000000000", "0"],
    ["0000000000000001", "5e-324"],
    ["8000000000000001", "-5e-324"],
    ["7fefffffffffffff", "1.7976931348623157e+308"],
    ["4340000000000000", "9007199254740992"],
    ["4430000000000000", "295147905179352830000"],
    ["44b52d02c7e14af6", "1e+23"],
    ["444b1ae4d6e2ef50", "1e+21"],
    ["3eb0c6f7a0b5ed8d", "0.000001"],
    ["41b3de4355555555", "333333333.3333333"],
    ["becbf647612f3696", "-0.0000033333333333333333"],
    ["43143ff3c1cb0959", "1424953923781206.2"],
  ])("appendix B: %s is written %s", (bits, written) => {
    const double = Buffer.from(bits, "hex").readDoubleBE();
    expect(canonical(double)).toBe(written);
  });

  it("does not depend on the order of keys, and reads back as the same value", () => {
    fc.assert(
      fc.property(fc.dictionary(fc.string(), fc.jsonValue()), (value) => {
        const reversed = Object.fromEntries(Object.entries(value).reverse());
        expect(canonical(reversed)).toBe(canonical(value));
        expect(canonical(JSON.parse(canonical(value)))).toBe(canonical(value));
      }),
    );
  });

  it("has no form for what JSON has none for", () => {
    for (const value of [undefined, Number.NaN, Number.POSITIVE_INFINITY])
      expect(() => canonicalBytes(value)).toThrow();
    expect(() => canonicalBytes({ nets: { OUT: Number.NaN } })).toThrow();
  });
});
