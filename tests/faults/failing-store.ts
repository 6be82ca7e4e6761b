import type { DocumentStore } from "../../lib/server/document-store";

/** What of a store may fail. */
export type Failure = "append" | "load" | "claimClientId" | "snapshot";

/** The given store, but its n-th call of a kind (from 0) throws, as when the database does not answer. */
export function failingStore(
  store: DocumentStore,
  failure: Failure,
  at: number,
): { readonly store: DocumentStore; readonly hasFailed: () => boolean } {
  let calls = 0;
  let failed = false;
  const pass = (kind: Failure): void => {
    if (kind !== failure) return;
    calls += 1;
    if (calls !== at + 1) return;
    failed = true;
    throw new Error("The database does not answer.");
  };
  return {
    hasFailed: () => failed,
    store: {
      load: async (...given) => {
        pass("load");
        return store.load(...given);
      },
      append: async (...given) => {
        pass("append");
        return store.append(...given);
      },
      row: (...given) => store.row(...given),
      snapshot: async (...given) => {
        pass("snapshot");
        return store.snapshot(...given);
      },
      claimClientId: async (...given) => {
        pass("claimClientId");
        return store.claimClientId(...given);
      },
      listen: (...given) => store.listen(...given),
    },
  };
}
