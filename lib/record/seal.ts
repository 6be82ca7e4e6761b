import { calculateJwkThumbprint, FlattenedSign, flattenedVerify, importJWK, type JWK } from "jose";
import { digest } from "../circuit/digest";
import { fail, ok, type Result } from "../values/result";
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

/** Checks digest and signature of a sealed record. The failure says which does not hold. */
export async function checkSeal(
  sealed: CheckableSeal,
): Promise<Result<{ readonly fingerprint: string }, "digest" | "signature">> {
  if (digest(sealed.record) !== sealed.digest) return fail("digest");
  const payload = base64url(canonicalBytes(sealed.record));
  try {
    const key = await importJWK(sealed.seal.key, "EdDSA");
    await flattenedVerify(
      { payload, protected: sealed.seal.protected, signature: sealed.seal.signature },
      key,
      { algorithms: ["EdDSA"] },
    );
    return ok({ fingerprint: await calculateJwkThumbprint(sealed.seal.key) });
  } catch {
    // jose throws for a bad key, a bad header and a bad signature alike; here all mean the same.
    return fail("signature");
  }
}

function base64url(bytes: Uint8Array): string {
  let text = "";
  for (const byte of bytes) text += String.fromCharCode(byte);
  return btoa(text).replaceAll("+", "-").replaceAll("/", "_").replaceAll("=", "");
}
