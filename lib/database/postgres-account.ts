import { createHash } from "node:crypto";
import { chmodSync, chownSync, existsSync, mkdirSync, readFileSync, statSync } from "node:fs";
import { dirname, join, parse, resolve } from "node:path";

/** The account that Postgres runs under; absent where the present one will do. */
export interface PostgresAccount {
  readonly uid: number;
  readonly gid: number;
}

/** Where root keeps what the other account has to reach, if the checkout lies in a closed folder such as /root. */
export const OPEN_FOLDER = "/var/lib/ampersign";

/**
 * Postgres refuses to run as root, so root hands it to `postgres`, or to `nobody` where there is no such account.
 * @returns undefined for everyone but root
 */
export function postgresAccount(): PostgresAccount | undefined {
  if (process.getuid?.() !== 0) return undefined;
  const lines = readFileSync("/etc/passwd", "utf8").split("\n");
  for (const name of ["postgres", "nobody"]) {
    const [, , uid, gid] = lines.find((line) => line.startsWith(`${name}:`))?.split(":") ?? [];
    if (uid !== undefined && gid !== undefined) return { uid: Number(uid), gid: Number(gid) };
  }
  throw new Error(
    "Postgres does not run as root, and this machine has no account postgres or nobody.",
  );
}

/** Whether every folder above the path lets other accounts pass. */
export function isReachable(path: string): boolean {
  let folder = dirname(resolve(path));
  for (;;) {
    if (existsSync(folder) && (statSync(folder).mode & 0o001) === 0) return false;
    if (folder === parse(folder).root) return true;
    folder = dirname(folder);
  }
}

/** A data folder that its account can reach, made if absent: the one wished for, or one under {@link OPEN_FOLDER}. */
export function reachableData(folder: string, account: PostgresAccount | undefined): string {
  const wished = resolve(folder);
  const digest = createHash("sha256").update(wished).digest("hex").slice(0, 12);
  const open = account === undefined || isReachable(wished);
  const data = open ? wished : join(OPEN_FOLDER, `data-${digest}`, "postgres");
  mkdirSync(dirname(data), { recursive: true, mode: 0o755 });
  mkdirSync(data, { recursive: true, mode: 0o700 });
  if (account !== undefined) chownSync(data, account.uid, account.gid);
  chmodSync(data, 0o700);
  return data;
}
