import { z } from "zod";
import { parseJson } from "../circuit/json-text";
import { problemsOfJson } from "../circuit/plain-json";
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

/** Around the record nothing is sealed but what the seal itself is made of: anything more is refused. */
const sealed = z.strictObject({
  record,
  digest: z.string(),
  seal: z.strictObject({
    protected: z.string(),
    signature: z.string(),
    key: z.strictObject({ kty: z.literal("OKP"), crv: z.literal("Ed25519"), x: z.string() }),
    fingerprint: z.string(),
  }),
});

export type CheckableRecord = z.infer<typeof record>;
export type CheckableSeal = z.infer<typeof sealed>;

/**
 * Reads a sealed record from its JSON text; the failure is one sentence with the place. Refused too
 * is what programs read differently: a key that stands twice, a number beyond all doubles, half a
 * surrogate pair.
 */
export function readSealedRecord(text: string): Result<CheckableSeal, string> {
  const parsed = parseJson(text);
  if (!parsed.ok) return fail(`This is not a sealed review record: ${parsed.error.message}`);
  const { value, duplicates } = parsed.value;
  const [wrong] = [...duplicates, ...problemsOfJson(value)];
  if (wrong !== undefined)
    return fail(`This is not a sealed review record: at ${wrong.at}, ${wrong.message}`);
  // What was parsed is given on, not zod's copy of it: the digest is over every key that is written.
  if (isSealed(value)) return ok(value);
  const first = sealed.safeParse(value).error?.issues[0];
  const at = first === undefined ? "" : first.path.map(String).join("/");
  return fail(
    `This is not a sealed review record: at /${at}, ${first?.message ?? "it has another shape"}.`,
  );
}

function isSealed(value: unknown): value is CheckableSeal {
  return sealed.safeParse(value).success;
}
