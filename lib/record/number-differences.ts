/**
 * Two engines of different age need not agree to the last bit. Numbers count as the same within
 * 1e-6 of the larger, or 1e-9 absolutely (volts, amperes, watts): far below what any verdict turns on.
 */
const RELATIVE = 1e-6;
const ABSOLUTE = 1e-9;

type Path = readonly (string | number)[];

/** The places where two results differ, as dotted paths with both values. Empty: they agree. */
export function numberDifferences(was: unknown, is: unknown, path: Path = []): readonly string[] {
  if (isNoResult(path)) return [];
  if (typeof was === "number" && typeof is === "number")
    return isClose(was, is) ? [] : [`${words(path)}: ${was} in the record, ${is} now`];
  if (Array.isArray(was) && Array.isArray(is)) {
    if (was.length !== is.length)
      return [`${words(path)}: ${was.length} rows in the record, ${is.length} now`];
    return was.flatMap((entry, index) => numberDifferences(entry, is[index], [...path, index]));
  }
  if (isObject(was) && isObject(is)) {
    const keys = new Set([...Object.keys(was), ...Object.keys(is)]);
    return [...keys].flatMap((key) => numberDifferences(was[key], is[key], [...path, key]));
  }
  return was === is
    ? []
    : [`${words(path)}: ${JSON.stringify(was)} in the record, ${JSON.stringify(is)} now`];
}

/** Nothing is close to infinity, and NaN to nothing. */
function isClose(was: number, is: number): boolean {
  const allowed = Math.max(ABSOLUTE, RELATIVE * Math.max(Math.abs(was), Math.abs(is)));
  return was === is || (Math.abs(was - is) <= allowed && Number.isFinite(allowed));
}

/**
 * Proofs, points in time and the engine's version differ between engines by their nature: no verdict
 * is read from them. By place and not by name, since a net may be called `engine` too.
 */
function isNoResult([first, index, key, ...deeper]: Path): boolean {
  if (index === undefined) return first === "engine";
  return (
    first === "conditions" &&
    typeof index === "number" &&
    (key === "certificate" || key === "transient") &&
    deeper.length === 0
  );
}

function words(path: Path): string {
  return path
    .map((step, place) =>
      typeof step === "number" ? `[${step}]` : place === 0 ? step : `.${step}`,
    )
    .join("");
}

function isObject(value: unknown): value is Readonly<Record<string, unknown>> {
  return typeof value === "object" && value !== null && !Array.isArray(value);
}
