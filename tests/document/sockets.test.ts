import { once } from "node:events";
import { createServer, type Server } from "node:http";
import { afterAll, beforeAll, expect, it } from "vitest";
import { WebSocket } from "ws";
import * as Y from "yjs";
import { connect, type PrismaClient } from "../../lib/database/client";
import { PostgresDocumentStore } from "../../lib/database/document-store";
import { decisionUpdate } from "../../lib/document/decision-update";
import { readDecisions } from "../../lib/document/findings";
import { topLevel } from "../../lib/document/shape";
import { syncMessage } from "../../lib/document/wire";
import type { Role } from "../../lib/review/review-state";
import { attachDocumentSockets, type DocumentSockets } from "../../lib/server/document-sockets";
import { type FreshDatabase, freshDatabase } from "../fresh-database";

let database: FreshDatabase;
let client: PrismaClient;
let store: PostgresDocumentStore;
let sockets: DocumentSockets;
let server: Server;
let design: string;
let port: number;

beforeAll(async () => {
  database = await freshDatabase();
  client = connect(database.url);
  store = new PostgresDocumentStore(client, database.url);
  const { id: workspaceId } = await client.workspace.create({ data: { name: "Bench" } });
  const made = await client.design.create({ data: { workspaceId, number: "X-1", title: "X" } });
  design = made.id;
  const roles: ReadonlyMap<string, readonly Role[]> = new Map([
    ["ann", ["designer"]],
    ["bob", ["designer"]],
    ["rob", ["reviewer"]],
  ]);
  sockets = attachDocumentSockets({
    store,
    sessions: {
      authenticate: async (request) => {
        const userId = request.headers["x-user"];
        return typeof userId === "string" ? { userId, name: userId } : null;
      },
      rights: async (userId) => roles.get(userId) ?? null,
    },
  });
  server = createServer().on("upgrade", (request, socket, head) =>
    sockets.handleUpgrade(request, socket, head, design),
  );
  server.listen(0, "127.0.0.1");
  await once(server, "listening");
  const address = server.address();
  port = typeof address === "object" && address !== null ? address.port : 0;
});

afterAll(async () => {
  await sockets.close();
  server.close();
  await client.$disconnect();
  await database.drop();
});

/** A page's line: applies what it hears, and says how many of its frames are stored. */
function line(user: string | null) {
  const doc = new Y.Doc();
  const socket = new WebSocket(`ws://127.0.0.1:${port}/`, {
    headers: user === null ? {} : { "x-user": user },
  });
  const waiting = new Set<() => void>();
  let stored = 0;
  socket.on("message", (data: Buffer) => {
    if (data[0] === 100) stored = data[1] ?? 0;
    else if (data[0] === 0 && data[1] !== 0) {
      // Type, step, then the length as a varint of seven bits a byte.
      let start = 2;
      while (((data[start] ?? 0) & 128) !== 0) start += 1;
      Y.applyUpdate(doc, new Uint8Array(data.subarray(start + 1)));
    }
    for (const run of waiting) run();
  });
  return {
    doc,
    socket,
    closed: once(socket, "close").then(([code]: unknown[]) => code),
    draw(id: string): void {
      const before = Y.encodeStateVector(doc);
      topLevel(doc, "parts").set(id, new Y.Map([["kind", "resistor"]]));
      socket.send(syncMessage(2, Y.encodeStateAsUpdate(doc, before)));
    },
    until: (holds: (doc: Y.Doc, stored: number) => boolean) =>
      new Promise<void>((resolve) => {
        const look = () => {
          if (!holds(doc, stored)) return;
          waiting.delete(look);
          resolve();
        };
        waiting.add(look);
        look();
      }),
  };
}

it("sends an edit on and says saved when it is in the database", async () => {
  const [ann, bob] = [line("ann"), line("bob")];
  await Promise.all([once(ann.socket, "message"), once(bob.socket, "message")]);
  ann.draw("r1");
  await ann.until((_doc, stored) => stored === 1);
  await bob.until((doc) => topLevel(doc, "parts").has("r1"));
  const kept = new Y.Doc();
  for (const { bytes } of (await store.load(design))?.updates ?? []) Y.applyUpdate(kept, bytes);
  expect(topLevel(kept, "parts").has("r1")).toBe(true);
  ann.socket.close();
  bob.socket.close();
  await Promise.all([ann.closed, bob.closed]);
});

it("cuts off who may not draw, sends no message or is nobody; the others go on", async () => {
  const [ann, rob, mad, nobody, outsider] = [
    line("ann"),
    line("rob"),
    line("bob"),
    line(null),
    line("eve"),
  ];
  await Promise.all([ann, rob, mad].map(({ socket }) => once(socket, "message")));
  rob.draw("r2");
  mad.socket.send(new Uint8Array([0, 2, 3, 9, 9, 9]));
  const codes = await Promise.all([rob, mad, nobody, outsider].map(({ closed }) => closed));
  expect(codes).toEqual([4403, 4400, 4401, 4403]);
  ann.draw("r3");
  await ann.until((_doc, stored) => stored === 1);
  expect(topLevel(ann.doc, "parts").has("r2")).toBe(false);
  ann.socket.close();
  await ann.closed;
});

it("shows a decision that a command stored", async () => {
  const ann = line("ann");
  await once(ann.socket, "message");
  const decision = {
    kind: "release",
    id: "d1",
    user: "bob",
    at: "2026-03-02T09:00:00.000Z",
    revision: "A",
    findings: [],
  } as const;
  await store.append(design, [{ bytes: decisionUpdate(decision), author: "bob" }]);
  await ann.until((doc) => topLevel(doc, "decisions").has("d1"));
  expect(readDecisions(ann.doc)).toEqual([decision]);
  ann.socket.close();
  await ann.closed;
});
