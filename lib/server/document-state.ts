import * as Y from "yjs";
import { database, databaseUrl } from "../database/client";
import { PostgresDocumentStore } from "../database/document-store";

/** A design's shared document as it is stored now; the caller destroys it. null: there is no such design. */
export async function storedDocument(design: string): Promise<Y.Doc | null> {
  const store = new PostgresDocumentStore(database(), databaseUrl());
  const kept = await store.load(design);
  if (kept === null) return null;
  const doc = new Y.Doc();
  if (kept.snapshot !== null) Y.applyUpdate(doc, kept.snapshot);
  for (const { bytes } of kept.updates) Y.applyUpdate(doc, bytes);
  return doc;
}
