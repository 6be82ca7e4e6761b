import * as Y from "yjs";
import { database, type TransactionClient } from "../database/client";
import { loadDocument } from "../database/document-store";

/** A design's shared document as it is stored now; the caller destroys it. null: there is no such design. */
export async function storedDocument(
  design: string,
  client: TransactionClient = database(),
): Promise<Y.Doc | null> {
  const kept = await loadDocument(client, design);
  if (kept === null) return null;
  const doc = new Y.Doc();
  if (kept.snapshot !== null) Y.applyUpdate(doc, kept.snapshot);
  for (const { bytes } of kept.updates) Y.applyUpdate(doc, bytes);
  return doc;
}
