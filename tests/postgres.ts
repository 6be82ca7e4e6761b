import { once } from "node:events";
import { chmodSync, mkdtempSync, rmSync } from "node:fs";
import { createServer } from "node:http";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { Client } from "pg";
import type { TestProject } from "vitest/node";
import { type RunningPostgres, startPostgres } from "../lib/database/embedded-postgres";
import { migrate } from "../lib/database/migrate";

declare module "vitest" {
  interface ProvidedContext {
    /** Address that starts Postgres at the first request and answers with the server's. */
    postgresDoor: string;
  }
}

/** Name of the migrated database that each test file's own is a copy of. */
export const TEMPLATE = "migrated";

/** One Postgres for the whole run, started when the first test file asks: the pure tests do not wait for it. */
export default async function offerPostgres(project: TestProject): Promise<() => Promise<void>> {
  const folder = mkdtempSync(join(tmpdir(), "ampersign-tests-"));
  chmodSync(folder, 0o755);
  let starting: Promise<RunningPostgres> | undefined;
  const door = createServer((_request, response) => {
    starting ??= startWithTemplate(join(folder, "postgres"));
    starting.then(
      ({ url }) => response.end(url),
      (error: unknown) => response.writeHead(500).end(String(error)),
    );
  }).listen(0, "127.0.0.1");
  await once(door, "listening");
  const address = door.address();
  if (address === null || typeof address === "string") throw new Error("No port is free.");
  project.provide("postgresDoor", `http://127.0.0.1:${address.port}/`);

  return async () => {
    door.close();
    const postgres = await starting?.catch(() => undefined);
    await postgres?.stop();
    rmSync(folder, { recursive: true, force: true });
  };
}

async function startWithTemplate(folder: string): Promise<RunningPostgres> {
  // Without fsync a power cut loses data, a killed process does not: enough for tests.
  const postgres = await startPostgres(folder, { fsync: "off", max_connections: "300" });
  const client = new Client({ connectionString: postgres.url });
  await client.connect();
  await client.query(`create database ${TEMPLATE}`);
  await client.end();
  const url = new URL(postgres.url);
  url.pathname = TEMPLATE;
  const migrated = await migrate(url.href);
  if (!migrated.ok) throw new Error(JSON.stringify(migrated.error));
  return postgres;
}
