import { IndexeddbPersistence, storeState } from "y-indexeddb";
import type * as Y from "yjs";

/** What the browser keeps of a design for one person, so that a reload loses no edit. */
export interface KeptEdits {
  /** Whether a change of the document comes from what was kept. */
  readonly isOrigin: (origin: unknown) => boolean;
  /** Resolves when the document has what was kept, with how many edits were not stored then; 0 where nothing can be kept. */
  readonly loaded: Promise<number>;
  /** Remembers how many edits are not stored, for the next reload. */
  readonly note: (unsaved: number) => void;
  /** Forgets all, and keeps nothing any more. Other pages of the person go on, and keep theirs again. */
  readonly drop: () => Promise<void>;
  readonly close: () => void;
}

const UNSAVED = "unsaved";

/** Keeps a design's document in IndexedDB. Another person at the same browser must not send these edits as their own. */
export function keepEdits(doc: Y.Doc, designId: string, userId: string): KeptEdits {
  const name = `design ${designId} of ${userId}`;
  const kept = new IndexeddbPersistence(name, doc);
  const others = new BroadcastChannel(name);
  // Pages share the store: after another has emptied it, what only this page has must be put back.
  others.onmessage = () => {
    storeState(kept).catch(() => undefined);
  };
  let open = true;
  const unsavedBefore = kept.get(UNSAVED).then(async (count: unknown) => {
    await kept.whenSynced;
    return typeof count === "number" ? count : 0;
  });
  const close = (): void => {
    if (!open) return;
    open = false;
    others.close();
    kept.destroy().catch(() => undefined);
  };
  return {
    isOrigin: (origin) => origin === kept,
    // A browser that keeps nothing, as some do in private windows, has nothing from before either.
    loaded: unsavedBefore.catch(() => 0),
    note: (unsaved) => {
      if (open) kept.set(UNSAVED, unsaved).catch(() => undefined);
    },
    drop: async () => {
      const count = await unsavedBefore.catch(() => null);
      if (count === null || kept.db === null || !open) return close();
      const emptied = empty(kept.db);
      others.postMessage("emptied");
      close();
      await emptied;
    },
    close,
  };
}

/** The database itself stays: to remove it would cut off the person's other pages. */
function empty(database: IDBDatabase): Promise<void> {
  const transaction = database.transaction(["updates", "custom"], "readwrite");
  for (const store of ["updates", "custom"]) transaction.objectStore(store).clear();
  return new Promise((resolve, reject) => {
    transaction.oncomplete = () => resolve();
    transaction.onabort = () => reject(transaction.error ?? new Error("Not emptied."));
  });
}
