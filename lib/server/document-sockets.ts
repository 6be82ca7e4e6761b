import type { IncomingMessage } from "node:http";
import type { Duplex } from "node:stream";
import { type RawData, type WebSocket, WebSocketServer } from "ws";
import { CAPS, CLOSE } from "./document-caps";
import { DocumentConnection } from "./document-connection";
import { DocumentRoom } from "./document-room";
import type { DocumentStore, Sessions } from "./document-store";

/** Time, so that a test can let it pass. */
export interface SocketClock {
  /** Milliseconds */
  now(): number;
  /** @returns how to stop it */
  every(milliseconds: number, run: () => void): () => void;
}

export interface DocumentSockets {
  /** Takes the socket of a page that opens a design. Answers with a close code where it may not. */
  handleUpgrade(request: IncomingMessage, socket: Duplex, head: Buffer, designId: string): void;
  /** Reads everyone's rights again, at once: call it when rights have changed. */
  recheckRights(): Promise<void>;
  close(): Promise<void>;
}

const REPEAT_SAVED = 15_000;
const RECHECK_RIGHTS = 60_000;

const realClock: SocketClock = {
  now: () => performance.now(),
  every: (milliseconds, run) => {
    const timer = setInterval(run, milliseconds);
    timer.unref();
    return () => clearInterval(timer);
  },
};

/** Serves shared documents out of a store to those whom the sessions let in. */
export function attachDocumentSockets(ports: {
  readonly store: DocumentStore;
  readonly sessions: Sessions;
  readonly clock?: SocketClock;
}): DocumentSockets {
  const { store, sessions, clock = realClock } = ports;
  const sockets = new WebSocketServer({ noServer: true, maxPayload: CAPS.frameBytes });
  const rooms = new Map<string, Promise<DocumentRoom | null>>();
  const connections = new Map<DocumentConnection, string>();

  const listening = store.listen(
    (designId, seq) => withRoom(designId, (room) => room.hear(seq)),
    () => {
      for (const designId of rooms.keys()) withRoom(designId, (room) => room.hearGap());
    },
  );
  // Whoever opens a document waits for it, and hears of a failure there.
  listening.catch(() => undefined);

  function withRoom(designId: string, run: (room: DocumentRoom) => void): void {
    const opening = rooms.get(designId);
    opening?.then((room) => room !== null && run(room)).catch(() => undefined);
  }

  function roomOf(designId: string): Promise<DocumentRoom | null> {
    const known = rooms.get(designId);
    if (known !== undefined) return known;
    const forget = () => {
      if (rooms.get(designId) === opening) rooms.delete(designId);
    };
    const opening: Promise<DocumentRoom | null> = listening
      .then(() => DocumentRoom.open(designId, store, forget))
      .then((room) => {
        if (room === null) forget();
        return room;
      })
      .catch((error: unknown) => {
        forget();
        throw error;
      });
    rooms.set(designId, opening);
    return opening;
  }

  async function admit(
    socket: WebSocket,
    request: IncomingMessage,
    designId: string,
  ): Promise<DocumentConnection | null> {
    const person = await sessions.authenticate(request);
    if (person === null) return turnAway(socket, CLOSE.signIn, "Sign in again.");
    const roles = await sessions.rights(person.userId, designId);
    const room = roles === null ? null : await roomOf(designId);
    // Loading may take a while: what was taken away meanwhile counts.
    const still = room === null ? null : await sessions.rights(person.userId, designId);
    if (room !== null && still === null && room.occupants.size === 0)
      room.close(CLOSE.comeBack, "");
    if (room === null || still === null)
      return turnAway(socket, CLOSE.refused, "There is no such design, or it is not yours to see.");
    if (socket.readyState !== socket.OPEN) {
      if (room.occupants.size === 0) room.close(CLOSE.comeBack, "");
      return null;
    }
    const connection = new DocumentConnection(socket, room, store, person, still, () =>
      clock.now(),
    );
    connections.set(connection, designId);
    socket.once("close", () => {
      connections.delete(connection);
      connection.leave();
    });
    connection.join();
    return connection;
  }

  function serve(socket: WebSocket, request: IncomingMessage, designId: string): void {
    socket.on("error", () => socket.terminate());
    let connection: DocumentConnection | null = null;
    const early: Uint8Array[] = [];
    let earlyBytes = 0;
    socket.on("message", (data: RawData) => {
      const bytes = bytesOf(data);
      if (connection !== null) return connection.receive(bytes);
      earlyBytes += bytes.length;
      if (early.length < CAPS.early.frames && earlyBytes <= CAPS.early.bytes) early.push(bytes);
      else socket.close(CLOSE.tooMany, "Wait for the document.");
    });
    admit(socket, request, designId)
      .then((admitted) => {
        connection = admitted;
        for (const bytes of early) admitted?.receive(bytes);
      })
      .catch(() => socket.close(CLOSE.notStored, "The document could not be read. Trying again."));
  }

  async function recheckRights(): Promise<void> {
    for (const [connection, designId] of connections) {
      const roles = await sessions.rights(connection.person.userId, designId);
      if (roles === null) connection.end(CLOSE.refused, "This design is no longer yours to see.");
      else connection.roles = roles;
    }
  }

  const stops = [
    clock.every(REPEAT_SAVED, () => {
      for (const connection of connections.keys()) connection.repeatSaved();
    }),
    // Rights that could not be read now are read a minute later; sending is judged by the last known.
    clock.every(RECHECK_RIGHTS, () => void recheckRights().catch(() => undefined)),
  ];

  return {
    handleUpgrade: (request, socket, head, designId) =>
      sockets.handleUpgrade(request, socket, head, (opened) => serve(opened, request, designId)),
    recheckRights,
    async close() {
      for (const stop of stops) stop();
      for (const connection of connections.keys()) connection.end(CLOSE.comeBack, "Back soon.");
      for (const socket of sockets.clients) socket.terminate();
      const listener = await listening.catch(() => null);
      await listener?.stop();
    },
  };
}

function turnAway(socket: WebSocket, code: number, reason: string): null {
  socket.close(code, reason);
  return null;
}

function bytesOf(data: RawData): Uint8Array {
  if (Array.isArray(data)) return new Uint8Array(Buffer.concat(data));
  return data instanceof ArrayBuffer ? new Uint8Array(data) : new Uint8Array(data);
}
