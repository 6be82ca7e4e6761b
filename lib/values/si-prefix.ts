/**
 * SI prefixes as powers of ten (SI Brochure, table 7), from femto to tera. `K` is accepted for kilo
 * because IEC 60062 writes it so; `u` stands for micro where no micro sign can be typed.
 */
export const prefixExponents: ReadonlyMap<string, number> = new Map([
  ["f", -15],
  ["p", -12],
  ["n", -9],
  ["u", -6],
  ["m", -3],
  ["k", 3],
  ["K", 3],
  ["M", 6],
  ["G", 9],
  ["T", 12],
]);

/** The prefix to print for each power of a thousand. */
export const prefixOfExponent: ReadonlyMap<number, string> = new Map([
  [-15, "f"],
  [-12, "p"],
  [-9, "n"],
  [-6, "µ"],
  [-3, "m"],
  [0, ""],
  [3, "k"],
  [6, "M"],
  [9, "G"],
  [12, "T"],
]);
