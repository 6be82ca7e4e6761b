import { afterAll, beforeAll, expect, it } from "vitest";
import * as Y from "yjs";
import { topLevel } from "../../lib/document/shape";
import { type DocumentBench, documentBench } from "./document-bench";
import { type DocumentServer, startDocumentServer } from "./document-server";
import { failingStore } from "./failing-store";
import { PageLine } from "./page-line";

const EDITS = 6;
let bench: DocumentBench;

beforeAll(async () => {
  bench = await documentBench();
});

afterAll(() => bench.drop());

async function storedParts(design: string): Promise<readonly string[]> {
  const doc = new Y.Doc();
  const kept = await bench.store.load(design);
  if (kept?.snapshot != null) Y.applyUpdate(doc, kept.snapshot);
  for (const { bytes } of kept?.updates ?? []) Y.applyUpdate(doc, bytes);
  return [...topLevel(doc, "parts").keys()].sort();
}

const lineTo = (server: DocumentServer, design: string, user: string, doc?: Y.Doc) =>
  new PageLine(`${server.url}/${design}`, `${user} designer`, doc);

it.each([0, 1, 2, 3, 5])(
  "claims nothing and shows nothing of an insert that failed, the %i-th; all comes back with its page",
  async (at) => {
    const design = await bench.newDesign();
    const { store, hasFailed } = failingStore(bench.store, "append", at);
    const server = await startDocumentServer({ store });
    const [ann, bob] = [lineTo(server, design, "ann"), lineTo(server, design, "bob")];
    await Promise.all([ann.ready(), bob.ready()]);
    const codes = Promise.all([ann.closed, bob.closed]);
    const drawn: string[] = [];
    // Each edit after the one before is stored, or the line is gone.
    for (let edit = 0; edit < EDITS && !hasFailed(); edit++) {
      ann.draw(`r${edit}`);
      drawn.push(`r${edit}`);
      await Promise.race([ann.allSaved().catch(() => undefined), ann.closed]);
    }
    expect(hasFailed()).toBe(true);
    expect((await codes).map(({ code }) => code)).toEqual([1013, 1013]);
    // The answer of the opening is the first frame.
    expect(ann.saved - 1).toBe(at);
    const held = await storedParts(design);
    expect(held).toEqual(drawn.slice(0, at));
    expect([...topLevel(bob.doc, "parts").keys()].sort()).toEqual(held);

    const again = lineTo(server, design, "ann", ann.doc);
    await again.allSaved();
    expect(await storedParts(design)).toEqual(drawn);
    const back = lineTo(server, design, "bob", bob.doc);
    await back.until(({ doc }) => topLevel(doc, "parts").size === drawn.length);
    await Promise.all([again.close(), back.close()]);
    await server.stop();
  },
);

it("never takes a document that could not be read for an empty one", async () => {
  const design = await bench.newDesign();
  const first = await startDocumentServer({ store: bench.store });
  const ann = lineTo(first, design, "ann");
  await ann.ready();
  ann.draw("r1");
  await ann.allSaved();
  await ann.close();
  await first.stop();

  const server = await startDocumentServer({ store: failingStore(bench.store, "load", 0).store });
  const refused = lineTo(server, design, "bob");
  expect((await refused.closed).code).toBe(1013);
  expect(refused.heard.size).toBe(0);
  const back = lineTo(server, design, "bob");
  await back.ready();
  expect(back.has("r1")).toBe(true);
  await back.close();
  await server.stop();
});

it("sends the page back whose client id could not be noted; the others go on", async () => {
  const design = await bench.newDesign();
  const { store } = failingStore(bench.store, "claimClientId", 1);
  const server = await startDocumentServer({ store });
  const [ann, bob] = [lineTo(server, design, "ann"), lineTo(server, design, "bob")];
  await Promise.all([ann.ready(), bob.ready()]);
  bob.draw("b1");
  await bob.allSaved();
  ann.draw("a1");
  expect((await ann.closed).code).toBe(1013);
  bob.draw("b2");
  await bob.allSaved();
  const again = lineTo(server, design, "ann", ann.doc);
  await again.allSaved();
  expect(await storedParts(design)).toEqual(["a1", "b1", "b2"]);
  await Promise.all([again.close(), bob.close()]);
  await server.stop();
});
