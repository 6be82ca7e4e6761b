import * as Y from "yjs";
import type { Decision } from "../review/review-state";
import { topLevel } from "./shape";

/**
 * A self-contained update that puts one decision into `decisions`: its key is new, so it needs
 * nothing of the document it goes into. A server command stores it in its own transaction.
 */
export function decisionUpdate(decision: Decision): Uint8Array {
  const doc = new Y.Doc();
  topLevel(doc, "decisions").set(decision.id, { ...decision });
  const update = Y.encodeStateAsUpdate(doc);
  doc.destroy();
  return update;
}
