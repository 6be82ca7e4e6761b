import * as Y from "yjs";
import { syncMessage } from "../document/wire";
import { CLOSE } from "./document-caps";
import type { DocumentStore, NewUpdate } from "./document-store";

/** One who is in a room. */
export interface Occupant {
  send(message: Uint8Array): void;
  end(code: number, reason: string): void;
}

type Queued =
  | { readonly kind: "row"; readonly row: NewUpdate; readonly stored: (seq: number) => void }
  | { readonly kind: "after"; readonly run: () => void };

/** Rows after which the log is folded into a snapshot. */
const ROWS_TO_SNAPSHOT = 500;

/**
 * One design's document as this process holds it, and who has it open. What is applied is queued, and
 * sent on only when it is stored: nobody ever holds a change that could be lost.
 */
export class DocumentRoom {
  readonly occupants = new Set<Occupant>();
  lastSeq = 0;
  private readonly held = new Set<number>();
  private readonly foreign = new Set<number>();
  private queue: Queued[] = [];
  private working = false;
  private closed = false;
  private gap = false;

  private constructor(
    readonly designId: string,
    private readonly store: DocumentStore,
    readonly doc: Y.Doc,
    private readonly onClosed: () => void,
  ) {}

  /** Loads a document; null: there is no such design. Throws where the store does not answer. */
  static async open(
    designId: string,
    store: DocumentStore,
    onClosed: () => void,
  ): Promise<DocumentRoom | null> {
    const stored = await store.load(designId);
    if (stored === null) return null;
    const room = new DocumentRoom(designId, store, new Y.Doc(), onClosed);
    room.read(stored.snapshot, stored.updates);
    return room;
  }

  /**
   * Applies an inspected update and stores it. `stored` runs after the commit, when all others have it.
   * Throws where it cannot stand by itself; it is not stored then, and the room has to be closed.
   */
  take(row: NewUpdate, stored: (seq: number) => void): void {
    Y.applyUpdate(this.doc, row.bytes);
    if (!isWhole(this.doc)) throw new Error("The update builds on what is not here.");
    this.push({ kind: "row", row, stored });
  }

  /** Runs when everything taken so far is stored. */
  afterStored(run: () => void): void {
    this.push({ kind: "after", run });
  }

  /** Another process, or a command, has stored a row. */
  hear(seq: number): void {
    this.foreign.add(seq);
    this.start();
  }

  leave(occupant: Occupant): void {
    this.occupants.delete(occupant);
    if (this.occupants.size === 0 && !this.working) this.close(CLOSE.comeBack, "");
  }

  close(code: number, reason: string): void {
    if (this.closed) return;
    this.closed = true;
    this.queue = [];
    this.onClosed();
    for (const occupant of this.occupants) occupant.end(code, reason);
    this.doc.destroy();
  }

  private push(queued: Queued): void {
    this.queue.push(queued);
    this.start();
  }

  private start(): void {
    if (this.working || this.closed) return;
    this.working = true;
    this.work().catch(() => this.close(CLOSE.notStored, "Not stored. Trying again."));
  }

  /** One commit at a time; what arrives meanwhile joins the next. */
  private async work(): Promise<void> {
    while (!this.closed && (this.gap || this.queue.length > 0 || this.foreign.size > 0)) {
      const batch = this.queue;
      this.queue = [];
      await this.storeBatch(batch);
      await this.readForeign();
      // What made the room close may be in its copy: it must not get into a snapshot.
      if (this.closed) return;
      if (this.held.size >= ROWS_TO_SNAPSHOT && this.queue.length === 0) await this.fold();
    }
    this.working = false;
    if (this.occupants.size === 0) this.close(CLOSE.comeBack, "");
  }

  private async storeBatch(batch: readonly Queued[]): Promise<void> {
    const rows = batch.flatMap((queued) => (queued.kind === "row" ? [queued.row] : []));
    const seqs = rows.length === 0 ? [] : await this.store.append(this.designId, rows);
    if (seqs.length !== rows.length) throw new Error("Rows without numbers.");
    for (const seq of seqs) this.note(seq);
    if (this.closed) return;
    this.sendOn(rows.map((row) => row.bytes));
    const numbers = [...seqs];
    for (const queued of batch)
      if (queued.kind === "row") queued.stored(numbers.shift() ?? this.lastSeq);
      else queued.run();
  }

  private async readForeign(): Promise<void> {
    if (this.gap) {
      this.gap = false;
      await this.reread();
    }
    for (const seq of [...this.foreign]) {
      this.foreign.delete(seq);
      if (this.held.has(seq)) continue;
      const row = await this.store.row(this.designId, seq);
      if (row !== null) Y.applyUpdate(this.doc, row.bytes);
      // Rows are not heard of in the order of what they build on; the whole of them stands together.
      if (row === null || !isWhole(this.doc)) await this.reread();
      else {
        this.note(seq);
        this.sendOn([row.bytes]);
      }
    }
  }

  /** Rows may have been missed: reads all of them again. */
  hearGap(): void {
    this.gap = true;
    this.start();
  }

  private async reread(): Promise<void> {
    const stored = await this.store.load(this.designId);
    if (stored === null) throw new Error("The design is gone.");
    this.read(stored.snapshot, stored.updates);
    this.sendOn([
      ...(stored.snapshot === null ? [] : [stored.snapshot]),
      ...stored.updates.map((row) => row.bytes),
    ]);
  }

  private read(
    snapshot: Uint8Array | null,
    updates: readonly { readonly seq: number; readonly bytes: Uint8Array }[],
  ): void {
    this.doc.transact(() => {
      if (snapshot !== null) Y.applyUpdate(this.doc, snapshot);
      for (const { bytes } of updates) Y.applyUpdate(this.doc, bytes);
    });
    for (const { seq } of updates) this.note(seq);
    if (!isWhole(this.doc)) throw new Error("The stored document has gaps.");
  }

  private async fold(): Promise<void> {
    const rows = [...this.held];
    const state = Y.encodeStateAsUpdate(this.doc);
    // Where another process was faster, its snapshot is read, and what is still in the log is what this one holds.
    if (!(await this.store.snapshot(this.designId, state, rows))) this.gap = true;
    for (const seq of rows) this.held.delete(seq);
  }

  private note(seq: number): void {
    this.held.add(seq);
    this.foreign.delete(seq);
    this.lastSeq = Math.max(this.lastSeq, seq);
  }

  private sendOn(updates: readonly Uint8Array[]): void {
    if (updates.length === 0) return;
    const message = syncMessage(2, Y.mergeUpdates([...updates]));
    for (const occupant of this.occupants) occupant.send(message);
  }
}

/** Whether nothing waits for something that is not there. */
function isWhole(doc: Y.Doc): boolean {
  return doc.store.pendingStructs === null && doc.store.pendingDs === null;
}
