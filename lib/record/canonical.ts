import { sha256 } from "@noble/hashes/sha2.js";
import { bytesToHex, utf8ToBytes } from "@noble/hashes/utils.js";
import canonicalize from "canonicalize";

/** The RFC 8785 form of a JSON value, as UTF-8. Throws on what is not JSON (a defect of the caller). */
export function canonicalBytes(value: unknown): Uint8Array {
  const text = canonicalize(value);
  if (text === undefined) throw new Error("Only JSON values have a canonical form");
  return utf8ToBytes(text);
}

/** `sha256:` and the hexadecimal SHA-256 (FIPS 180-4) of the canonical form. */
export function canonicalDigest(value: unknown): string {
  return `sha256:${bytesToHex(sha256(canonicalBytes(value)))}`;
}
