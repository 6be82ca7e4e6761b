import { cpSync, mkdirSync, mkdtempSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { Client } from "pg";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { migrate } from "../../lib/database/migrate";
import { type FreshDatabase, freshDatabase } from "../fresh-database";

let database: FreshDatabase;
let folder: string;

beforeAll(async () => {
  database = await freshDatabase();
  folder = mkdtempSync(join(tmpdir(), "ampersign-migrations-"));
  cpSync("prisma/migrations", folder, { recursive: true });
});

afterAll(async () => {
  rmSync(folder, { recursive: true, force: true });
  await database.drop();
});

function write(name: string, sql: string): void {
  mkdirSync(join(folder, name), { recursive: true });
  writeFileSync(join(folder, name, "migration.sql"), sql);
}

async function tableExists(name: string): Promise<boolean> {
  const client = new Client({ connectionString: database.url });
  await client.connect();
  const { rows } = await client.query<{ found: boolean }>(
    "select to_regclass($1) is not null as found",
    [name],
  );
  await client.end();
  return rows[0]?.found === true;
}

describe("bringing a database up to date", () => {
  it("applies nothing twice", async () => {
    expect(await migrate(database.url, folder)).toEqual({ ok: true, value: [] });
  });

  it("applies a new file once when several servers start together", async () => {
    write("99990101000000-first", "create table first_extra (id int primary key);");
    const answers = await Promise.all([1, 2, 3].map(() => migrate(database.url, folder)));
    expect(answers.flatMap((answer) => (answer.ok ? answer.value : ["failed"]))).toEqual([
      "99990101000000-first",
    ]);
  });

  it("leaves nothing of a file that fails half way", async () => {
    write("99990102000000-second", "create table half (id int); select 1 / 0;");
    expect(await migrate(database.url, folder)).toEqual({
      ok: false,
      error: {
        kind: "refusedMigration",
        name: "99990102000000-second",
        reason: "division by zero",
      },
    });
    expect(await tableExists("half")).toBe(false);
    expect(await tableExists("first_extra")).toBe(true);
    rmSync(join(folder, "99990102000000-second"), { recursive: true });
  });

  it("refuses a file that was edited after it was applied", async () => {
    write("99990101000000-first", "create table first_extra (id bigint primary key);");
    expect(await migrate(database.url, folder)).toEqual({
      ok: false,
      error: { kind: "changedMigration", name: "99990101000000-first" },
    });
  });

  it("refuses a database that belongs to a newer program", async () => {
    rmSync(join(folder, "99990101000000-first"), { recursive: true });
    expect(await migrate(database.url, folder)).toEqual({
      ok: false,
      error: { kind: "newerDatabase", name: "99990101000000-first" },
    });
  });
});
