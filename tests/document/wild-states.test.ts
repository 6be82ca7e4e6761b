import fc from "fast-check";
import { expect, it } from "vitest";
import * as Y from "yjs";
import { readDecisions, readFindings } from "../../lib/document/findings";
import { project } from "../../lib/document/projection";
import { TOP_LEVEL, topLevel } from "../../lib/document/shape";

const ids = fc.constantFrom("a", "b", "main", "constructor", "toString", "choice");
const words = fc.constantFrom(
  "",
  "main",
  "R1",
  "a/b",
  ".",
  "GND",
  "a",
  "b",
  "1",
  "constructor",
  "\u0000",
);
const keys = fc.constantFrom(
  ...[
    "block",
    "kind",
    "designator",
    "born",
    "at",
    "params",
    "ratings",
    "pins",
    "a",
    "b",
    "end",
    "net",
  ],
  ...[
    "shape",
    "ports",
    "size",
    "of",
    "control",
    "uses",
    "fit",
    "thermal",
    "set",
    "tolerances",
    "part",
  ],
  ...["pin", "junction", "text", "name", "type", "reference", "top", "title", "analysis", "schema"],
);
const plain: fc.Arbitrary<unknown> = fc.oneof(
  words,
  fc.constantFrom("resistor", "connector", "operatingPoint", "nothing"),
  fc.jsonValue({ maxDepth: 3 }),
  fc.double({ noNaN: true, noDefaultInfinity: true }),
  fc.tuple(fc.nat(9), fc.nat(9), fc.nat(4), fc.boolean()),
  fc.dictionary(keys, words, { maxKeys: 5, noNullPrototype: true }),
  fc.record({ part: ids, pin: words }, { noNullPrototype: true }),
);
const nested: fc.Arbitrary<() => unknown> = fc.oneof(
  plain.map((value) => () => value),
  fc
    .array(fc.tuple(keys, plain), { maxLength: 8 })
    .map((entries) => () => new Y.Map<unknown>(entries)),
  fc.array(plain, { maxLength: 4 }).map((values) => () => {
    const list = new Y.Array<unknown>();
    list.push([...values]);
    return list;
  }),
  fc
    .array(fc.tuple(keys, plain), { maxLength: 8 })
    .map((entries) => () => new Y.Map<unknown>([...entries, ["params", new Y.Map(entries)]])),
);
const write = fc.tuple(fc.constantFrom(...TOP_LEVEL), ids, nested, fc.nat(5));

it("projects any state without a throw, twice to the same bytes, and reads its findings and decisions", () => {
  let drawn = 0;
  fc.assert(
    fc.property(fc.array(write, { minLength: 1, maxLength: 40 }), (writes) => {
      const docs = [new Y.Doc(), new Y.Doc()] as const;
      for (const [at, [top, id, make, who]] of writes.entries()) {
        const doc = docs[at % 2 === 0 ? 0 : 1];
        const map = topLevel(doc, top);
        if (who === 0) map.delete(id);
        else map.set(id, make());
      }
      for (const [to, from] of [docs, docs.toReversed()] as const)
        if (to !== undefined && from !== undefined) Y.applyUpdate(to, Y.encodeStateAsUpdate(from));
      const [one, other] = docs.map((doc) => {
        const { file, problems } = project(doc);
        drawn += Object.values(file.blocks).flatMap(({ parts }) => parts).length;
        return JSON.stringify([file, problems, readFindings(doc), readDecisions(doc)]);
      });
      expect(one).toBe(other);
    }),
    { numRuns: 1500 },
  );
  expect(drawn).toBeGreaterThan(0);
}, 120_000);
