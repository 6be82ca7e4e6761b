import { prefixOfExponent } from "./si-prefix";

/** Units that take no SI prefix: their values are printed as they are. */
const WITHOUT_PREFIX = new Set(["", "%", "ppm", "ppm/K", "°C", "°", "/K", "K", "K/W", "eV", "V/V"]);
const LEAST_EXPONENT = -15;
const GREATEST_EXPONENT = 12;

/**
 * A value for people in engineering notation: `formatQuantity(4700, "Ω")` is `4.7 kΩ`. Trailing zeros are
 * dropped; what is not finite is a dash. Read back, it differs by the dropped digits at most.
 */
export function formatQuantity(value: number, unit: string, significantDigits = 4): string {
  if (!Number.isFinite(value)) return "—";
  const [mantissa, exponent] = engineering(value, unit, significantDigits);
  return joined(mantissa, `${prefixOfExponent.get(exponent) ?? ""}${unit}`);
}

/** A value in its unit with a fixed count of decimals, for columns: `formatFixed(11.9812, "V", 3)` is `11.981 V`. */
export function formatFixed(value: number, unit: string, decimals: number): string {
  if (!Number.isFinite(value)) return "—";
  const text = value.toFixed(decimals);
  return joined(/[1-9]/.test(text) ? text : text.replace("-", ""), unit);
}

/** Digits without trailing zeros, and the power of a thousand they are to be read with. */
function engineering(value: number, unit: string, digits: number): readonly [string, number] {
  const [rounded = "0", power = "0"] = value.toExponential(digits - 1).split("e");
  if (value === 0) return ["0", 0];
  const group = WITHOUT_PREFIX.has(unit) ? 0 : Math.floor(Number(power) / 3) * 3;
  const exponent = Math.min(GREATEST_EXPONENT, Math.max(LEAST_EXPONENT, group));
  const shifted = Number(`${rounded}e${Number(power) - exponent}`);
  return [shifted.toString(), exponent];
}

function joined(number: string, unit: string): string {
  if (unit === "" || unit === "°") return number + unit;
  return `${number} ${unit}`;
}
