import type { WebSocket } from "ws";
import * as Y from "yjs";
import { inspect, type Refusal } from "../document/guard";
import { objectOf } from "../document/plain";
import {
  type PageMessage,
  type PresenceEntry,
  presenceMessage,
  readMessage,
  savedMessage,
  syncMessage,
} from "../document/wire";
import type { Role } from "../review/review-state";
import { Allowance, CAPS, CLOSE } from "./document-caps";
import type { DocumentRoom, Occupant } from "./document-room";
import type { DocumentStore, SignedIn } from "./document-store";

const CLOSE_OF: Readonly<Record<Exclude<Refusal["kind"], "unclaimed">, number>> = {
  malformed: CLOSE.malformed,
  missing: CLOSE.comeBack,
  forbidden: CLOSE.refused,
  tooLarge: CLOSE.refused,
};

/** Owns the client ids of edits that the server makes; no person has this id. */
const SERVER = "";

/** One page's socket in a room: reads, caps and judges what it sends, in the order it was sent. */
export class DocumentConnection implements Occupant {
  /** What the page last showed of itself. */
  presence: PresenceEntry | null = null;
  private readonly owned = new Map<number, boolean>();
  private readonly frames: Allowance;
  private readonly presences: Allowance;
  private readonly stateRequests: Allowance;
  private sequence: Promise<void> = Promise.resolve();
  private documentFrames = 0;
  private savedFrames = 0;
  private ended = false;

  constructor(
    private readonly socket: WebSocket,
    private readonly room: DocumentRoom,
    private readonly store: DocumentStore,
    readonly person: SignedIn,
    public roles: readonly Role[],
    private readonly now: () => number,
  ) {
    this.frames = new Allowance(CAPS.frames, now());
    this.presences = new Allowance(CAPS.presence, now());
    this.stateRequests = new Allowance(CAPS.stateRequests, now());
  }

  /** Joins the room, and asks the page for what only it has. */
  join(): void {
    this.room.occupants.add(this);
    const stateVector = Y.encodeStateVector(this.room.doc);
    this.room.afterStored(() => this.send(syncMessage(0, stateVector)));
    const here = this.others().flatMap(({ presence }) => (presence === null ? [] : [presence]));
    if (here.length > 0) this.send(presenceMessage(here));
  }

  /** Leaves the room, and takes its presence off the others' pages. */
  leave(): void {
    this.ended = true;
    const gone = this.presence;
    if (gone !== null) {
      const last = presenceMessage([{ ...gone, clock: gone.clock + 1, state: "null" }]);
      for (const other of this.others()) other.send(last);
    }
    this.room.leave(this);
  }

  receive(bytes: Uint8Array): void {
    if (this.ended || isLargePresence(bytes)) return;
    const message = readMessage(bytes);
    if (message === null) this.end(CLOSE.malformed, "Not a message of this protocol.");
    else if (message.kind === "presence") this.show(message.entries);
    else if (!this.mayGoOn(message)) this.end(CLOSE.tooMany, "Too many messages. Wait a moment.");
    else
      this.sequence = this.sequence
        .then(() => this.handle(message))
        .catch(() => this.end(CLOSE.notStored, "The server could not go on. Trying again."));
  }

  private mayGoOn(message: PageMessage): boolean {
    const now = this.now();
    if (!this.frames.take(now)) return false;
    return message.kind !== "stateRequest" || this.stateRequests.take(now);
  }

  send(message: Uint8Array): void {
    if (this.ended) return;
    if (this.socket.bufferedAmount > CAPS.unsentBytes)
      this.end(CLOSE.tooSlow, "The line is too slow.");
    else this.socket.send(message);
  }

  end(code: number, reason: string): void {
    if (this.ended) return;
    this.ended = true;
    this.socket.close(code, reason);
  }

  /** Says again how much is stored: a page gives up a line that is silent for 30 s. */
  repeatSaved(): void {
    this.send(savedMessage(this.savedFrames, this.room.lastSeq));
  }

