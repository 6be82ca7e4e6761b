/** The values a quantity may take, in SI units. Absent bounds do not bind. */
export interface Range {
  readonly least?: number;
  readonly above?: number;
  readonly most?: number;
  readonly below?: number;
}

export const anyValue: Range = {};
export const notNegative: Range = { least: 0 };
export const positive: Range = { above: 0 };
export const unitInterval: Range = { least: 0, most: 1 };
/** A half-width as a fraction: a tolerance of 100 % or more would let a value reach zero. */
export const halfWidth: Range = { least: 0, below: 1 };
/** degrees Celsius, above absolute zero. */
export const celsius: Range = { above: -273.15 };

/** Whether the value lies in the range; NaN never does. */
export function within(range: Range, value: number): boolean {
  return (
    value >= (range.least ?? Number.NEGATIVE_INFINITY) &&
    value > (range.above ?? Number.NEGATIVE_INFINITY) &&
    value <= (range.most ?? Number.POSITIVE_INFINITY) &&
    value < (range.below ?? Number.POSITIVE_INFINITY)
  );
}

/** The range in words, such as "at least 0 and below 1". */
export function rangeInWords(range: Range): string {
  const bounds = [
    range.least === undefined ? [] : [`at least ${range.least}`],
    range.above === undefined ? [] : [`above ${range.above}`],
    range.most === undefined ? [] : [`at most ${range.most}`],
    range.below === undefined ? [] : [`below ${range.below}`],
  ].flat();
  return bounds.join(" and ");
}
