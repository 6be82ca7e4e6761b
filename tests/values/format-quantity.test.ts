import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { formatFixed, formatQuantity } from "../../lib/values/format-quantity";
import { readValue } from "../../lib/values/read-value";

describe("formatQuantity", () => {
  it.each([
    [4700, "Ω", "4.7 kΩ"],
    [0.1, "F", "100 mF"],
    [1e-7, "F", "100 nF"],
    [-12, "V", "-12 V"],
    [0, "V", "0 V"],
    [-0, "V", "0 V"],
    [999.96, "V", "1 kV"],
    [0.9999, "A", "999.9 mA"],
    [1e15, "Ω", "1000 TΩ"],
    [25, "°C", "25 °C"],
    [12345, "K/W", "12350 K/W"],
    [90, "°", "90°"],
    [Number.NaN, "V", "—"],
    [Number.POSITIVE_INFINITY, "V", "—"],
  ])("sets %d %s as %s", (value, unit, expected) => {
    expect(formatQuantity(value, unit)).toBe(expected);
  });

  it("keeps as many digits as asked", () => {
    expect(formatQuantity(5.94249, "V", 3)).toBe("5.94 V");
    expect(formatQuantity(5.94249, "V", 5)).toBe("5.9425 V");
  });

  it("reads back to the digits it kept", () => {
    const values = fc.double({ min: 1e-15, max: 1e14, noNaN: true });
    fc.assert(
      fc.property(
        values,
        fc.boolean(),
        fc.integer({ min: 2, max: 15 }),
        (size, negative, digits) => {
          const value = negative ? -size : size;
          const read = readValue(formatQuantity(value, "V", digits), "voltage");
          expect(read.ok && Math.abs(read.value.value / value - 1)).toBeLessThanOrEqual(
            0.5001 * 10 ** (1 - digits),
          );
        },
      ),
    );
  });
});

describe("formatFixed", () => {
  it.each([
    [11.98123, "V", 3, "11.981 V"],
    [-0.0001, "V", 3, "0.000 V"],
    [138, "°C", 0, "138 °C"],
    [Number.NaN, "V", 2, "—"],
  ])("sets %d %s to %d decimals", (value, unit, decimals, expected) => {
    expect(formatFixed(value, unit, decimals)).toBe(expected);
  });
});
