import { letterTolerance, readLetterCode } from "./letter-code";
import { allUnits, type Quantity, quantities, type UnitRow } from "./quantity";
import { fail, ok, type Result } from "./result";
import { prefixExponents } from "./si-prefix";

/** A value as read: in the unit of its quantity, with the tolerance that a letter code may carry. */
export interface ReadValue {
  readonly value: number;
  /** Half-width as a fraction; null where the text names none. */
  readonly tolerance: number | null;
}

/** Why a text is no value. */
export interface ValueFault {
  readonly code: "badValue" | "wrongUnit";
  readonly message: string;
}

const NUMBER = /^([+-]?(?:\d+(?:\.\d*)?|\.\d+))(?:[eE]([+-]?\d+))?/;
/** Space, no-break space, thin space, narrow no-break space: what is set between a number and its unit. */
const SPACES = /^[ \u00A0\u2009\u202F]+|[ \u00A0\u2009\u202F]+$/g;
const QUOTED_LENGTH = 40;

/**
 * Reads a value from text: first as a letter code of IEC 60062, then as a number with an SI prefix
 * and a unit. The number comes back in the unit of the quantity (SI; °C for temperatures, degrees
 * for angles), correctly rounded: `4k7` and `4700` are the same double.
 */
export function readValue(text: string, quantity: Quantity): Result<ReadValue, ValueFault> {
  const trimmed = text.replace(SPACES, "");
  if (trimmed === "")
    return fail(bad(`An empty text is not ${quantities[quantity].name}`, quantity));
  const tidy = trimmed.replace(/[µμ]/g, "u").replace(/\u2126/g, "Ω");

  const code = readLetterCode(tidy, quantity);
  if (code !== null) {
    const value = scaled(code.decimal, code.exponent);
    const tolerance =
      code.toleranceLetter === null ? null : letterTolerance(code.toleranceLetter, quantity, value);
    return ok({ value, tolerance });
  }

  const number = NUMBER.exec(tidy);
  if (number === null) return fail(notUnderstood(text, quantity));
  const [matched, mantissa = "", power = "0"] = number;
  const suffix = tidy.slice(matched.length).replace(SPACES, "");
  const scale = readSuffix(suffix, quantity);
  if (scale === null) {
    if (!isKnownUnit(suffix, quantity)) return fail(notUnderstood(text, quantity));
    const message = `${quoted(text)} does not fit ${quantities[quantity].name}; ${advice(quantity)}.`;
    return fail({ code: "wrongUnit", message });
  }
  const value = scaled(mantissa, Number(power) + scale.exponent);
  const converted = scale.convert === undefined ? value : scale.convert(value);
  if (!Number.isFinite(converted)) {
    return fail(bad(`${quoted(text)} is too large to be a number`, quantity));
  }
  if (value === 0 && /[1-9]/.test(mantissa)) {
    return fail(bad(`${quoted(text)} is too small to be told from zero`, quantity));
  }
  return ok({ value: converted, tolerance: null });
}

/** A text in quotation marks, cut where it is long, for messages. */
export function quoted(text: string): string {
  const characters = [...text];
  const cut =
    characters.length > QUOTED_LENGTH ? `${characters.slice(0, QUOTED_LENGTH).join("")}…` : text;
  return `"${cut}"`;
}

/** Parsed in one go from decimal text, so that no rounding of a multiplication creeps in. */
function scaled(decimal: string, exponent: number): number {
  return Number(`${decimal}e${exponent}`);
}

interface Scale {
  readonly exponent: number;
  readonly convert?: (value: number) => number;
}

function readSuffix(suffix: string, quantity: Quantity): Scale | null {
  const { units, barePrefix } = quantities[quantity];
  if (suffix === "") return { exponent: 0 };
  for (const [unit, row] of Object.entries(units)) {
    const exponent = exponentBefore(unit, row, suffix);
    if (exponent !== null) return { ...row, exponent };
  }
  const prefix = prefixExponents.get(suffix);
  return barePrefix && prefix !== undefined ? { exponent: prefix } : null;
}

/** The power of ten of `suffix` read as this unit with an optional prefix; null where it is not that. */
function exponentBefore(unit: string, row: UnitRow, suffix: string): number | null {
  if (!suffix.endsWith(unit)) return null;
  const prefix = suffix.slice(0, -unit.length);
  if (prefix === "") return row.exponent;
  const exponent = row.prefixed ? prefixExponents.get(prefix) : undefined;
  return exponent === undefined ? null : row.exponent + exponent;
}

function isKnownUnit(suffix: string, quantity: Quantity): boolean {
  if (suffix === "R") return quantity !== "resistance";
  return [...allUnits].some(([unit, row]) => exponentBefore(unit, row, suffix) !== null);
}

function notUnderstood(text: string, quantity: Quantity): ValueFault {
  if (/[\u2212\uFF10-\uFF19\uFF0E\u212A]/.test(text)) {
    return bad(
      `${quoted(text)} has a character that only looks like a digit, a sign or a unit`,
      quantity,
    );
  }
  if (/^[^,]*\d,\d/.test(text))
    return bad(`${quoted(text)} has a comma; the decimal sign is "."`, quantity);
  return bad(`${quoted(text)} is not ${quantities[quantity].name}`, quantity);
}

function bad(what: string, quantity: Quantity): ValueFault {
  return { code: "badValue", message: `${what}; ${advice(quantity)}.` };
}

function advice(quantity: Quantity): string {
  if (quantity === "resistance") return "write it as 4k7, 4.7 kΩ or 4700";
  if (quantity === "capacitance") return "write it as 4u7, 4.7 µF or 4.7e-6";
  const [unit = ""] = Object.keys(quantities[quantity].units);
  return `write a number, with ${unit} as its unit if you like`;
}
