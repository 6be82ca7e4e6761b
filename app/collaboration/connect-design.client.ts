import { readVarUint } from "lib0/decoding";
import { IndexeddbPersistence } from "y-indexeddb";
import type { Awareness } from "y-protocols/awareness";
import { WebsocketProvider } from "y-websocket";
import * as Y from "yjs";
import { undoOf } from "../../lib/document/edits";
import { SAVED } from "../../lib/document/wire";
import type { SaveState } from "../wording/save-words";

/** A design that this page has open. */
export interface DesignConnection {
  readonly doc: Y.Doc;
  readonly awareness: Awareness;
  readonly undo: Y.UndoManager;
  readonly status: () => SaveState;
  /** @returns how to stop */
  readonly onStatus: (run: () => void) => () => void;
  /** After a refusal: all that this page held, the refused edits with it; else null. */
  readonly refusedCopy: () => Uint8Array | null;
  readonly close: () => void;
}

const SIGN_IN = 4401;

/** Opens a design's document. `url`: the sockets' address without the design's id, as `wss://host/doc`. */
export function connectDesign(where: {
  readonly designId: string;
  readonly userId: string;
  readonly url: string;
}): DesignConnection {
  const doc = new Y.Doc();
  // Another person at the same browser must not send these edits as their own.
  const kept = new IndexeddbPersistence(`design ${where.designId} of ${where.userId}`, doc);
  let sent = 0;
  let edits = 0;
  let state: SaveState = { kind: "saved" };
  let copy: Uint8Array | null = null;
  const listeners = new Set<() => void>();

  /** Counts the document frames of one line: the server says how many of them are stored. */
  class CountingSocket extends WebSocket {
    constructor(address: string | URL, protocols?: string | string[]) {
      super(address, protocols);
      sent = 0;
    }

    override send(data: Parameters<WebSocket["send"]>[0]): void {
      // Type 0 is the document's; its step 0 only asks.
      if (data instanceof Uint8Array && data[0] === 0 && data[1] !== 0) sent += 1;
      super.send(data);
    }
  }

  const provider = new WebsocketProvider(where.url, where.designId, doc, {
    WebSocketPolyfill: CountingSocket,
    disableBc: true,
  });

  const tell = (next: SaveState): void => {
    if (state.kind === "refused") return;
    state = next;
    for (const run of listeners) run();
  };
  const tellEdits = (): void => {
    if (edits === 0) tell({ kind: "saved" });
    else tell(provider.wsconnected ? { kind: "saving" } : { kind: "notSaved", edits });
  };

  provider.messageHandlers[SAVED] = (_encoder, decoder) => {
    const stored = readVarUint(decoder);
    readVarUint(decoder);
    // The first frame of a line holds all edits made without one.
    if (stored > 0 && stored === sent) edits = 0;
    tellEdits();
  };
  doc.on("update", (_update: Uint8Array, origin: unknown) => {
    if (origin === provider || origin === kept) return;
    edits += 1;
    tellEdits();
  });
  provider.on("status", tellEdits);
  provider.on("connection-close", (event) => {
    const code = event?.code ?? 0;
    if (code < 4400 || code > 4499) return;
    provider.disconnect();
    const said = event?.reason ?? "";
    const reason = said === "" ? "The server refused the last edit. Reload the page." : said;
    if (code !== SIGN_IN) {
      copy = Y.encodeStateAsUpdate(doc);
      // What was refused once would be refused at every return.
      kept.clearData().catch(() => undefined);
    }
    tell({ kind: "refused", reason });
  });

  return {
    doc,
    awareness: provider.awareness,
    undo: undoOf(doc),
    status: () => state,
    onStatus: (run) => {
      listeners.add(run);
      return () => listeners.delete(run);
    },
    refusedCopy: () => copy,
    close: () => {
      provider.destroy();
      kept.destroy().catch(() => undefined);
      doc.destroy();
    },
  };
}
