/** How numbers are written on pages. A true minus sign (U+2212), and never more digits than the number bears. */

const MINUS = "\u2212";

const withMinus = (text: string): string => text.replace("-", MINUS);

/** A node voltage without its unit: `28.03`, `6.021`, `0.097`; `?` where it is not determined. */
export function voltageWords(volts: number | null): string {
  if (volts === null || !Number.isFinite(volts)) return "?";
  const size = Math.abs(volts);
  return withMinus(volts.toFixed(size >= 100 ? 1 : size >= 10 ? 2 : 3));
}

/** A shift with its sign: `+0.287`, `−0.046`, `0.000`. */
export function shiftWords(shift: number | null): string {
  if (shift === null || !Number.isFinite(shift)) return "?";
  const text = Math.abs(shift) >= 10 ? shift.toFixed(2) : shift.toFixed(3);
  return Number(text) > 0
    ? `+${text}`
    : Number(text) === 0
      ? text.replace("-", "")
      : withMinus(text);
}

/** A margin as a percentage with sign and without the per-cent sign: `−7.3`, `+13`, `> 500`. */
export function marginNumber(margin: number | null): string {
  if (margin === null || Number.isNaN(margin)) return "?";
  const percent = margin * 100;
  if (percent > 500) return "> 500";
  const digits = Math.abs(percent) < 10 ? 1 : 0;
  const text = percent.toFixed(digits);
  return Number(text) >= 0 ? `+${text.replace("-", "")}` : withMinus(text);
}

/** A margin with its per-cent sign: `−7.3 %`. */
export function marginWords(margin: number | null): string {
  return margin === null ? "not known" : `${marginNumber(margin)} %`;
}

/** A certificate's figure: `1.0e-13`. */
export function tinyWords(value: number): string {
  return value === 0 ? "0" : value.toExponential(1);
}

/** A day of the calendar in UTC: `2026-11-27`. */
export function dayWords(iso: string): string {
  return iso.slice(0, 10);
}

/** A moment in UTC to the minute: `2026-11-27 15:20 UTC`. */
export function momentWords(iso: string): string {
  return `${iso.slice(0, 10)} ${iso.slice(11, 16)} UTC`;
}
