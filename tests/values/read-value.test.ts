import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { type Quantity, quantities } from "../../lib/values/quantity";
import { readValue } from "../../lib/values/read-value";

const value = (text: string, quantity: Quantity): number | string => {
  const read = readValue(text, quantity);
  return read.ok ? read.value.value : read.error.code;
};

const tolerance = (text: string, quantity: Quantity): number | null | string => {
  const read = readValue(text, quantity);
  return read.ok ? read.value.tolerance : read.error.code;
};

describe("IEC 60062 letter codes", () => {
  // Values printed on a public page that quotes the standard; the standard itself was not read.
  it.each([
    ["R47", 0.47],
    ["4R7", 4.7],
    ["470R", 470],
    ["4K7", 4700],
    ["47K", 47e3],
    ["47K3", 47.3e3],
    ["470K", 470e3],
    ["4M7", 4.7e6],
  ])("reads %s as seen printed", (text, expected) => {
    expect(value(text, "resistance")).toBe(expected);
  });

  // From memory, not checked against the standard.
  it.each([
    ["4L7", "resistance", 4.7e-3],
    ["4G7", "resistance", 4.7e9],
    ["1T0", "resistance", 1e12],
    ["4p7", "capacitance", 4.7e-12],
    ["p47", "capacitance", 0.47e-12],
    ["100n", "capacitance", 100e-9],
    ["4u7", "capacitance", 4.7e-6],
    ["4µ7", "capacitance", 4.7e-6],
    ["4μ7", "capacitance", 4.7e-6],
    ["2m2", "capacitance", 2.2e-3],
    ["1F0", "capacitance", 1],
    ["4k7", "resistance", 4700],
    ["2R2", "resistance", 2.2],
    ["1M5", "resistance", 1.5e6],
    ["0R", "resistance", 0],
    ["4u7", "inductance", 4.7e-6],
  ] as const)("reads %s of a %s", (text, quantity, expected) => {
    expect(value(text, quantity)).toBe(expected);
  });

  // Tolerance letters: from memory, not checked against the standard.
  it.each([
    ["E", 0.00005],
    ["L", 0.0001],
    ["P", 0.0002],
    ["W", 0.0005],
    ["B", 0.001],
    ["C", 0.0025],
    ["D", 0.005],
    ["F", 0.01],
    ["G", 0.02],
    ["H", 0.03],
    ["J", 0.05],
    ["K", 0.1],
    ["M", 0.2],
    ["N", 0.3],
  ])("reads the tolerance letter %s after a complete code", (letter, expected) => {
    expect(value(`4K7${letter}`, "resistance")).toBe(4700);
    expect(tolerance(`4K7${letter}`, "resistance")).toBe(expected);
  });

  it("gives small capacitances their tolerance in picofarads", () => {
    expect(tolerance("4p7C", "capacitance")).toBeCloseTo(0.25 / 4.7, 12);
    expect(tolerance("47pC", "capacitance")).toBe(0.0025);
  });

  it.each(["4K7Q", "4K7S", "4K7Z", "4K7T", "4K7X", "4K7JJ", "K", "4K7k", "4k7k7"])(
    "refuses %s",
    (text) => {
      expect(value(text, "resistance")).toBe("badValue");
    },
  );

  it("takes a letter that could be a unit for the unit", () => {
    expect(value("100nF", "capacitance")).toBe(100e-9);
    expect(tolerance("100nF", "capacitance")).toBeNull();
    expect(value("10MF", "capacitance")).toBe(10e6);
    expect(value("10kF", "resistance")).toBe("wrongUnit");
    expect(value("4u7F", "capacitance")).toBe("badValue");
  });

  it("takes K and M without digits after them for prefixes", () => {
    expect(tolerance("47K", "resistance")).toBeNull();
    expect(value("10M", "resistance")).toBe(10e6);
    expect(tolerance("47KJ", "resistance")).toBe(0.05);
  });
});

