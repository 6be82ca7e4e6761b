import { createPublicKey, generateKeyPairSync, verify } from "node:crypto";
import { FlattenedSign, importJWK } from "jose";
import { beforeAll, describe, expect, it } from "vitest";
import { canonicalBytes } from "../../lib/record/canonical";
import type { ReviewRecord } from "../../lib/record/review-record";
import { checkSeal, sealRecord } from "../../lib/record/seal";
import { divider, KEY, readBack, recordOf } from "./records";

let record: ReviewRecord;
beforeAll(() => {
  record = recordOf(divider("1k"), null);
});

const hex = (base64url: string): string => Buffer.from(base64url, "base64url").toString("hex");
const reread = (value: unknown) => readBack(JSON.stringify(value));

describe("a seal", () => {
  it("holds as it is made, and says the thumbprint of RFC 8037, appendix A.3", async () => {
    const sealed = await sealRecord(record, KEY);
    expect(await checkSeal(reread(sealed))).toEqual({
      digestHolds: true,
      signatureHolds: true,
      fingerprint: "kPrK_qmxVWaYVA9wwBF6Iuo3vVzz7TxHCTwXBygrS4k",
    });
  });

  it("is checked alike by another implementation of Ed25519", async () => {
    const { seal } = await sealRecord(record, KEY);
    const payload = Buffer.from(canonicalBytes(record)).toString("base64url");
    const key = createPublicKey({
      key: { kty: "OKP", crv: "Ed25519", x: String(seal.key.x) },
      format: "jwk",
    });
    const signed = Buffer.from(`${seal.protected}.${payload}`);
    expect(verify(null, signed, key, Buffer.from(seal.signature, "base64url"))).toBe(true);
    expect(JSON.parse(Buffer.from(seal.protected, "base64url").toString())).toEqual({
      alg: "EdDSA",
    });
  });

  it("never holds the private key", async () => {
    const sealed = JSON.stringify(await sealRecord(record, { ...KEY, kid: "1" }));
    expect(sealed).not.toContain(KEY.d);
  });

  it("of another key does not hold under this one, nor this one's under another", async () => {
    const other = generateKeyPairSync("ed25519").privateKey.export({ format: "jwk" });
    const ours = await sealRecord(record, KEY);
    const theirs = await sealRecord(record, { kty: "OKP", crv: "Ed25519", ...other });
    expect(await checkSeal(reread(theirs))).toMatchObject({ signatureHolds: true });
    const swapped = { ...ours, seal: { ...ours.seal, key: theirs.seal.key } };
    expect(await checkSeal(reread(swapped))).toEqual({
      digestHolds: true,
      signatureHolds: false,
      fingerprint: null,
    });
  });

  it.each([
    ["none", { alg: "none" }],
    ["an unknown critical header", { alg: "EdDSA", crit: ["exp"], exp: 1 }],
    ["a payload that is not encoded", { alg: "EdDSA", b64: false, crit: ["b64"] }],
  ])("under the header %s does not hold", async (_what, header) => {
    const sealed = await sealRecord(record, KEY);
    const encoded = Buffer.from(JSON.stringify(header)).toString("base64url");
    const forged = { ...sealed, seal: { ...sealed.seal, protected: encoded } };
    expect(await checkSeal(reread(forged))).toMatchObject({ signatureHolds: false });
  });

  it("with a key of no length or no base64url does not hold and has no fingerprint", async () => {
    const sealed = await sealRecord(record, KEY);
    for (const x of ["", "AAAA", "not base64url!", `${KEY.x}=`, "A".repeat(43)]) {
      const forged = { ...sealed, seal: { ...sealed.seal, key: { ...sealed.seal.key, x } } };
      expect(await checkSeal(reread(forged))).toMatchObject({
        signatureHolds: false,
        fingerprint: null,
      });
    }
  });
});

describe("Ed25519 as it is used here agrees with what is published", () => {
  it("RFC 8037, appendix A.4: signing in JSON Web Signature form", async () => {
    const signed = await new FlattenedSign(new TextEncoder().encode("Example of Ed25519 signing"))
      .setProtectedHeader({ alg: "EdDSA" })
      .sign(await importJWK(KEY, "EdDSA"));
    expect(`${signed.protected}.${signed.payload}.${signed.signature}`).toBe(
      "eyJhbGciOiJFZERTQSJ9.RXhhbXBsZSBvZiBFZDI1NTE5IHNpZ25pbmc.hgyY0il_MGCjP0JzlnLWG1PPOt7-09PGcvMg3AIbQR6dWbhijcNR4ki4iylGjg5BhVsPt9g7sVvpAr_MuM0KAg",
    );
  });

  it("RFC 8032, section 7.1, test 1: key pair and signature of the empty message", async () => {
    expect(hex(String(KEY.d))).toBe(
      "9d61b19deffd5a60ba844af492ec2cc44449c5697b326919703bac031cae7f60",
    );
    expect(hex(String(KEY.x))).toBe(
      "d75a980182b10ab7d54bfed3c964073a0ee172f3daa62325af021a68f707511a",
    );
    const key = await importJWK({ ...KEY, ext: true }, "EdDSA");
    if (key instanceof Uint8Array) throw new Error("A key pair is no secret");
    const signature = await crypto.subtle.sign("Ed25519", key, new Uint8Array());
    expect(Buffer.from(signature).toString("hex")).toBe(
      "e5564300c360ac729086e2cc806e828a84877f1eb8e5d974d873e065224901555fb8821590a33bacc61e39701cf9b46bd25bf5f0595bbe24655141438e7a100b",
    );
  });
});
