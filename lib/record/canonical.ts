import canonicalize from "canonicalize";

/** The RFC 8785 form of a JSON value, as UTF-8: what a seal signs. Throws on what is not JSON (a defect of the caller). */
export function canonicalBytes(value: unknown): Uint8Array {
  const text = canonicalize(value);
  if (text === undefined) throw new Error("Only JSON values have a canonical form");
  return new TextEncoder().encode(text);
}
