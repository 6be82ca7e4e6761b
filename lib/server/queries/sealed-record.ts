import type { JWK } from "jose";
import { database } from "../../database/client";
import { buildRecord } from "../../record/review-record";
import { type SealedRecord, sealRecord } from "../../record/seal";
import { fail, ok, type Result } from "../../values/result";
import type { NotFound } from "../commands/design-of";
import type { ActingMember } from "../sign-in";
import { recordInputs } from "./record-inputs";

/** Draws up the record of a revision as it stands and seals it with the workspace's key. */
export async function sealedRecord(
  member: ActingMember,
  number: string,
  letter: string,
  cautions: readonly string[],
): Promise<Result<SealedRecord, NotFound | { readonly kind: "notSolved" }>> {
  const inputs = await recordInputs(member, number, letter);
  if (!inputs.ok) return inputs;
  const key = await database().workspaceKey.findUnique({
    where: { workspaceId: member.workspace },
    select: { privateKey: true },
  });
  const privateKey = readKey(key?.privateKey);
  // A workspace is made with its key; without one there is nothing to seal with.
  if (privateKey === null) return fail({ kind: "notFound" });
  return ok(await sealRecord(buildRecord({ ...inputs.value, cautions }), privateKey));
}

function readKey(value: unknown): JWK | null {
  if (typeof value !== "object" || value === null || !("x" in value) || !("d" in value))
    return null;
  const { x, d } = value;
  return typeof x === "string" && typeof d === "string"
    ? { kty: "OKP", crv: "Ed25519", x, d }
    : null;
}
