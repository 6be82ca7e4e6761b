import fc from "fast-check";
import { expect, it } from "vitest";
import * as Y from "yjs";
import { undoOf } from "../../lib/document/edits";
import { project } from "../../lib/document/projection";
import { editAtRandom, type RandomEdit, randomEdit } from "./random-edits";

type Step =
  | { readonly kind: "edit"; readonly who: number; readonly edit: RandomEdit }
  | { readonly kind: "undo" | "redo"; readonly who: number }
  | { readonly kind: "deliver"; readonly pick: number }
  | { readonly kind: "part" | "heal"; readonly who: number };

const who = fc.nat(4);
const step: fc.Arbitrary<Step> = fc.oneof(
  {
    weight: 10,
    arbitrary: fc.record({ kind: fc.constant("edit" as const), who, edit: randomEdit }),
  },
  {
    weight: 2,
    arbitrary: fc.record({ kind: fc.constantFrom("undo" as const, "redo" as const), who }),
  },
  { weight: 8, arbitrary: fc.record({ kind: fc.constant("deliver" as const), pick: fc.nat() }) },
  {
    weight: 2,
    arbitrary: fc.record({ kind: fc.constantFrom("part" as const, "heal" as const), who }),
  },
);

interface Letter {
  readonly to: number;
  readonly from: number;
  readonly update: Uint8Array;
}

const bytesOf = (doc: Y.Doc) => {
  const { file, problems } = project(doc);
  return JSON.stringify([file, problems]);
};

/** Replicas whose updates travel as letters: late, in any order, and not across a partition until it heals. */
function run(count: number, steps: readonly Step[], seen: Set<string>): readonly Y.Doc[] {
  const letters: Letter[] = [];
  const apart = new Set<number>();
  const replicas = Array.from({ length: count }, (_none, from) => {
    const doc = new Y.Doc();
    const undo = undoOf(doc);
    doc.on("update", (update: Uint8Array, origin: unknown) => {
      if (origin === "letter") return;
      for (let to = 0; to < count; to++) if (to !== from) letters.push({ to, from, update });
    });
    return { doc, undo };
  });
  const deliver = (pick: number) => {
    const open = letters.filter(({ from, to }) => !apart.has(from) && !apart.has(to));
    const letter = open[pick % Math.max(1, open.length)];
    if (letter === undefined) return;
    letters.splice(letters.indexOf(letter), 1);
    const replica = replicas[letter.to];
    if (replica !== undefined) Y.applyUpdate(replica.doc, letter.update, "letter");
  };
  for (const one of steps) {
    if (one.kind === "deliver") {
      deliver(one.pick);
      continue;
    }
    const at = one.who % count;
    const replica = replicas[at];
    if (replica === undefined) continue;
    if (one.kind === "edit") editAtRandom(replica.doc, one.edit);
    else if (one.kind === "undo") replica.undo.undo();
    else if (one.kind === "redo") replica.undo.redo();
    else if (one.kind === "part") apart.add(at);
    else apart.delete(at);
    for (const { code } of project(replica.doc).problems) seen.add(code);
  }
  apart.clear();
  for (let pick = 17; letters.length > 0; pick = (pick * 31 + 7) % 1009) deliver(pick);
  return replicas.map(({ doc }) => doc);
}

it("comes to the same bytes at all replicas, whatever was apart and in whatever order edits arrive", () => {
  const seen = new Set<string>();
  fc.assert(
    fc.property(
      fc.integer({ min: 3, max: 5 }),
      fc.array(step, { minLength: 60, maxLength: 200 }),
      (count, steps) => {
        const docs = run(count, steps, seen);
        for (const doc of docs) {
          expect(doc.store.pendingStructs).toBeNull();
          for (const { code } of project(doc).problems) seen.add(code);
        }
        expect(new Set(docs.map(bytesOf)).size).toBe(1);
        const [first] = docs;
        if (first === undefined) return;
        // A copy that was put together anew, as from a snapshot, says the same.
        const copy = new Y.Doc();
        Y.applyUpdate(copy, Y.encodeStateAsUpdate(first));
        expect(bytesOf(copy)).toBe(bytesOf(first));
      },
    ),
    { numRuns: 60 },
  );
  // The histories were wild enough to break what projection repairs.
  expect([...seen].sort()).toEqual(["designatorTwice", "looseEnd", "netNamedTwice"]);
}, 120_000);
