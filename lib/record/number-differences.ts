/**
 * Two engines of different age need not agree to the last bit. Numbers count as the same within
 * 1e-6 of the larger, or 1e-9 absolutely (volts, amperes, watts): far below what any verdict turns on.
 */
const RELATIVE = 1e-6;
const ABSOLUTE = 1e-9;

/** Proofs and versions differ between runs by their nature: they are not results. */
const NOT_RESULTS = new Set(["certificate", "engine", "transient", "digest"]);

/** The places where two results differ, as dotted paths with both values. Empty: they agree. */
export function numberDifferences(was: unknown, is: unknown, path = ""): readonly string[] {
  if (typeof was === "number" && typeof is === "number") {
    const close =
      Math.abs(was - is) <= Math.max(ABSOLUTE, RELATIVE * Math.max(Math.abs(was), Math.abs(is)));
    return close ? [] : [`${path}: ${was} in the record, ${is} now`];
  }
  if (Array.isArray(was) && Array.isArray(is)) {
    if (was.length !== is.length)
      return [`${path}: ${was.length} rows in the record, ${is.length} now`];
    return was.flatMap((entry, index) => numberDifferences(entry, is[index], `${path}[${index}]`));
  }
  if (isObject(was) && isObject(is)) {
    const keys = new Set([...Object.keys(was), ...Object.keys(is)]);
    return [...keys]
      .filter((key) => !NOT_RESULTS.has(key))
      .flatMap((key) => numberDifferences(was[key], is[key], path === "" ? key : `${path}.${key}`));
  }
  return was === is
    ? []
    : [`${path}: ${JSON.stringify(was)} in the record, ${JSON.stringify(is)} now`];
}

function isObject(value: unknown): value is Readonly<Record<string, unknown>> {
  return typeof value === "object" && value !== null && !Array.isArray(value);
}
