import { afterAll, beforeAll, expect, it } from "vitest";
import * as Y from "yjs";
import { topLevel } from "../../lib/document/shape";
import type { DocumentStore } from "../../lib/server/document-store";
import { type DocumentBench, documentBench } from "./document-bench";
import { startDocumentServer } from "./document-server";
import { HeldClock } from "./held-clock";
import { PageLine } from "./page-line";

const FOLDED = 500;
let bench: DocumentBench;

beforeAll(async () => {
  bench = await documentBench();
});

afterAll(() => bench.drop());

/** A promise, and what settles it. */
function signal<Value>() {
  let resolve: (value: Value) => void = () => undefined;
  const promise = new Promise<Value>((settle) => {
    resolve = settle;
  });
  return { promise, resolve };
}

/** The store with a gate before each fold, and news of each fold's end. */
function watchedFolds(store: DocumentStore, gate: Promise<void>) {
  const reached = signal<void>();
  const folded = signal<boolean>();
  const watched: DocumentStore = {
    load: (...given) => store.load(...given),
    append: (...given) => store.append(...given),
    row: (...given) => store.row(...given),
    claimClientId: (...given) => store.claimClientId(...given),
    listen: (...given) => store.listen(...given),
    snapshot: async (...given) => {
      reached.resolve(undefined);
      await gate;
      const done = await store.snapshot(...given);
      folded.resolve(done);
      return done;
    },
  };
  return { watched, reached: reached.promise, folded: folded.promise };
}

it("keeps what was saved where two servers fold the same log at once", async () => {
  const design = await bench.newDesign();
  const clock = new HeldClock();
  const gate = signal<void>();
  const late = watchedFolds(bench.store, gate.promise);
  const early = watchedFolds(bench.store, Promise.resolve());
  const servers = await Promise.all(
    [late, early].map(({ watched }) => startDocumentServer({ store: watched, clock })),
  );
  const [ann, bob] = servers.map(
    ({ url }, at) => new PageLine(`${url}/${design}`, `${at === 0 ? "ann" : "bob"} designer`),
  );
  if (ann === undefined || bob === undefined) throw new Error("Two pages were opened.");
  await Promise.all([ann.ready(), bob.ready()]);
  for (let edit = 0; edit < FOLDED - 1; edit++) {
    if (edit % 100 === 99) {
      await ann.allSaved();
      clock.pass(10_000);
    }
    ann.draw(`ann-${edit}`);
  }
  await ann.allSaved();
  await bob.until((line) => line.has(`ann-${FOLDED - 2}`));
  // Both now hold enough rows to fold with the next edits; the first server's fold waits at its gate.
  ann.draw("ann-last");
  bob.draw("bob-saved");
  await late.reached;
  await bob.allSaved();
  expect(await early.folded).toBe(true);
  gate.resolve(undefined);
  expect(await late.folded).toBe(false);
  await ann.allSaved();
  await ann.until((line) => line.has("bob-saved"));

  const kept = await bench.store.load(design);
  const doc = new Y.Doc();
  if (kept?.snapshot != null) Y.applyUpdate(doc, kept.snapshot);
  for (const { bytes } of kept?.updates ?? []) Y.applyUpdate(doc, bytes);
  const parts = topLevel(doc, "parts");
  expect(parts.has("bob-saved")).toBe(true);
  expect(parts.has("ann-last")).toBe(true);
  expect(parts.size).toBe(FOLDED + 1);
  await Promise.all([ann.close(), bob.close()]);
  await Promise.all(servers.map((server) => server.stop()));
}, 60_000);
