/**
 * The way to the database. `lib/database/generated` is made by `node .ci/generate.mjs` from prisma/schema.prisma and is
 * not in git; migrations are written by `npx tsx .ci/new-migration.ts NAME`; a test gets a database of its own from `tests/fresh-database.ts`.
 */
import { PrismaPg } from "@prisma/adapter-pg";
import { type Prisma, PrismaClient } from "./generated/client";

export type { PrismaClient } from "./generated/client";

/** A client within a transaction: reads and writes together or not at all. */
export type TransactionClient = Prisma.TransactionClient;

declare global {
  // Next loads a module several times over; the connections have to stay the same.
  var ampersignDatabase: PrismaClient | undefined;
}

/** A client of its own, with a pool of its own, for one address; the caller disconnects it. */
export function connect(url: string): PrismaClient {
  return new PrismaClient({ adapter: new PrismaPg({ connectionString: url }) });
}

/** The address that the process was started with. */
export function databaseUrl(): string {
  const url = process.env["DATABASE_URL"];
  if (url === undefined || url === "")
    throw new Error("DATABASE_URL is not set: start with npm start.");
  return url;
}

/** The one client of this process, made at the first call. */
export function database(): PrismaClient {
  globalThis.ampersignDatabase ??= connect(databaseUrl());
  return globalThis.ampersignDatabase;
}
