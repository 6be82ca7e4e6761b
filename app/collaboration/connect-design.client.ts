import { readVarUint } from "lib0/decoding";
import type { Awareness } from "y-protocols/awareness";
import { WebsocketProvider } from "y-websocket";
import * as Y from "yjs";
import { undoOf } from "../../lib/document/edits";
import { SCHEMA, topLevel } from "../../lib/document/shape";
import { SAVED } from "../../lib/document/wire";
import type { SaveState } from "../wording/save-words";
import { keepEdits } from "./kept-edits.client";
import { SaveCount } from "./save-count";

/** What the server would not take. */
export interface Refused {
  /** One sentence for the person. */
  readonly reason: string;
  /** All that the page held, the refused edits with it; null: they are kept and go on after signing in. */
  readonly copy: Uint8Array | null;
  /** Whether to open the design again, from what is stored. */
  readonly reopen: boolean;
}

/** A design that this page has open. */
export interface DesignConnection {
  readonly doc: Y.Doc;
  readonly awareness: Awareness;
  readonly undo: Y.UndoManager;
  readonly status: () => SaveState;
  /** @returns how to stop */
  readonly onStatus: (run: () => void) => () => void;
  /** What was refused, on this line or on the one that it follows; else null. */
  readonly refused: () => Refused | null;
  /** Whether this page may not write: the document is of a newer kind than the page knows. Nothing is sent then. */
  readonly isReadOnly: () => boolean;
  readonly close: () => void;
}

const SIGN_IN = 4401;
const NEWER = "This design has a newer form than this page. Reload the page to edit.";

/**
 * Opens a design's document.
 * @param where `url`: the sockets' address without the design's id, as `wss://host/doc`; `after`: what was refused before
 * this page began anew; it is told until the person edits again
 */
export function connectDesign(where: {
  readonly designId: string;
  readonly userId: string;
  readonly url: string;
  readonly after?: Refused;
}): DesignConnection {
  const doc = new Y.Doc();
  const count = new SaveCount();
  const listeners = new Set<() => void>();
  let ended: Refused | null = null;
  let before: Refused | null = where.after ?? null;
  let isReadOnly = false;
  let isLoaded = false;
  let state: SaveState = { kind: "saving" };

  // Heard before what sends: a frame is counted with the change that it brings.
  doc.on("update", (_update: Uint8Array, origin: unknown) => {
    if (origin === provider) return;
    const isOwn = !kept.isOrigin(origin);
    count.add(isOwn ? 1 : 0);
    if (!isOwn) return;
    before = null;
    if (isLoaded) kept.note(count.unsaved);
    tell();
  });
  const kept = keepEdits(doc, where.designId, where.userId);

  /** Counts the document frames of one line. */
  class CountingSocket extends WebSocket {
    constructor(address: string | URL, protocols?: string | string[]) {
      super(address, protocols);
      count.lineOpened();
    }

    override send(data: Parameters<WebSocket["send"]>[0]): void {
      // Type 0 is the document's: its step 0 only asks, 1 answers, 2 is news.
      const isFrame = data instanceof Uint8Array && data[0] === 0 && data[1] !== 0;
      if (isFrame && isReadOnly) return;
      if (isFrame) count.frameSent(data[1] === 1 ? "answer" : "update");
      super.send(data);
    }
  }

  const provider = new WebsocketProvider(where.url, where.designId, doc, {
    WebSocketPolyfill: CountingSocket,
    disableBc: true,
  });

  const stateNow = (): SaveState => {
    const refusal = ended ?? before;
    if (refusal !== null) return { kind: "refused", reason: refusal.reason };
    if (isReadOnly) return { kind: "refused", reason: NEWER };
    if (isLoaded && count.isSaved) return { kind: "saved" };
    if (provider.wsconnected || count.unsaved === 0) return { kind: "saving" };
    return { kind: "notSaved", edits: count.unsaved };
  };
  const tell = (): void => {
    const next = stateNow();
    if (JSON.stringify(next) === JSON.stringify(state)) return;
    state = next;
    for (const run of [...listeners]) run();
  };

  void kept.loaded.then((unsaved) => {
    isLoaded = true;
    count.addEarlier(unsaved);
    tell();
  });
  provider.messageHandlers[SAVED] = (_encoder, decoder) => {
    count.framesStored(readVarUint(decoder));
    if (isLoaded) kept.note(count.unsaved);
    tell();
  };
  topLevel(doc, "design").observe(() => {
    const schema = topLevel(doc, "design").get("schema");
    if (typeof schema !== "number" || !(schema > SCHEMA) || isReadOnly) return;
    isReadOnly = true;
    kept.close();
    tell();
  });
  provider.on("status", tell);
  provider.on("connection-close", (event) => {
    const code = event?.code ?? 0;
    if (code < 4400 || code > 4499 || ended !== null) return;
    const said = event?.reason ?? "";
    const reason = said === "" ? "The server refused the last edit. Reload the page." : said;
    const reopen = provider.synced;
    const end = (refused: Refused): void => {
      ended = refused;
      tell();
    };
    if (code === SIGN_IN) end({ reason, copy: null, reopen: false });
    else {
      const copy = Y.encodeStateAsUpdate(doc);
      // What was refused once would be refused at every return.
      kept
        .drop()
        .catch(() => undefined)
        .finally(() => end({ reason, copy, reopen }));
    }
    provider.disconnect();
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
    refused: () => ended ?? where.after ?? null,
    isReadOnly: () => isReadOnly,
    close: () => {
      listeners.clear();
      provider.destroy();
      kept.close();
      doc.destroy();
    },
  };
}
