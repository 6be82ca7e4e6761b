import { database, type TransactionClient } from "../database/client";
import { DOCUMENT_CHANNEL } from "../database/document-store";
import type { Prisma } from "../database/generated/client";
import { decisionUpdate } from "../document/decision-update";
import { auditHash, FIRST_PREVIOUS_HASH } from "../record/audit-chain";
import type { Decision } from "../review/review-state";

/** Appends an entry to a workspace's audit chain; the workspace's row is locked, so that entries come one by one. */
export async function appendAudit(
  transaction: TransactionClient,
  workspace: string,
  entry: {
    readonly at: string;
    readonly actor: string;
    readonly action: string;
    readonly subject: string;
    readonly payload: unknown;
  },
): Promise<void> {
  await transaction.$queryRaw`select id from "Workspace" where id = ${workspace} for no key update`;
  const last = await transaction.auditEntry.findFirst({
    where: { workspaceId: workspace },
    orderBy: { seq: "desc" },
    select: { seq: true, hash: true },
  });
  const chained = {
    ...entry,
    payload: toJson(entry.payload),
    seq: (last?.seq ?? 0) + 1,
    previousHash: last?.hash ?? FIRST_PREVIOUS_HASH,
  };
  await transaction.auditEntry.create({
    data: {
      workspaceId: workspace,
      ...chained,
      at: new Date(entry.at),
      hash: auditHash(chained),
    },
  });
}

/** Stores a decision, its audit entry and its mirror in the shared document, together or not at all. */
export async function storeDecision(
  transaction: TransactionClient,
  workspace: string,
  design: string,
  decision: Decision,
): Promise<void> {
  const { id, kind, user, at } = decision;
  await transaction.decision.create({
    data: { id, designId: design, kind, userId: user, at: new Date(at), payload: toJson(decision) },
  });
  await appendAudit(transaction, workspace, {
    at,
    actor: user,
    action: kind,
    subject: design,
    payload: decision,
  });
  const row = await transaction.documentUpdate.create({
    data: { designId: design, bytes: new Uint8Array(decisionUpdate(decision)), author: null },
    select: { seq: true },
  });
  // Told at commit, not before.
  await transaction.$executeRaw`select pg_notify(${DOCUMENT_CHANNEL}, ${`${design} ${row.seq}`})`;
}

/** Runs a change of the database as one transaction. */
export function inTransaction<T>(
  change: (transaction: TransactionClient) => Promise<T>,
): Promise<T> {
  return database().$transaction(change, { timeout: 20_000 });
}

/** The value as JSON alone: what was undefined is left out. */
function toJson(value: unknown): Prisma.InputJsonObject {
  const json: Prisma.InputJsonObject = JSON.parse(JSON.stringify(value));
  return json;
}
