/**
 * Serves shared documents out of the database that DATABASE_URL names, as the real server does, but takes a person's name
 * from a header: `x-user: ann designer`. Sends its address to the process that started it.
 */
import { once } from "node:events";
import { createServer } from "node:http";
import { connect, databaseUrl } from "../../lib/database/client";
import { PostgresDocumentStore } from "../../lib/database/document-store";
import { attachDocumentSockets } from "../../lib/server/document-sockets";
import { headerSessions } from "./header-sessions";

const url = databaseUrl();
const sockets = attachDocumentSockets({
  store: new PostgresDocumentStore(connect(url), url),
  sessions: headerSessions,
});
const server = createServer().on("upgrade", (request, socket, head) =>
  sockets.handleUpgrade(request, socket, head, (request.url ?? "").slice(1)),
);
server.listen(0, "127.0.0.1");
await once(server, "listening");
const address = server.address();
if (address === null || typeof address === "string") throw new Error("No port is free.");
process.send?.(`ws://127.0.0.1:${address.port}`);
