import { once } from "node:events";
import * as decoding from "lib0/decoding";
import { WebSocket } from "ws";
import * as Y from "yjs";
import { topLevel } from "../../lib/document/shape";
import { SAVED, syncMessage } from "../../lib/document/wire";

/** A page as the server sees it: asks, answers, sends each of its edits as a frame, and counts what is stored. */
export class PageLine {
  readonly closed: Promise<{ readonly code: number; readonly reason: string }>;
  /** Document frames that the server says are stored. */
  saved = 0;
  /** Messages heard, by their type. */
  readonly heard = new Map<number, number>();
  readonly socket: WebSocket;
  private readonly waiting = new Set<() => void>();
  private frames = 0;

  /**
   * @param url with the design's id
   * @param user name and role, as `ann designer`; null: nobody
   * @param doc with what the page has kept from earlier lines
   */
  constructor(
    url: string,
    private readonly user: string | null,
    readonly doc: Y.Doc = new Y.Doc(),
  ) {
    this.socket = new WebSocket(url, { headers: user === null ? {} : { "x-user": user } });
    this.closed = once(this.socket, "close").then(([code, reason]: unknown[]) => {
      doc.off("update", this.own);
      this.look();
      return { code: Number(code), reason: String(reason) };
    });
    // A server that is killed cuts the line off: whoever waits hears of it by `closed`.
    this.socket.on("error", () => undefined);
    this.socket.on("open", () => this.send(syncMessage(0, Y.encodeStateVector(doc))));
    this.socket.on("message", (data: Buffer) => this.hear(new Uint8Array(data)));
    doc.on("update", this.own);
  }

  /** Number of document frames sent so far. */
  get sent(): number {
    return this.frames;
  }

  /** Sends a document frame or anything else, well made or not. */
  send(message: Uint8Array): void {
    if (this.socket.readyState !== WebSocket.OPEN) return;
    if (message[0] === 0 && message[1] !== 0) this.frames += 1;
    this.socket.send(message);
  }

  /** Resolves when something holds; looks after each message. Rejects when the line ends before. */
  until(holds: (line: this) => boolean): Promise<void> {
    return new Promise((resolve, reject) => {
      const look = () => {
        if (holds(this)) resolve();
        else if (this.socket.readyState === WebSocket.CLOSED)
          reject(new Error(`The line of ${this.user} ended before.`));
        else return;
        this.waiting.delete(look);
      };
      this.waiting.add(look);
      look();
    });
  }

  /** Resolves when the document is here and all that this page had is stored. */
  ready(): Promise<void> {
    return this.until(() => (this.heard.get(0) ?? 0) >= 2 && this.saved >= 1);
  }

  /** Resolves when all that was sent is stored. */
  allSaved(): Promise<void> {
    return this.until(() => this.frames > 0 && this.saved === this.frames);
  }

  draw(id: string, kind = "resistor"): void {
    this.doc.transact(() => topLevel(this.doc, "parts").set(id, new Y.Map([["kind", kind]])));
  }

  has(id: string): boolean {
    return topLevel(this.doc, "parts").has(id);
  }

  async close(): Promise<void> {
    this.socket.close();
    await this.closed;
  }

  private readonly own = (update: Uint8Array, origin: unknown): void => {
    // Before the server has asked, its answer brings all of it.
    if (origin !== this && this.frames > 0) this.send(syncMessage(2, update));
  };

  private hear(bytes: Uint8Array): void {
    const decoder = decoding.createDecoder(bytes);
    const type = decoding.readVarUint(decoder);
    this.heard.set(type, (this.heard.get(type) ?? 0) + 1);
    if (type === SAVED) this.saved = decoding.readVarUint(decoder);
    if (type === 0) {
      const step = decoding.readVarUint(decoder);
      const payload = decoding.readVarUint8Array(decoder);
      if (step === 0) this.send(syncMessage(1, Y.encodeStateAsUpdate(this.doc, payload)));
      else Y.applyUpdate(this.doc, payload, this);
    }
    this.look();
  }

  private look(): void {
    for (const run of [...this.waiting]) run();
  }
}
