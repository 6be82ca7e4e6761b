import type { IncomingMessage } from "node:http";
import type { Duplex } from "node:stream";

/** The live documents' side of the one port. */
export interface DesignSockets {
  handleUpgrade(request: IncomingMessage, socket: Duplex, head: Buffer): void;
  close(): Promise<void>;
}

/** The sockets of `/doc/ID`. */
export function designSockets(): DesignSockets {
  return {
    handleUpgrade: (_request, socket) => {
      socket.end("HTTP/1.1 404 Not Found\r\nConnection: close\r\nContent-Length: 0\r\n\r\n");
    },
    close: async () => undefined,
  };
}
