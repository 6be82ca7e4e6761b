import "fake-indexeddb/auto";
import { afterAll, afterEach, beforeAll, beforeEach, expect, it, vi } from "vitest";
import { WebSocket as NodeWebSocket } from "ws";
import * as Y from "yjs";
import {
  connectDesign,
  type DesignConnection,
  type Refused,
} from "../../app/collaboration/connect-design.client";
import { OWN_EDIT } from "../../lib/document/edits";
import { SCHEMA, topLevel } from "../../lib/document/shape";
import { type DocumentBench, documentBench } from "./document-bench";
import { type DocumentServer, startDocumentServer } from "./document-server";
import { PageLine } from "./page-line";

let bench: DocumentBench;
let server: DocumentServer;
let design: string;
let user = "ann designer";
const open: DesignConnection[] = [];

beforeAll(async () => {
  bench = await documentBench();
  // A browser sends the session's cookie by itself; here a header takes its place.
  vi.stubGlobal(
    "WebSocket",
    class extends NodeWebSocket {
      constructor(address: string | URL, protocols?: string[]) {
        super(address, protocols, { headers: { "x-user": user } });
      }
    },
  );
});

beforeEach(async () => {
  user = "ann designer";
  design = await bench.newDesign();
  server = await startDocumentServer({ store: bench.store });
});

afterEach(async () => {
  for (const one of open.splice(0)) one.close();
  await server.stop();
});

afterAll(async () => {
  vi.unstubAllGlobals();
  await bench.drop();
});

function page(after?: Refused): DesignConnection {
  const userId = user.split(" ")[0] ?? "";
  const opened = connectDesign({
    designId: design,
    userId,
    url: server.url,
    ...(after !== undefined && { after }),
  });
  open.push(opened);
  return opened;
}

function draw({ doc }: DesignConnection, id: string): void {
  doc.transact(() => topLevel(doc, "parts").set(id, new Y.Map([["kind", "resistor"]])), OWN_EDIT);
}

const has = ({ doc }: { readonly doc: Y.Doc }, id: string) => topLevel(doc, "parts").has(id);

function until(one: DesignConnection, holds: () => boolean): Promise<void> {
  return new Promise((resolve) => {
    const look = () => {
      if (!holds()) return;
      stop();
      one.doc.off("update", look);
      resolve();
    };
    const stop = one.onStatus(look);
    one.doc.on("update", look);
    look();
  });
}

const saved = (one: DesignConnection) => until(one, () => one.status().kind === "saved");

async function stored(): Promise<Y.Doc> {
  const doc = new Y.Doc();
  const kept = await bench.store.load(design);
  if (kept?.snapshot != null) Y.applyUpdate(doc, kept.snapshot);
  for (const { bytes } of kept?.updates ?? []) Y.applyUpdate(doc, bytes);
  return doc;
}

it("is not saved before the server says so, and then all of it is stored", async () => {
  const ann = page();
  expect(ann.status().kind).toBe("saving");
  draw(ann, "r1");
  draw(ann, "r2");
  await saved(ann);
  const doc = await stored();
  expect(has({ doc }, "r1") && has({ doc }, "r2")).toBe(true);
});

it("counts the edits while the server is gone, and sends them when it is back", async () => {
  const ann = page();
  await saved(ann);
  const { port } = server;
  await server.stop();
  draw(ann, "r1");
  await until(ann, () => ann.status().kind === "notSaved");
  draw(ann, "r2");
  expect(ann.status()).toEqual({ kind: "notSaved", edits: 2 });
  server = await startDocumentServer({ store: bench.store, port });
  await saved(ann);
  expect(has({ doc: await stored() }, "r2")).toBe(true);
});

it("counts edits kept from before a reload as unsaved until they are stored", async () => {
  const first = page();
  await saved(first);
  const { port } = server;
  await server.stop();
  for (const id of ["r1", "r2", "r3"]) draw(first, id);
  await until(first, () => first.status().kind === "notSaved");
  first.close();

  const again = page();
  const said = new Set<string>();
  again.onStatus(() => said.add(again.status().kind));
  await until(again, () => again.status().kind === "notSaved");
  expect(again.status()).toEqual({ kind: "notSaved", edits: 3 });
  expect(said).not.toContain("saved");
  server = await startDocumentServer({ store: bench.store, port });
  await saved(again);
  expect(has({ doc: await stored() }, "r3")).toBe(true);
});

it("drops what was refused, begins anew from what is stored, and offers the copy", async () => {
  user = "rob reviewer";
  const ann = new PageLine(`${server.url}/${design}`, "ann designer");
  await ann.ready();
  ann.draw("good");
  await ann.allSaved();
  const rob = page();
  const other = page();
  await Promise.all([rob, other].map((one) => until(one, () => has(one, "good"))));
  await Promise.all([saved(rob), saved(other)]);
  draw(rob, "bad");
  await until(rob, () => rob.status().kind === "refused");
  const refused = rob.refused();
  if (refused?.copy == null) throw new Error("There is no copy.");
  expect(refused.reopen).toBe(true);
  const copy = new Y.Doc();
  Y.applyUpdate(copy, refused.copy);
  expect(has({ doc: copy }, "bad")).toBe(true);
  rob.close();

  const anew = page(refused);
  await until(anew, () => has(anew, "good"));
  expect(anew.status()).toEqual({ kind: "refused", reason: refused.reason });
  expect(anew.refused()?.copy).toBe(refused.copy);
  expect(has(anew, "bad")).toBe(false);
  // The other page of the same person goes on.
  ann.draw("later");
  await until(other, () => has(other, "later"));
  expect(other.status().kind).toBe("saved");
  expect(has(other, "bad")).toBe(false);
  expect(has({ doc: await stored() }, "bad")).toBe(false);
  await ann.close();
});

it("keeps the edits of who has to sign in again", async () => {
  const ann = page();
  await saved(ann);
  const { port } = server;
  await server.stop();
  draw(ann, "r1");
  user = "";
  server = await startDocumentServer({ store: bench.store, port });
  await until(ann, () => ann.status().kind === "refused");
  expect(ann.refused()).toMatchObject({ copy: null, reopen: false });
  ann.close();
  user = "ann designer";
  const again = page();
  await saved(again);
  expect(has({ doc: await stored() }, "r1")).toBe(true);
});

it("writes nothing into a document of a newer form, and says so", async () => {
  const newer = new Y.Doc();
  topLevel(newer, "design").set("schema", SCHEMA + 1);
  await bench.store.append(design, [{ bytes: Y.encodeStateAsUpdate(newer), author: "ann" }]);
  const ann = page();
  await until(ann, () => ann.isReadOnly());
  draw(ann, "r1");
  expect(ann.status().kind).toBe("refused");
  const reader = new PageLine(`${server.url}/${design}`, "bob designer");
  await reader.ready();
  reader.draw("r2");
  await until(ann, () => has(ann, "r2"));
  await reader.allSaved();
  const doc = await stored();
  expect([has({ doc }, "r1"), has({ doc }, "r2")]).toEqual([false, true]);
  await reader.close();
});
