/** The server's program: pages, API and document sockets on one port. Started by the supervisor, or by itself. */
import { once } from "node:events";
import { createServer, type IncomingMessage, Server, type ServerResponse } from "node:http";
import type { Duplex } from "node:stream";
import next from "next";
import { database } from "../database/client";
import { designSockets } from "./design-sockets";
import { answerHealth } from "./health";
import { log } from "./log";
import { secureHeaders } from "./security-headers";
import { settings } from "./settings";

const { development, host, port, publicUrl } = settings();
const HEADERS_MS = 15_000;
const REQUEST_MS = 60_000;
/** Longer than a proxy's usual minute, so that it is the proxy who closes. */
const KEEP_ALIVE_MS = 75_000;
const CLOSE_MS = 5_000;

/** Next listens for upgrades on the server it is given, and would cut our sockets: it gets one that never listens. */
const decoy = new Server();
const pages = next({
  dev: development,
  dir: process.cwd(),
  hostname: host,
  port,
  httpServer: decoy,
});
await pages.prepare();
const handlePage = pages.getRequestHandler();
const sockets = designSockets();
/** The server forgets a connection once it is upgraded, but does not close before it has ended. */
const upgraded = new Set<Duplex>();

const server = createServer(
  { headersTimeout: HEADERS_MS, requestTimeout: REQUEST_MS, keepAliveTimeout: KEEP_ALIVE_MS },
  (request, response) => {
    const path = pathOf(request);
    noteOrigin(request);
    secureHeaders(request, response, {
      development,
      overHttps: publicUrl?.startsWith("https:") ?? false,
    });
    if (!answerHealth(path, response)) handlePage(request, response).catch(failed(path, response));
  },
);

server.on("upgrade", (request: IncomingMessage, socket: Duplex, head: Buffer) => {
  const path = pathOf(request);
  noteOrigin(request);
  socket.on("error", (error) => log.debug({ error, path }, "socket"));
  upgraded.add(socket);
  socket.once("close", () => upgraded.delete(socket));
  if (path.startsWith("/doc/")) sockets.handleUpgrade(request, socket, head);
  else if (development && path.startsWith("/_next/")) {
    decoy.emit("upgrade", request, socket, head);
  } else socket.end("HTTP/1.1 404 Not Found\r\nConnection: close\r\nContent-Length: 0\r\n\r\n");
});

/** A path is a name here, never a file's: whatever cannot be read as one is the root's, which is not found below it. */
function pathOf(request: IncomingMessage): string {
  return (request.url ?? "/").split("?", 1)[0] ?? "/";
}

/** Overwrites whatever the client claims: wrong passwords are counted by address, and sign-in leads back to the path. */
function noteOrigin(request: IncomingMessage): void {
  request.headers["x-ampersign-address"] = request.socket.remoteAddress ?? "unknown";
  request.headers["x-ampersign-path"] = request.url ?? "/";
}

function failed(path: string, response: ServerResponse): (error: unknown) => void {
  return (error) => {
    log.error({ error, path }, "a page failed");
    if (!response.headersSent) response.writeHead(500);
    response.end();
  };
}

async function stop(): Promise<void> {
  const closed = once(server, "close");
  server.close();
  server.closeIdleConnections();
  await sockets.close();
  for (const socket of upgraded) socket.destroy();
  const late = setTimeout(() => server.closeAllConnections(), CLOSE_MS);
  await closed;
  clearTimeout(late);
  await database().$disconnect();
  process.exit(0);
}

process.once("SIGTERM", () => void stop());
process.once("SIGINT", () => void stop());
process.on("uncaughtException", (error) => {
  log.fatal({ error }, "ended by a defect");
  process.exit(1);
});

server.on("error", (error) => {
  log.fatal({ error }, `port ${port} of ${host} cannot be opened`);
  process.exit(1);
});
server.listen(port, host, () => {
  const address = server.address();
  if (address === null || typeof address === "string") return;
  const url = `http://${host}:${address.port}`;
  // The first page loads what all pages share; nobody should have to wait for that.
  fetch(`${url}/sign-in`).then(
    () => process.send?.(publicUrl ?? url),
    (error: unknown) => log.error({ error }, "the first page failed"),
  );
});
