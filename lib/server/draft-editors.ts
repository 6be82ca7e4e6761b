import * as Y from "yjs";
import type { TransactionClient } from "../database/client";
import { CIRCUIT_TYPES } from "../document/shape";

/** A change that began before a freeze may be stored after it: longer than any transaction that stores one. */
const STRADDLE_MS = 10_000;

/**
 * Who edited the circuit of a draft since a moment (null: ever). Found by replaying the stored changes:
 * whoever only wrote findings is no author. Changes that a snapshot has swallowed are told by
 * `DraftEditor`; there, whoever wrote anything counts, which errs on the safe side.
 */
export async function draftEditors(
  transaction: TransactionClient,
  design: string,
  since: Date | null,
): Promise<ReadonlySet<string>> {
  const from = since === null ? null : new Date(since.getTime() - STRADDLE_MS);
  const snapshot = await transaction.documentSnapshot.findUnique({ where: { designId: design } });
  const rows = await transaction.documentUpdate.findMany({
    where: { designId: design },
    orderBy: { seq: "asc" },
  });
  const folded = await transaction.draftEditor.findMany({
    where: { designId: design, ...(from !== null && { lastAt: { gt: from } }) },
  });
  const editors = new Set(folded.map((editor) => editor.userId));
  const doc = new Y.Doc();
  let touched = false;
  doc.on("afterTransaction", (change: Y.Transaction) => {
    for (const type of change.changed.keys()) touched ||= isCircuit(type);
  });
  if (snapshot !== null) Y.applyUpdate(doc, new Uint8Array(snapshot.bytes));
  for (const row of rows) {
    touched = false;
    Y.applyUpdate(doc, new Uint8Array(row.bytes));
    if (touched && row.author !== null && (from === null || row.at > from)) editors.add(row.author);
  }
  doc.destroy();
  return editors;
}

/** Whether a changed type stands in the circuit, at any depth. */
function isCircuit(type: unknown): boolean {
  let at = type;
  while (at instanceof Y.AbstractType) {
    const holder: Y.Item | null = at._item;
    if (holder === null) {
      const key = Y.findRootTypeKey(at);
      return CIRCUIT_TYPES.some((name) => name === key);
    }
    at = holder.parent;
  }
  return false;
}
