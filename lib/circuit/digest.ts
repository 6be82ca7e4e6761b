import { sha256 } from "@noble/hashes/sha2.js";
import { bytesToHex, utf8ToBytes } from "@noble/hashes/utils.js";
import canonicalize from "canonicalize";
import { isRecord } from "./place";
import { below } from "./pointer";
import type { ReadValues } from "./reading";

/** `sha256:` and the hexadecimal SHA-256 of the RFC 8785 form of a JSON value. */
export function digest(value: unknown): string {
  return `sha256:${bytesToHex(sha256(utf8ToBytes(canonicalize(value) ?? "null")))}`;
}

/**
 * The digest of what solving, limits and derating read of a circuit file: without title, notes, ids and
 * drawing, and with values as they read, so that `4k7` equals 4700.
 */
export function electricalDigest(file: unknown, read: ReadValues): string {
  return digest(electrical(file, "", read));
}

/** Keys without electrical meaning, by the pattern of the pointer of the object they stand in. */
const WITHOUT_MEANING: readonly (readonly [holder: RegExp, keys: ReadonlySet<string>])[] = [
  [/^$/, new Set(["title"])],
  [/^\/blocks\/[^/]*$/, new Set(["wires", "sheet"])],
  [/^\/blocks\/[^/]*\/parts\/\d+$/, new Set(["note", "id", "at", "turn", "mirror"])],
];

function electrical(value: unknown, pointer: string, read: ReadValues): unknown {
  const number = read.values.get(pointer);
  if (number !== undefined) return number;
  if (Array.isArray(value)) {
    return value.map((item: unknown, index) => electrical(item, below(pointer, index), read));
  }
  if (!isRecord(value)) return value;
  const left = WITHOUT_MEANING.find(([pattern]) => pattern.test(pointer))?.[1];
  const members = Object.keys(value)
    .filter((key) => left?.has(key) !== true)
    .map((key) => [key, electrical(value[key], below(pointer, key), read)] as const);
  return Object.fromEntries([...members, ...(read.additions.get(pointer) ?? [])]);
}