describe("numbers with prefix and unit", () => {
  it.each([
    ["4.7 k", "resistance", 4700],
    ["4.7kΩ", "resistance", 4700],
    ["4.7 k\u2126", "resistance", 4700],
    ["4.7 kohm", "resistance", 4700],
    ["2.2 mΩ", "resistance", 2.2e-3],
    ["10M", "resistance", 10e6],
    ["100 nF", "capacitance", 100e-9],
    ["-12 V", "voltage", -12],
    ["+5 V", "voltage", 5],
    [".5", "voltage", 0.5],
    ["1E3", "voltage", 1000],
    ["1e-3", "voltage", 1e-3],
    ["1e-3 kV", "voltage", 1],
    ["3 fA", "current", 3e-15],
    ["1 TΩ", "resistance", 1e12],
    ["10 µH", "inductance", 10e-6],
    ["10 uH", "inductance", 10e-6],
    ["5 %", "fraction", 0.05],
    ["50 ppm", "fraction", 50e-6],
    ["10 ppm/K", "perKelvin", 10e-6],
    ["100 ppm", "perKelvin", 100e-6],
    ["0.0039 /K", "perKelvin", 0.0039],
    ["150 °C", "temperature", 150],
    ["298.15 K", "temperature", 25],
    ["3977 K", "kelvin", 3977],
    ["90 °", "angle", 90],
    ["1.11 eV", "energy", 1.11],
    ["100 V/V", "ratio", 100],
    ["20 mA/V^2", "transconductanceFactor", 0.02],
    ["20 mS", "transconductance", 0.02],
    ["50 K/W", "thermalResistance", 50],
    ["0.5 V/µs", "slewRate", 0.5e6],
    ["1 MHz", "frequency", 1e6],
    ["2 ms", "time", 2e-3],
    [" 5\u00A0V ", "voltage", 5],
  ] as const)("reads %s", (text, quantity, expected) => {
    expect(value(text, quantity)).toBe(expected);
  });

  it("turns radians into degrees", () => {
    expect(value("3.141592653589793 rad", "angle")).toBe(180);
  });

  it("knows milli from mega", () => {
    expect(value("1 mΩ", "resistance")).toBe(1e-3);
    expect(value("1 MΩ", "resistance")).toBe(1e6);
  });

  it.each([
    ["5 kV", "resistance"],
    ["5R", "voltage"],
    ["100nF", "resistance"],
    ["5 %", "voltage"],
    ["10 ppm/K", "resistance"],
    ["5 °C", "voltage"],
  ] as const)("says that the unit of %s does not fit a %s", (text, quantity) => {
    expect(value(text, quantity)).toBe("wrongUnit");
  });

  it.each([
    "",
    " ",
    "five",
    "1,5",
    "1.5.2",
    "--5",
    "0x10",
    "NaN",
    "Infinity",
    "-Infinity",
    "1e999",
    "1e-999",
    "\u22125",
    "\uFF15",
    "5 bananas",
    "5 mm",
    "5 kk",
    "5 Kω",
    "1 2",
    "١",
    "5 V\n",
  ])("refuses %j", (text) => {
    expect(value(text, "voltage")).toBe("badValue");
  });

  it("refuses the Kelvin sign", () => {
    expect(value("47\u212A", "resistance")).toBe("badValue");
    expect(value("300 \u212A", "temperature")).toBe("badValue");
  });
});

describe("whatever the text", () => {
  const anyQuantity = fc.constantFrom(...Object.keys(quantities).filter(isQuantity));

  it("never throws, and quotes what it refuses", () => {
    const near = fc.stringMatching(/^[-+0-9.eE kKMmunpµRFΩ%V/°]{0,12}$/);
    fc.assert(
      fc.property(fc.oneof(fc.string({ unit: "binary" }), near), anyQuantity, (text, quantity) => {
        const read = readValue(text, quantity);
        if (read.ok) expect(Number.isFinite(read.value.value)).toBe(true);
        else expect(read.error.message).toMatch(/; .+\.$/);
      }),
    );
  });

  it("reads back what JavaScript prints of any number", () => {
    fc.assert(
      fc.property(fc.double({ noNaN: true, noDefaultInfinity: true }), (number) => {
        expect(value(String(number), "voltage")).toBe(number === 0 ? 0 : number);
      }),
    );
  });

  it("does not depend on how the value is written", () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 1, max: 999 }),
        fc.integer({ min: 0, max: 9 }),
        (whole, tenth) => {
          const expected = Number(`${whole}.${tenth}e3`);
          for (const text of [`${whole}k${tenth}`, `${whole}.${tenth} kΩ`, `${whole}.${tenth}e3`]) {
            expect(value(text, "resistance")).toBe(expected);
          }
        },
      ),
    );
  });
});

function isQuantity(name: string): name is Quantity {
  return name in quantities;
}
