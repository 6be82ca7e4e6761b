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
/** Entries with the outline of what they should be, and one member that is anything. */
const nearly = (...entries: readonly (readonly [string, fc.Arbitrary<unknown>])[]) =>
  fc
    .tuple(
      ...entries.map(([key, value]) => fc.tuple(fc.constant(key), value)),
      fc.tuple(keys, plain),
    )
    .map((members) => () => new Y.Map<unknown>(members.map(([key, value]) => [key, value])));
const block = ["block", fc.constantFrom("main", "constructor")] as const;
const end = fc.oneof(
  fc.record({ part: ids, pin: fc.constantFrom("1", "2") }, { noNullPrototype: true }),
  fc.record(
    { part: fc.constantFrom("a", "b"), pin: fc.constantFrom("1", "2") },
    { noNullPrototype: true },
  ),
  fc.record({ junction: ids }, { noNullPrototype: true }),
);
const part = nearly(
  block,
  ["kind", fc.constantFrom("resistor", "connector", "toString")],
  ["designator", fc.oneof(words, fc.constantFrom("R1", "R2"))],
);
const plainEntry = (entry: fc.Arbitrary<Record<string, unknown>>) =>
  entry.map((value) => () => value);
const wire = plainEntry(fc.record({ block: block[1], a: end, b: end }, { noNullPrototype: true }));
const label = plainEntry(
  fc.record(
    { block: block[1], net: fc.oneof(words, fc.constantFrom("A", "B")), end, shape: words },
    { noNullPrototype: true },
  ),
);
const junction = plainEntry(
  fc.record({ block: block[1], at: fc.tuple(fc.nat(9), fc.nat(9)) }, { noNullPrototype: true }),
);
const write = fc.oneof(
  fc.tuple(fc.constantFrom(...TOP_LEVEL), ids, nested, fc.nat(5)),
  fc.tuple(fc.constant("parts" as const), ids, part, fc.nat(5)),
  fc.tuple(fc.constant("junctions" as const), ids, junction, fc.nat(5)),
  fc.tuple(fc.constant("wires" as const), ids, wire, fc.nat(5)),
  fc.tuple(fc.constant("labels" as const), ids, label, fc.nat(5)),
);

it("projects any state without a throw, twice to the same bytes, and reads its findings and decisions", () => {
  const found = new Set<string>();
  fc.assert(
    fc.property(fc.array(write, { minLength: 1, maxLength: 60, size: "max" }), (writes) => {
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
        for (const { code } of problems) found.add(code);
        for (const { wires } of Object.values(file.blocks))
          if (wires !== undefined && wires.length > 0) found.add("wires");
        return JSON.stringify([file, problems, readFindings(doc), readDecisions(doc)]);
      });
      expect(one).toBe(other);
    }),
    { numRuns: 600 },
  );
  // The states were near enough to circuits for every repair, and for wires that stand.
  expect([...found].sort()).toEqual([
    "designatorTwice",
    "looseEnd",
    "netNamedTwice",
    "unreadable",
    "wires",
  ]);
}, 120_000);
