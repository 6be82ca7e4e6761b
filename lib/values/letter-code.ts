import type { Quantity } from "./quantity";
import { allUnits } from "./quantity";
import { prefixExponents } from "./si-prefix";

/** A letter code taken apart: `4K7J` is decimal "4.7", exponent 3, tolerance letter "J". */
export interface LetterCode {
  readonly decimal: string;
  readonly exponent: number;
  readonly toleranceLetter: string | null;
}

/**
 * IEC 60062 tolerance letters, symmetrical, as fractions (from memory). The asymmetrical ones
 * (Q, T, S, Z) are left out: a tolerance here is a half-width.
 */
const TOLERANCES: ReadonlyMap<string, number> = new Map([
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
]);

/** Below 10 pF, IEC 60062 gives these letters in farads, not as fractions (from memory). */
const SMALL_CAPACITANCE_TOLERANCES: ReadonlyMap<string, number> = new Map([
  ["B", 0.1e-12],
  ["C", 0.25e-12],
  ["D", 0.5e-12],
  ["F", 1e-12],
  ["G", 2e-12],
]);
const SMALL_CAPACITANCE = 10e-12;

/** The letters that IEC 60062 itself gives a value for; only after these is a tolerance letter read. */
const OWN_LETTERS: Partial<Record<Quantity, ReadonlyMap<string, number>>> = {
  resistance: new Map([
    ["L", -3],
    ["R", 0],
    ["k", 3],
    ["K", 3],
    ["M", 6],
    ["G", 9],
    ["T", 12],
  ]),
  capacitance: new Map([
    ["p", -12],
    ["n", -9],
    ["u", -6],
    ["m", -3],
    ["F", 0],
  ]),
};

const INFIX = /^(\d*)([A-Za-z])(\d+)([A-Z]?)$/;
const TRAILING = /^(\d+)([A-Za-z])([A-Z]?)$/;

/**
 * Reads an IEC 60062 letter code, in which a letter stands at the decimal sign, or null where the text is
 * none. A letter that could be a unit is never taken for a tolerance: `100nF` is not a code.
 */
export function readLetterCode(text: string, quantity: Quantity): LetterCode | null {
  const infix = INFIX.exec(text);
  const [, whole, letter, rest, last] = infix ?? TRAILING.exec(text) ?? [];
  if (whole === undefined || letter === undefined || rest === undefined) return null;
  const own = OWN_LETTERS[quantity]?.get(letter);
  const exponent = own ?? prefixExponents.get(letter);
  if (exponent === undefined) return null;

  const tolerance = infix === null ? rest : (last ?? "");
  const fraction = infix === null ? "" : rest;
  if (tolerance !== "") {
    const couldBeUnit =
      infix === null
        ? prefixExponents.has(letter) && allUnits.has(tolerance)
        : quantity === "capacitance" && tolerance === "F";
    if (own === undefined || couldBeUnit || !TOLERANCES.has(tolerance)) return null;
  }
  return {
    decimal: `${whole}.${fraction}`,
    exponent,
    toleranceLetter: tolerance === "" ? null : tolerance,
  };
}

/** The half-width that a tolerance letter gives, as a fraction of the value. */
export function letterTolerance(letter: string, quantity: Quantity, value: number): number | null {
  const small =
    quantity === "capacitance" && value < SMALL_CAPACITANCE
      ? SMALL_CAPACITANCE_TOLERANCES.get(letter)
      : undefined;
  return small === undefined ? (TOLERANCES.get(letter) ?? null) : small / value;
}
