import { z } from "zod";
import { fail, ok, type Result } from "../values/result";

/**
 * What verifying reads of a sealed record. Results, comparison and circuits stay unread JSON here:
 * they are digested and solved again, never trusted for their shape. Unknown keys are kept, since the
 * digest is over all of them.
 */
const revision = z.looseObject({ letter: z.string(), digest: z.string(), circuit: z.unknown() });

const auditEntry = z.looseObject({
  seq: z.int(),
  at: z.string(),
  actor: z.string(),
  action: z.string(),
  subject: z.string(),
  payload: z.unknown(),
  previousHash: z.string(),
  hash: z.string(),
});

const decision = z.union([
  z.looseObject({
    id: z.string(),
    kind: z.literal("signature"),
    revision: z.string(),
    meaning: z.string(),
    boundDigest: z.string(),
    name: z.string(),
  }),
  z.looseObject({ id: z.string(), kind: z.string() }),
]);

const record = z.looseObject({
  ampersignRecord: z.literal(1),
  design: z.looseObject({ number: z.string() }),
  revision,
  base: revision.nullable(),
  result: z.unknown(),
  comparison: z.unknown(),
  bound: z.record(z.string(), z.string().nullable()),
  findings: z.array(z.looseObject({ id: z.string() })),
  decisions: z.array(decision),
  audit: z.array(auditEntry),
  releasedAt: z.string().nullable(),
});

const sealed = z.looseObject({
  record,
  digest: z.string(),
  seal: z.looseObject({
    protected: z.string(),
    signature: z.string(),
    key: z.looseObject({ kty: z.literal("OKP"), crv: z.literal("Ed25519"), x: z.string() }),
  }),
});

export type CheckableRecord = z.infer<typeof record>;
export type CheckableSeal = z.infer<typeof sealed>;

/** Reads a sealed record from its JSON text; the failure is one sentence with the place. */
export function readSealedRecord(text: string): Result<CheckableSeal, string> {
  let value: unknown;
  try {
    value = JSON.parse(text);
  } catch (error) {
    return fail(
      `This is not JSON: ${error instanceof Error ? error.message : "it cannot be read"}.`,
    );
  }
  const read = sealed.safeParse(value);
  if (read.success) return ok(read.data);
  const first = read.error.issues[0];
  const at = first === undefined ? "" : first.path.map(String).join("/");
  return fail(
    `This is not a sealed review record: at /${at}, ${first?.message ?? "it has another shape"}.`,
  );
}
