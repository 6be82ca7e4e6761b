import { describe, expect, it } from "vitest";
import type { Junction } from "../../lib/kinds/part";
import { readCircuitFile } from "../../lib/kinds/read-circuit";
import { withParts } from "./divider";

/** k T / q at 25 °C with the exact constants of the SI (2019), V. */
const thermal = (1.380649e-23 * 298.15) / 1.602176634e-19;

const fitted = (fit: unknown): Junction => {
  const pins = { anode: "A", cathode: "GND" };
  const read = readCircuitFile(withParts({ ref: "D1", kind: "diode", pins, fit }));
  const part = read.ok ? read.value.parts[0] : undefined;
  if (part?.kind !== "diode") throw new Error(JSON.stringify(read));
  return part.params;
};

describe("a diode given by datasheet points", () => {
  it("passes through two datasheet points", () => {
    const points = [
      { current: "1 mA", voltage: "0.6 V" },
      { current: "10 mA", voltage: "0.72 V" },
    ];
    const { saturationCurrent, emissionCoefficient } = fitted(points);
    // Shockley's law at 25 °C, solved for the voltage.
    const voltage = (current: number): number =>
      emissionCoefficient * thermal * Math.log1p(current / saturationCurrent);
    expect(voltage(1e-3)).toBeCloseTo(0.6, 12);
    expect(voltage(1e-2)).toBeCloseTo(0.72, 12);
  });

  it("passes through three datasheet points with a series resistance", () => {
    const fit = [1e-3, 10e-3, 100e-3].map((current) => ({
      current,
      voltage: 1.7 * thermal * Math.log1p(current / 2e-9) + 3 * current,
    }));
    const junction = fitted(fit);
    expect(junction.emissionCoefficient).toBeCloseTo(1.7, 9);
    expect(junction.seriesResistance).toBeCloseTo(3, 9);
    expect(junction.saturationCurrent / 2e-9).toBeCloseTo(1, 9);
  });

  it("has no negative series resistance", () => {
    const fit = [
      { current: 1e-3, voltage: 0.6 },
      { current: 10e-3, voltage: 0.72 },
      { current: 100e-3, voltage: 0.73 },
    ];
    expect(fitted(fit).seriesResistance).toBe(0);
  });
});
