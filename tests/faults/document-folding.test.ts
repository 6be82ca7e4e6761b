import { afterAll, beforeAll, expect, it } from "vitest";
import * as Y from "yjs";
import { topLevel } from "../../lib/document/shape";
import { type DocumentBench, documentBench } from "./document-bench";
import { startDocumentServer } from "./document-server";
import { failingStore } from "./failing-store";
import { HeldClock } from "./held-clock";
import { PageLine } from "./page-line";

const EDITS = 620;
let bench: DocumentBench;

beforeAll(async () => {
  bench = await documentBench();
});

afterAll(() => bench.drop());

async function stored(design: string): Promise<Y.Doc> {
  const doc = new Y.Doc();
  const kept = await bench.store.load(design);
  if (kept?.snapshot != null) Y.applyUpdate(doc, kept.snapshot);
  for (const { bytes } of kept?.updates ?? []) Y.applyUpdate(doc, bytes);
  return doc;
}

const contentOf = (doc: Y.Doc) => JSON.stringify(topLevel(doc, "parts").toJSON());

/** Draws, and takes away every third part, fast, while time passes as in a long session. */
async function longSession(line: PageLine, clock: HeldClock): Promise<void> {
  for (let edit = 0; edit < EDITS; edit++) {
    if (edit % 100 === 99) {
      await line.allSaved();
      clock.pass(10_000);
    }
    if (edit % 3 === 2) topLevel(line.doc, "parts").delete(`r${edit - 2}`);
    else line.draw(`r${edit}`);
  }
  await line.allSaved();
}

it("folds a long log into a snapshot, and the document stays the same", async () => {
  const design = await bench.newDesign();
  const clock = new HeldClock();
  const server = await startDocumentServer({ store: bench.store, clock });
  const ann = new PageLine(`${server.url}/${design}`, "ann designer");
  await ann.ready();
  await longSession(ann, clock);
  // An edit after the fold's rows waits for the fold.
  ann.draw("last");
  await ann.allSaved();
  const rows = await bench.client.documentUpdate.count({ where: { designId: design } });
  expect(rows).toBeLessThan(EDITS);
  expect(await bench.client.documentSnapshot.count({ where: { designId: design } })).toBe(1);
  const kept = await stored(design);
  expect(contentOf(kept)).toBe(contentOf(ann.doc));
  expect(Y.encodeStateVector(kept)).toEqual(Y.encodeStateVector(ann.doc));
  await ann.close();

  const reader = new PageLine(`${server.url}/${design}`, "rob reviewer");
  await reader.ready();
  expect(contentOf(reader.doc)).toBe(contentOf(ann.doc));
  await reader.close();
  await server.stop();
}, 60_000);

it("loses nothing where the fold fails: the log stands, and pages come back", async () => {
  const design = await bench.newDesign();
  const clock = new HeldClock();
  const { store, hasFailed } = failingStore(bench.store, "snapshot", 0);
  const server = await startDocumentServer({ store, clock });
  const ann = new PageLine(`${server.url}/${design}`, "ann designer");
  await ann.ready();
  const gone = ann.closed;
  const drawing = longSession(ann, clock).catch(() => undefined);
  await Promise.race([gone, drawing]);
  expect(hasFailed()).toBe(true);
  expect((await gone).code).toBe(1013);
  const again = new PageLine(`${server.url}/${design}`, "ann designer", ann.doc);
  await again.allSaved();
  expect(contentOf(await stored(design))).toBe(contentOf(ann.doc));
  await again.close();
  await server.stop();
}, 60_000);
