import type { IncomingMessage } from "node:http";
import type { Role } from "../review/review-state";

/** A stored update of a design's shared document. `seq` rises within a design; its order is not the order of commits. */
export interface StoredUpdate {
  readonly seq: number;
  readonly bytes: Uint8Array;
}

/** An update to store. `author` is a user id. */
export interface NewUpdate {
  readonly bytes: Uint8Array;
  readonly author: string;
}

/** What a document is rebuilt from: the snapshot, if any, then the updates it does not hold. */
export interface StoredDocument {
  readonly snapshot: Uint8Array | null;
  readonly updates: readonly StoredUpdate[];
}

/**
 * Where shared documents are kept. Every function throws when the database does not answer: a failed
 * load must never be taken for an empty document.
 */
export interface DocumentStore {
  /** The stored document; null: there is no such design. */
  load(designId: string): Promise<StoredDocument | null>;
  /** Stores rows of one design in one statement; resolves after the commit, with their numbers in the order given. */
  append(designId: string, rows: readonly NewUpdate[]): Promise<readonly number[]>;
  /** One row that another process stored; null: it is in a snapshot by now. */
  row(designId: string, seq: number): Promise<StoredUpdate | null>;
  /** Replaces the rows that the snapshot holds, `held` by their numbers. false, and nothing is done: some are folded already. */
  snapshot(designId: string, bytes: Uint8Array, held: readonly number[]): Promise<boolean>;
  /** Whether the user is, or hereby becomes, the owner of a client id in a design: its first user owns it. */
  claimClientId(designId: string, clientId: number, userId: string): Promise<boolean>;
  /**
   * Hears of rows stored by any process, this one included. `onGap` says that some may have been
   * missed: whoever listens reads the document again.
   */
  listen(
    onRow: (designId: string, seq: number) => void,
    onGap: () => void,
  ): Promise<{ stop(): Promise<void> }>;
}

/** Who opened a socket. */
export interface SignedIn {
  readonly userId: string;
  readonly name: string;
}

/** Who is signed in, and what they may do. */
export interface Sessions {
  /** The person of an upgrade request; null: nobody is signed in. */
  authenticate(request: IncomingMessage): Promise<SignedIn | null>;
  /** The person's roles in a design now; null: it is not theirs to see. */
  rights(userId: string, designId: string): Promise<readonly Role[] | null>;
}