  private async handle(message: Exclude<PageMessage, { kind: "presence" }>): Promise<void> {
    if (this.ended) return;
    if (message.kind === "update") return this.takeUpdate(message.update);
    const reply = Y.encodeStateAsUpdate(this.room.doc, message.stateVector);
    this.room.afterStored(() => this.send(syncMessage(1, reply)));
  }

  private async takeUpdate(update: Uint8Array): Promise<void> {
    const { room, person } = this;
    for (;;) {
      const judged = inspect(room.doc, update, {
        user: person.userId,
        roles: this.roles,
        owns: (clientId) => this.owned.get(clientId) ?? null,
      });
      if (judged.ok) break;
      const refusal = judged.error;
      if (refusal.kind !== "unclaimed")
        return this.end(CLOSE_OF[refusal.kind], `Refused: ${refusal.why}.`);
      for (const clientId of refusal.clientIds) await this.claim(clientId);
      if (this.ended) return;
    }
    this.documentFrames += 1;
    const frames = this.documentFrames;
    if (isEmpty(update)) return room.afterStored(() => this.saved(frames, room.lastSeq));
    try {
      room.take({ bytes: update, author: person.userId }, (seq) => this.saved(frames, seq));
    } catch {
      room.close(CLOSE.comeBack, "The document is read again.");
    }
  }

  /**
   * Whether a client id is, or hereby becomes, this person's. An owner is noted before the first edit is stored: edits
   * that are there without one are the server's own, and nobody goes on under that id.
   */
  private async claim(clientId: number): Promise<boolean> {
    const known = this.owned.get(clientId);
    if (known !== undefined) return known;
    const { store, room, person } = this;
    const isWritten = Y.getState(room.doc.store, clientId) > 0;
    const isServers = isWritten && (await store.claimClientId(room.designId, clientId, SERVER));
    const owned = !isServers && (await store.claimClientId(room.designId, clientId, person.userId));
    this.owned.set(clientId, owned);
    return owned;
  }

  private saved(frames: number, seq: number): void {
    this.savedFrames = frames;
    this.send(savedMessage(frames, seq));
  }

  /** Pages repeat what they hear of others; only a page's own entry counts, under the own name. */
  private show(entries: readonly PresenceEntry[]): void {
    this.sequence = this.sequence
      .then(() => this.showOwn(entries))
      .catch(() => this.end(CLOSE.notStored, "The server could not go on. Trying again."));
  }

  private async showOwn(entries: readonly PresenceEntry[]): Promise<void> {
    const own = entries.find((entry) => entry.clientId === (this.presence ?? entry).clientId);
    if (own === undefined || !showsOnly(own, this.person.userId)) return;
    if (!this.presences.take(this.now()) || !(await this.claim(own.clientId)) || this.ended) return;
    this.presence = own;
    for (const other of this.others()) other.send(presenceMessage([own]));
  }

  private others(): readonly DocumentConnection[] {
    return [...this.room.occupants].flatMap((occupant) =>
      occupant instanceof DocumentConnection && occupant !== this ? [occupant] : [],
    );
  }
}

/** Whether it is of the presence's type, 1, and over its cap: such is passed over unread. */
function isLargePresence(bytes: Uint8Array): boolean {
  return bytes.length > CAPS.presenceBytes && ((bytes[0] ?? 0) & 127) === 1;
}

/** Whether an entry tells of nobody but this person. */
function showsOnly(entry: PresenceEntry, userId: string): boolean {
  const shown = objectOf(JSON.parse(entry.state))?.["person"];
  return shown === undefined || objectOf(shown)?.["id"] === userId;
}

/** No structs, nothing deleted: a page that has nothing new says so in two bytes. */
function isEmpty(update: Uint8Array): boolean {
  return update.length === 2 && update[0] === 0 && update[1] === 0;
}
