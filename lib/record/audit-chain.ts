import { digest } from "../circuit/digest";

/** One row of the append-only audit log, chained by hash to the one before. */
export interface AuditEntry {
  /** Running in the workspace from 1. */
  readonly seq: number;
  /** ISO 8601, UTC */
  readonly at: string;
  readonly actor: string;
  readonly action: string;
  readonly subject: string;
  readonly payload: unknown;
  /** Hash of the entry before; 64 zeros after `sha256:` for the first. */
  readonly previousHash: string;
  readonly hash: string;
}

export const FIRST_PREVIOUS_HASH = `sha256:${"0".repeat(64)}`;

/** SHA-256 over the RFC 8785 form of all fields but the hash itself. */
export function auditHash(entry: Omit<AuditEntry, "hash">): string {
  const { seq, at, actor, action, subject, payload, previousHash } = entry;
  return digest({ seq, at, actor, action, subject, payload, previousHash });
}

/** What breaks the chain first; null when it holds. Entries may start anywhere, but must be consecutive. */
export function auditChainFault(entries: readonly AuditEntry[]): string | null {
  let before: AuditEntry | null = null;
  for (const entry of entries) {
    if (auditHash(entry) !== entry.hash)
      return `audit entry ${entry.seq} does not have its own hash`;
    if (before !== null && entry.seq !== before.seq + 1)
      return `an audit entry is missing between ${before.seq} and ${entry.seq}`;
    if (before !== null && entry.previousHash !== before.hash)
      return `audit entry ${entry.seq} does not follow entry ${before.seq}`;
    if (entry.seq === 1 && entry.previousHash !== FIRST_PREVIOUS_HASH)
      return "the first audit entry names an entry before it";
    before = entry;
  }
  return null;
}
