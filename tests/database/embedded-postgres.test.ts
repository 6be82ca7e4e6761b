import { chmodSync, existsSync, mkdtempSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { Client } from "pg";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { startPostgres } from "../../lib/database/embedded-postgres";

let folder: string;

beforeAll(() => {
  folder = mkdtempSync(join(tmpdir(), "ampersign-embedded-"));
  chmodSync(folder, 0o755);
});

afterAll(() => rmSync(folder, { recursive: true, force: true }));

async function ask(url: string, sql: string): Promise<readonly Record<string, unknown>[]> {
  const client = new Client({ connectionString: url });
  await client.connect();
  const { rows } = await client.query(sql);
  await client.end();
  return rows;
}

describe("the database that comes with the program", () => {
  it("keeps what was stored, over a stop and a start", async () => {
    const first = await startPostgres(join(folder, "data"));
    await ask(first.url, "create table kept (word text)");
    await ask(first.url, "insert into kept values ('Ω')");
    await first.stop();
    expect(existsSync(join(folder, "data", "postmaster.pid"))).toBe(false);

    const second = await startPostgres(join(folder, "data"));
    expect(await ask(second.url, "select word from kept")).toEqual([{ word: "Ω" }]);
    await second.stop();
  });

  it("is shared by a second start on the same folder, which leaves it to the first", async () => {
    const first = await startPostgres(join(folder, "data"));
    const holder = new Client({ connectionString: first.url });
    await holder.connect();
    const second = await startPostgres(join(folder, "data"));
    expect(second.url).toBe(first.url);
    await second.stop();
    expect(await ask(first.url, "select 1 as still")).toEqual([{ still: 1 }]);
    await holder.end();
    await first.stop();
  });

  it("listens on this machine alone", async () => {
    const postgres = await startPostgres(join(folder, "data"));
    expect(await ask(postgres.url, "show listen_addresses")).toEqual([
      { listen_addresses: "127.0.0.1" },
    ]);
    await postgres.stop();
  });
});
