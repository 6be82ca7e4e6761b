import { Client } from "pg";
import type { PrismaClient, TransactionClient } from "./client";

/** The channel on which a stored change's number is told: `DESIGN SEQ`. */
export const DOCUMENT_CHANNEL = "document";

interface StoredUpdate {
  readonly seq: number;
  readonly bytes: Uint8Array;
}

/** A snapshot, if there is one, and the changes that it does not hold. */
interface StoredDocument {
  readonly snapshot: Uint8Array | null;
  readonly updates: readonly StoredUpdate[];
}

/** Reads a document, in one view: rows that a snapshot takes the place of are gone when the snapshot is there. */
export async function loadDocument(
  client: TransactionClient,
  designId: string,
): Promise<StoredDocument | null> {
  const design = await client.design.findUnique({
    where: { id: designId },
    select: {
      snapshot: { select: { bytes: true } },
      updates: { orderBy: { seq: "asc" }, select: { seq: true, bytes: true } },
    },
  });
  if (design === null) return null;
  return {
    snapshot: design.snapshot === null ? null : new Uint8Array(design.snapshot.bytes),
    updates: design.updates.map(stored),
  };
}

/**
 * The shared documents in Postgres: a log of changes for each design, older ones put together in a
 * snapshot. Throws where the database does not answer: a failed load must never look like an empty
 * document.
 */
export class PostgresDocumentStore {
  constructor(
    private readonly client: PrismaClient,
    private readonly url: string,
  ) {}

  /** The stored document; null: there is no such design. */
  load(designId: string): Promise<StoredDocument | null> {
    return loadDocument(this.client, designId);
  }

  /** Stores changes in one statement and tells every process; resolves after the commit, with their numbers in order. */
  async append(
    designId: string,
    rows: readonly { readonly bytes: Uint8Array; readonly author: string }[],
  ): Promise<readonly number[]> {
    return this.client.$transaction(async (transaction) => {
      const added = await transaction.documentUpdate.createManyAndReturn({
        data: rows.map((row) => ({
          designId,
          bytes: new Uint8Array(row.bytes),
          author: row.author,
        })),
        select: { seq: true },
      });
      for (const { seq } of added)
        await transaction.$executeRaw`select pg_notify(${DOCUMENT_CHANNEL}, ${`${designId} ${seq}`})`;
      return added.map(({ seq }) => Number(seq));
    });
  }

  /** One change; null: it is in a snapshot by now. */
  async row(designId: string, seq: number): Promise<StoredUpdate | null> {
    const found = await this.client.documentUpdate.findUnique({
      where: { designId_seq: { designId, seq: BigInt(seq) } },
      select: { seq: true, bytes: true },
    });
    return found === null ? null : stored(found);
  }

  /**
   * Puts a snapshot in the place of the changes that it holds. false, and nothing is written: another process has
   * folded some of them meanwhile, and its snapshot may hold what this one does not.
   */
  async snapshot(designId: string, bytes: Uint8Array, held: readonly number[]): Promise<boolean> {
    const data = { bytes: new Uint8Array(bytes), at: new Date() };
    return this.client.$transaction(async (transaction) => {
      // One fold of a design at a time: the second one sees what the first has taken.
      await transaction.$executeRaw`select 1 from "Design" where id = ${designId} for no key update`;
      const rows = { designId, seq: { in: held.map(BigInt) } };
      if ((await transaction.documentUpdate.count({ where: rows })) !== held.length) return false;
      const writers = await transaction.documentUpdate.groupBy({
        by: ["author"],
        where: { ...rows, author: { not: null } },
        _max: { at: true },
      });
      for (const { author, _max } of writers) {
        if (author === null) continue;
        const lastAt = _max.at ?? data.at;
        await transaction.draftEditor.upsert({
          where: { designId_userId: { designId, userId: author } },
          create: { designId, userId: author, lastAt },
          update: { lastAt },
        });
      }
      await transaction.documentSnapshot.upsert({
        where: { designId },
        create: { designId, ...data },
        update: data,
      });
      await transaction.documentUpdate.deleteMany({ where: rows });
      return true;
    });
  }

  /** Whether the user is, or hereby becomes, the owner of a client id: its first user owns it. */
  async claimClientId(designId: string, clientId: number, userId: string): Promise<boolean> {
    const key = { designId, clientId: BigInt(clientId) };
    await this.client.documentClientId.createMany({
      data: [{ ...key, userId }],
      skipDuplicates: true,
    });
    const row = await this.client.documentClientId.findUniqueOrThrow({
      where: { designId_clientId: key },
    });
    return row.userId === userId;
  }

  /** Hears of changes that any process stores. After the line was lost it is made anew, and `onGap` is called. */
  async listen(
    onRow: (designId: string, seq: number) => void,
    onGap: () => void,
  ): Promise<{ stop(): Promise<void> }> {
    let stopped = false;
    const open = async (): Promise<Client> => {
      const opened = new Client({ connectionString: this.url });
      opened.on("notification", ({ payload }) => {
        const [design, seq] = (payload ?? "").split(" ");
        if (design !== undefined && seq !== undefined) onRow(design, Number(seq));
      });
      opened.on("error", reopen);
      await opened.connect();
      await opened.query(`listen ${DOCUMENT_CHANNEL}`);
      return opened;
    };
    const reopen = (): void => {
      if (stopped) return;
      open().then(
        (opened) => {
          client = opened;
          onGap();
        },
        () => setTimeout(reopen, REOPEN_MS),
      );
    };
    let client = await open();
    return {
      stop: async () => {
        stopped = true;
        await client.end();
      },
    };
  }
}

const REOPEN_MS = 500;

function stored(row: { readonly seq: bigint; readonly bytes: Uint8Array }): StoredUpdate {
  return { seq: Number(row.seq), bytes: new Uint8Array(row.bytes) };
}
