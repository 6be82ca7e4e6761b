/** What `npm start` does once everything is built: database, server, worker, and their end in order. */
import type { ChildProcess } from "node:child_process";
import { randomBytes } from "node:crypto";
import { once } from "node:events";
import { existsSync, mkdirSync, readFileSync, writeFileSync } from "node:fs";
import { join, resolve } from "node:path";
import { setTimeout as pause } from "node:timers/promises";
import { type RunningPostgres, startPostgres } from "../database/embedded-postgres";
import { type MigrationFailure, migrate } from "../database/migrate";
import { isRunning, type Program, startProgram, stopProgram } from "./child-process";
import { demoPeople } from "./demo-people";

/** Doubles with each early end, so that a program that cannot run does not take the machine with it. */
const RESTART_AFTER_MS = 500;
const LONGEST_PAUSE_MS = 30_000;
const EARLY_MS = 60_000;

/** @returns the exit code, once everything has ended */
export async function supervise(given: {
  readonly development: boolean;
  readonly port: number;
}): Promise<number> {
  const folder = resolve(process.env["AMPERSIGN_DATA"] ?? ".data");
  mkdirSync(folder, { recursive: true, mode: 0o755 });
  const stopping = stopSignal();
  const postgres = await openDatabase(join(folder, "postgres"));
  try {
    const migrated = await migrate(postgres.url);
    if (!migrated.ok) {
      say(sentenceOf(migrated.error));
      return 1;
    }
    const environment = {
      DATABASE_URL: postgres.url,
      AMPERSIGN_SECRET: process.env["AMPERSIGN_SECRET"] ?? keptSecret(join(folder, "secret")),
      AMPERSIGN_DATA: folder,
      PORT: String(given.port),
    };
    return await runPrograms({ development: given.development, environment }, stopping);
  } finally {
    await postgres.stop();
  }
}

/** Aborts at the first Ctrl-C or SIGTERM; a second one ends this process at once, and the programs with it. */
function stopSignal(): AbortSignal {
  const controller = new AbortController();
  for (const signal of ["SIGINT", "SIGTERM", "SIGHUP"] as const) {
    process.on(signal, () => {
      if (controller.signal.aborted) process.exit(1);
      controller.abort();
    });
  }
  return controller.signal;
}

async function openDatabase(folder: string): Promise<RunningPostgres> {
  const given = process.env["DATABASE_URL"];
  return given === undefined || given === ""
    ? startPostgres(folder)
    : { url: given, stop: async () => undefined };
}

/** Cookies stay valid over a restart. */
function keptSecret(file: string): string {
  if (!existsSync(file))
    writeFileSync(file, randomBytes(32).toString("base64url"), { mode: 0o600 });
  return readFileSync(file, "utf8");
}

async function runPrograms(
  how: Pick<Program, "development" | "environment">,
  stopping: AbortSignal,
): Promise<number> {
  if (process.env["AMPERSIGN_DEMO"] !== "no" && !(await seeded(how))) {
    say(
      "The demo could not be seeded; the reason stands above. AMPERSIGN_DEMO=no starts without it.",
    );
    return 1;
  }
  const server = startProgram({ ...how, name: "server/main" });
  const url = await readiness(server, stopping);
  if (url === undefined) {
    await stopProgram(server);
    if (stopping.aborted) return 0;
    say("The server did not start; the reason stands above.");
    return 1;
  }
  say(welcome(url));
  // First the server, so that nobody is told "saved" by one that is about to go; then the worker; then the database.
  const serverIsGone = new AbortController();
  const workers = keepRunning({ ...how, name: "jobs/worker" }, serverIsGone.signal);
  await keepRunning({ ...how, name: "server/main" }, stopping, server);
  serverIsGone.abort();
  await workers;
  return 0;
}

/** Fills an empty database with the demo; one with data is left as it is. */
async function seeded(how: Pick<Program, "development" | "environment">): Promise<boolean> {
  const seed = startProgram({ ...how, name: "server/seed" });
  const [code] = await once(seed, "exit");
  return code === 0;
}

/** The address, once the server answers; undefined if it ended before, having said why itself. */
function readiness(server: ChildProcess, stopping: AbortSignal): Promise<string | undefined> {
  return new Promise((settle) => {
    server.once("message", (message) => settle(String(message)));
    server.once("exit", () => settle(undefined));
    stopping.addEventListener("abort", () => settle(undefined), { once: true });
  });
}

/** Starts a program again whenever it ends by itself, until it is time to stop; then stops it. */
async function keepRunning(
  program: Program,
  stopping: AbortSignal,
  started?: ChildProcess,
): Promise<void> {
  let child = started ?? startProgram(program);
  let wait = RESTART_AFTER_MS;
  while (!stopping.aborted) {
    const begun = Date.now();
    await endOf(child, stopping);
    if (stopping.aborted) break;
    wait = Date.now() - begun < EARLY_MS ? Math.min(2 * wait, LONGEST_PAUSE_MS) : RESTART_AFTER_MS;
    say(
      `${program.name} ended unexpectedly (${child.signalCode ?? child.exitCode}); starting it again.`,
    );
    await pause(wait, undefined, { signal: stopping }).catch(() => undefined);
    if (!stopping.aborted) child = startProgram(program);
  }
  await stopProgram(child);
}

function endOf(child: ChildProcess, stopping: AbortSignal): Promise<void> {
  return new Promise((settle) => {
    if (!isRunning(child) || stopping.aborted) settle();
    child.once("exit", () => settle());
    stopping.addEventListener("abort", () => settle(), { once: true });
  });
}

function welcome(url: string): string {
  const people = demoPeople.map(
    ({ name, roles, email, password }) =>
      `  ${name.padEnd(16)} ${roles.join(", ").padEnd(22)} ${email.padEnd(34)} ${password}`,
  );
  return [
    "",
    `Ampersign is ready: ${url}`,
    "",
    "Sign in as",
    ...people,
    "",
    "Ctrl-C stops it.",
    "",
  ].join("\n");
}

function sentenceOf(failure: MigrationFailure): string {
  switch (failure.kind) {
    case "changedMigration":
      return `The migration ${failure.name} was edited after this database had applied it. Restore the file.`;
    case "newerDatabase":
      return `This database was migrated by a newer Ampersign (${failure.name}). Start that one.`;
    case "refusedMigration":
      return `The database refused the migration ${failure.name}: ${failure.reason}. Nothing of it was kept.`;
  }
}

function say(text: string): void {
  process.stdout.write(`${text}\n`);
}
