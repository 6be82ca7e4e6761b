import type { IncomingMessage } from "node:http";
import type { Duplex } from "node:stream";
import { database, databaseUrl } from "../database/client";
import { PostgresDocumentStore } from "../database/document-store";
import { documentSessions } from "./document-sessions";
import { attachDocumentSockets } from "./document-sockets";
import { isOwnOrigin } from "./own-origin";

/** The live documents' side of the one port. */
export interface DesignSockets {
  handleUpgrade(request: IncomingMessage, socket: Duplex, head: Buffer): void;
  close(): Promise<void>;
}

const NOT_FOUND = "HTTP/1.1 404 Not Found\r\nConnection: close\r\nContent-Length: 0\r\n\r\n";

/** The sockets of `/doc/ID`. A page of another origin is turned away: a browser would send the cookie along. */
export function designSockets(): DesignSockets {
  const sockets = attachDocumentSockets({
    store: new PostgresDocumentStore(database(), databaseUrl()),
    sessions: documentSessions,
  });
  return {
    handleUpgrade: (request, socket, head) => {
      const path = (request.url ?? "/").split("?", 1)[0] ?? "/";
      const [, , design = ""] = path.split("/");
      if (!/^[\w-]{1,64}$/.test(design) || !isOwnOrigin(originOf(request))) socket.end(NOT_FOUND);
      else sockets.handleUpgrade(request, socket, head, design);
    },
    close: () => sockets.close(),
  };
}

function originOf(request: IncomingMessage): Headers {
  const headers = new Headers();
  const { origin, host } = request.headers;
  if (origin !== undefined) headers.set("origin", origin);
  if (host !== undefined) headers.set("host", host);
  return headers;
}
