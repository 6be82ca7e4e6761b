import { afterAll, beforeAll, expect, it } from "vitest";
import * as Y from "yjs";
import { decisionUpdate } from "../../lib/document/decision-update";
import { topLevel } from "../../lib/document/shape";
import { type DocumentBench, documentBench } from "./document-bench";
import { type DocumentServer, startDocumentServer } from "./document-server";
import { PageLine } from "./page-line";

let bench: DocumentBench;
let server: DocumentServer;

beforeAll(async () => {
  bench = await documentBench();
  server = await startDocumentServer({ store: bench.store });
});

afterAll(async () => {
  await server.stop();
  await bench.drop();
});

/** A copy of a page's document that goes on under another's client id. */
function under(clientId: number, doc: Y.Doc): Y.Doc {
  const copy = new Y.Doc();
  Y.applyUpdate(copy, Y.encodeStateAsUpdate(doc));
  copy.clientID = clientId;
  return copy;
}

it("lets nobody go on under the server's own client id, not even the first who tries, twice", async () => {
  const design = await bench.newDesign();
  const decision = {
    kind: "release",
    id: "d1",
    user: "bob",
    at: "2026-03-02T09:00:00.000Z",
    revision: "A",
    findings: [],
  } as const;
  await bench.store.append(design, [{ bytes: decisionUpdate(decision), author: "bob" }]);
  const ann = new PageLine(`${server.url}/${design}`, "ann designer");
  await ann.ready();
  const [serversId] = ann.doc.store.clients.keys();
  if (serversId === undefined) throw new Error("The decision is not there.");
  for (let attempt = 0; attempt < 2; attempt++) {
    const spoofer = new PageLine(
      `${server.url}/${design}`,
      "eve designer",
      under(serversId, ann.doc),
    );
    await spoofer.ready();
    spoofer.draw("r1");
    expect((await spoofer.closed).code).toBe(4403);
  }
  ann.draw("r2");
  await ann.allSaved();
  expect([ann.has("r1"), ann.has("r2")]).toEqual([false, true]);
  await ann.close();
});

it("lets a person go on under an own client id after a reload, and nobody else", async () => {
  const design = await bench.newDesign();
  const first = new PageLine(`${server.url}/${design}`, "ann designer");
  await first.ready();
  first.draw("r1");
  await first.allSaved();
  await first.close();
  const { clientID } = first.doc;

  const spoofer = new PageLine(
    `${server.url}/${design}`,
    "eve designer",
    under(clientID, first.doc),
  );
  await spoofer.ready();
  spoofer.draw("bad");
  expect((await spoofer.closed).code).toBe(4403);

  const again = new PageLine(`${server.url}/${design}`, "ann designer", under(clientID, first.doc));
  await again.ready();
  again.draw("r2");
  await again.allSaved();
  await again.close();
  const kept = new Y.Doc();
  for (const { bytes } of (await bench.store.load(design))?.updates ?? [])
    Y.applyUpdate(kept, bytes);
  expect([...topLevel(kept, "parts").keys()].sort()).toEqual(["r1", "r2"]);
});
