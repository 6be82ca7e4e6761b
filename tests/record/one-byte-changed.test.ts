import fc from "fast-check";
import { beforeAll, expect, it } from "vitest";
import { parseJson } from "../../lib/circuit/json-text";
import { readSealedRecord } from "../../lib/record/read-record";
import { verifyRecord } from "../../lib/record/verify";
import { divider, recordOf, sealedText } from "./records";

let text = "";
let bytes = new Uint8Array();
beforeAll(async () => {
  text = await sealedText(recordOf(divider("1k"), divider("2k")));
  bytes = new TextEncoder().encode(text);
});

/** The names of the checks that do not hold; a sentence where the text is no record any longer. */
async function faultsOf(changed: string): Promise<readonly string[] | string> {
  const read = readSealedRecord(changed);
  if (!read.ok) return read.error;
  const { holds, checks } = await verifyRecord(read.value);
  const broken = checks.filter((one) => !one.holds).map(({ check }) => check);
  expect(holds).toBe(broken.length === 0);
  return broken;
}

it("any one byte changed is found, unless the JSON still says the same", async () => {
  await fc.assert(
    fc.asyncProperty(fc.nat(), fc.integer({ min: 1, max: 255 }), async (place, flipped) => {
      const at = place % bytes.length;
      const other = Uint8Array.from(bytes, (byte, index) => (index === at ? byte ^ flipped : byte));
      const changed = new TextDecoder().decode(other);
      const parsed = parseJson(changed);
      const found = await faultsOf(changed);
      // A numeral may be written in more ways than one; nothing else may.
      const same = parsed.ok && JSON.stringify(parsed.value.value) === text;
      expect(found.length > 0).toBe(!same);
      if (typeof found === "string")
        expect(found).toMatch(/^This is not a sealed review record: .+\.$/);
    }),
    { numRuns: 600 },
  );
});

it("any letter for another in digest, signature, header, key and fingerprint is found", async () => {
  const from = text.lastIndexOf('"digest"');
  const letters = [...text.slice(from).matchAll(/[A-Za-z0-9_-]/g)];
  expect(letters.length).toBeGreaterThan(300);
  for (const { 0: letter, index } of letters) {
    // The next in the alphabet of base64url: in a last letter it differs in bits that no byte has.
    const next = letter === "9" ? "8" : letter === "A" ? "B" : letter === "_" ? "-" : "A";
    const place = from + index;
    for (const other of [next, String.fromCharCode(letter.charCodeAt(0) ^ 1)]) {
      const changed = text.slice(0, place) + other + text.slice(place + 1);
      expect((await faultsOf(changed)).length, `${letter} to ${other} at ${index}`).toBeGreaterThan(
        0,
      );
    }
  }
});

it.each([
  ["the digest", /("digest":"sha256:)[^"]+("[^{]*,"seal")/, ["digest"]],
  ["the signature", /("signature":")[^"]+(","key")/, ["signature"]],
  ["the fingerprint", /("fingerprint":")[^"]+(")/, ["signature"]],
])("%s alone changed is named as what changed", async (_what, where, names) => {
  const changed = text.replace(where, "$1AAAA$2");
  expect(changed).not.toBe(text);
  expect(await faultsOf(changed)).toEqual(names);
});

it.each([
  ["beside the record", '{"record":', '{"approvedBy":"nobody","record":'],
  ["in the seal", '"seal":{', '"seal":{"note":"","protected":"",'],
  ["in the key", '"kty":', '"kid":"1","kty":'],
  ["that stands twice", '"releasedAt":', '"releasedAt":null,"releasedAt":'],
  ["named __proto__", '"releasedAt":', '"__proto__":{"a":1},"releasedAt":'],
  ["named __proto__ beside the record", '{"record":', '{"__proto__":{"a":1},"record":'],
])("a key added %s is found", async (_where, was, is) => {
  const changed = text.replace(was, is);
  expect(changed).not.toBe(text);
  expect((await faultsOf(changed)).length).toBeGreaterThan(0);
});

it.each([
  ["no JSON", "{", "line 1"],
  ["nothing", "", "empty"],
  ["another JSON", "[]", "expected object"],
  ["a circuit file", '{"ampersign":1,"blocks":{}}', "/record"],
  ["a number beyond all doubles", '{"record":{"a":1e999}}', "/record/a"],
  ["half a surrogate pair", '{"record":{"a":"\\ud800"}}', "/record/a"],
  ["nested without end", "[".repeat(100_000), "nested"],
])("what is no record is refused with the place: %s", (_what, wrong, place) => {
  const read = readSealedRecord(wrong);
  expect(read).toMatchObject({ ok: false });
  expect(!read.ok && read.error).toContain(place);
});
