import { createHash, randomUUID } from "node:crypto";
import { readdirSync, readFileSync } from "node:fs";
import { join } from "node:path";
import { Client } from "pg";
import { fail, ok, type Result } from "../values/result";

/** Why a database was left as it was. */
export type MigrationFailure =
  /** An applied file was edited afterwards. */
  | { readonly kind: "changedMigration"; readonly name: string }
  /** The database holds a migration that this program does not know: it belongs to a newer one. */
  | { readonly kind: "newerDatabase"; readonly name: string }
  | { readonly kind: "refusedMigration"; readonly name: string; readonly reason: string };

interface Migration {
  readonly name: string;
  readonly sql: string;
  /** SHA-256, hexadecimal, of the file: as Prisma writes it */
  readonly checksum: string;
}

/** Any fixed number: two servers that start together take turns. */
const LOCK = 7_263_518;

/** Prisma's own table, so that its tools read the history that we write. */
const HISTORY = `create table if not exists _prisma_migrations (
  id varchar(36) primary key, checksum varchar(64) not null, finished_at timestamptz,
  migration_name varchar(255) not null, logs text, rolled_back_at timestamptz,
  started_at timestamptz not null default now(), applied_steps_count integer not null default 0)`;

/**
 * Brings a database up to date: each file of `prisma/migrations` once, in order of name, each in a transaction of its own.
 * @returns the names of those applied now
 */
export async function migrate(
  url: string,
  folder = "prisma/migrations",
): Promise<Result<readonly string[], MigrationFailure>> {
  const client = new Client({ connectionString: url });
  await client.connect();
  try {
    await client.query("select pg_advisory_lock($1)", [LOCK]);
    await client.query(HISTORY);
    return await applyMissing(client, readMigrations(folder));
  } finally {
    await client.end();
  }
}

/** The migrations of a folder, oldest first. @internal to this file and to .ci/new-migration.ts */
export function readMigrations(folder: string): readonly Migration[] {
  return readdirSync(folder, { withFileTypes: true })
    .filter((entry) => entry.isDirectory())
    .map((entry) => entry.name)
    .sort()
    .map((name) => {
      const sql = readFileSync(join(folder, name, "migration.sql"), "utf8");
      return { name, sql, checksum: createHash("sha256").update(sql).digest("hex") };
    });
}

async function applyMissing(
  client: Client,
  known: readonly Migration[],
): Promise<Result<readonly string[], MigrationFailure>> {
  const { rows } = await client.query<{ migration_name: string; checksum: string }>(
    "select migration_name, checksum from _prisma_migrations where finished_at is not null and rolled_back_at is null",
  );
  const applied = new Map(rows.map((row) => [row.migration_name, row.checksum]));
  for (const name of applied.keys()) {
    if (!known.some((migration) => migration.name === name))
      return fail({ kind: "newerDatabase", name });
  }
  const done: string[] = [];
  for (const migration of known) {
    const checksum = applied.get(migration.name);
    if (checksum === migration.checksum) continue;
    if (checksum !== undefined) return fail({ kind: "changedMigration", name: migration.name });
    const refused = await apply(client, migration);
    if (refused !== null) return fail(refused);
    done.push(migration.name);
  }
  return ok(done);
}

async function apply(client: Client, migration: Migration): Promise<MigrationFailure | null> {
  const { name, sql, checksum } = migration;
  await client.query("begin");
  try {
    await client.query(sql);
    await client.query(
      `insert into _prisma_migrations (id, checksum, migration_name, finished_at, applied_steps_count)
       values ($1, $2, $3, now(), 1)`,
      [randomUUID(), checksum, name],
    );
    await client.query("commit");
    return null;
  } catch (error) {
    await client.query("rollback");
    const reason = error instanceof Error ? error.message : String(error);
    return { kind: "refusedMigration", name, reason };
  }
}
