import {
  base64url,
  calculateJwkThumbprint,
  FlattenedSign,
  flattenedVerify,
  importJWK,
  type JWK,
} from "jose";
import { digest } from "../circuit/digest";
import { canonicalBytes } from "./canonical";
import type { CheckableSeal } from "./read-record";
import type { ReviewRecord } from "./review-record";

/**
 * A record under seal: the record, its SHA-256 digest, and an Ed25519 signature (RFC 8032) in the
 * flattened JSON form of RFC 7515, whose payload is the record's RFC 8785 form and is left out here
 * because the record itself stands beside it.
 */
export interface SealedRecord {
  readonly record: ReviewRecord;
  readonly digest: string;
  readonly seal: {
    readonly protected: string;
    readonly signature: string;
    /** The workspace's public key. */
    readonly key: JWK;
    /** RFC 7638 thumbprint of the key: compare it with the one on the printed record. */
    readonly fingerprint: string;
  };
}

/** Seals a record with the workspace's private key (a JWK of type OKP, curve Ed25519). */
export async function sealRecord(record: ReviewRecord, privateKey: JWK): Promise<SealedRecord> {
  const payload = canonicalBytes(record);
  const key = await importJWK(privateKey, "EdDSA");
  const signed = await new FlattenedSign(payload).setProtectedHeader({ alg: "EdDSA" }).sign(key);
  const publicKey: JWK = {
    kty: "OKP",
    crv: "Ed25519",
    ...(privateKey.x !== undefined && { x: privateKey.x }),
  };
  return {
    record,
    digest: digest(record),
    seal: {
      protected: signed.protected ?? "",
      signature: signed.signature,
      key: publicKey,
      fingerprint: await calculateJwkThumbprint(publicKey),
    },
  };
}

/** Of Ed25519, RFC 8032, section 5.1.5 and 5.1.6. */
const KEY_BYTES = 32;
const SIGNATURE_BYTES = 64;

/** What holds of a seal: each told by itself, so that a reader learns which part was changed. */
export interface SealState {
  readonly digestHolds: boolean;
  readonly signatureHolds: boolean;
  /** RFC 7638 thumbprint of the key as computed here; null where the key is none, or another is written beside it. */
  readonly fingerprint: string | null;
}

/** Checks digest, signature and fingerprint of a sealed record. */
export async function checkSeal(sealed: CheckableSeal): Promise<SealState> {
  return {
    digestHolds: digest(sealed.record) === sealed.digest,
    signatureHolds: await signatureHolds(sealed),
    fingerprint: await fingerprintOf(sealed),
  };
}

async function signatureHolds({ record, seal }: CheckableSeal): Promise<boolean> {
  if (!holds(seal.signature, SIGNATURE_BYTES) || !holds(seal.key.x, KEY_BYTES)) return false;
  const payload = base64url.encode(canonicalBytes(record));
  try {
    const key = await importJWK(seal.key, "EdDSA");
    await flattenedVerify({ payload, protected: seal.protected, signature: seal.signature }, key, {
      algorithms: ["EdDSA"],
    });
    return true;
  } catch {
    // jose throws for a bad key, a bad header and a bad signature alike; here all mean the same.
    return false;
  }
}

async function fingerprintOf({ seal }: CheckableSeal): Promise<string | null> {
  if (!holds(seal.key.x, KEY_BYTES)) return null;
  const fingerprint = await calculateJwkThumbprint(seal.key);
  return fingerprint === seal.fingerprint ? fingerprint : null;
}

/**
 * Whether a text is the base64url of so many bytes. The last letter may hold bits that no byte has
 * (RFC 4648, 3.5): one way of writing counts.
 */
function holds(text: string, count: number): boolean {
  try {
    const bytes = base64url.decode(text);
    return bytes.length === count && base64url.encode(bytes) === text;
  } catch {
    return false;
  }
}
