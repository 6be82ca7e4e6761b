import { once } from "node:events";
import { createServer } from "node:http";
import {
  attachDocumentSockets,
  type DocumentSockets,
  type SocketClock,
} from "../../lib/server/document-sockets";
import type { DocumentStore } from "../../lib/server/document-store";
import { headerSessions } from "./header-sessions";

export interface DocumentServer {
  /** `ws://127.0.0.1:PORT` */
  readonly url: string;
  readonly port: number;
  readonly sockets: DocumentSockets;
  /** Cuts all lines off and gives the port back. */
  stop(): Promise<void>;
}

/** Serves shared documents in this process, so that a test can hold its clock and its store. @param port to use again */
export async function startDocumentServer(given: {
  readonly store: DocumentStore;
  readonly clock?: SocketClock;
  readonly port?: number;
}): Promise<DocumentServer> {
  const { store, clock } = given;
  const sockets = attachDocumentSockets({
    store,
    sessions: headerSessions,
    ...(clock !== undefined && { clock }),
  });
  const server = createServer().on("upgrade", (request, socket, head) =>
    sockets.handleUpgrade(request, socket, head, (request.url ?? "").slice(1)),
  );
  server.listen(given.port ?? 0, "127.0.0.1");
  await once(server, "listening");
  const address = server.address();
  if (address === null || typeof address === "string") throw new Error("No port is free.");
  return {
    url: `ws://127.0.0.1:${address.port}`,
    port: address.port,
    sockets,
    stop: async () => {
      await sockets.close();
      const closed = once(server, "close");
      server.close();
      await closed;
    },
  };
}
