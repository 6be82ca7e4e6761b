import { type ChildProcess, spawn } from "node:child_process";
import { once } from "node:events";
import { chmodSync, mkdtempSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { createInterface } from "node:readline";

/** A whole workspace, as `npm start` gives it: database, server and worker, with a data folder of its own. */
export interface WorkspaceProcess {
  readonly url: string;
  /** Process that started the others. */
  readonly pid: number;
  /** Ends everything in order and removes the data, if the folder was its own. */
  stop(): Promise<void>;
}

/**
 * Starts one on a free port; installs and builds what is missing first.
 * @param given a checkout other than this one, and a data folder to keep
 * @throws with all it said, when it ends before it is ready
 */
export async function startWorkspace(
  given: { readonly checkout?: string; readonly data?: string } = {},
): Promise<WorkspaceProcess> {
  const folder = given.data ?? mkdtempSync(join(tmpdir(), "ampersign-workspace-"));
  if (given.data === undefined) chmodSync(folder, 0o755);
  const remove = () => {
    if (given.data === undefined) rmSync(folder, { recursive: true, force: true });
  };
  const { DATABASE_URL: _, ...environment } = process.env;
  const child = spawn(process.execPath, ["lib/server/start.mjs"], {
    cwd: given.checkout ?? process.cwd(),
    stdio: ["ignore", "pipe", "inherit"],
    env: { ...environment, PORT: "0", AMPERSIGN_DATA: folder },
  });
  const url = await readyAddress(child).catch((error: unknown) => {
    remove();
    throw error;
  });
  const { pid } = child;
  if (pid === undefined) throw new Error("The workspace did not start.");
  return {
    url,
    pid,
    stop: async () => {
      const gone = once(child, "exit");
      if (child.exitCode === null && child.signalCode === null) {
        child.kill("SIGTERM");
        await gone;
      }
      remove();
    },
  };
}

async function readyAddress(child: ChildProcess): Promise<string> {
  const said: string[] = [];
  if (child.stdout === null) throw new Error("It has to be heard.");
  const lines = createInterface({ input: child.stdout });
  for await (const line of lines) {
    said.push(line);
    const url = /is ready: (\S+)/.exec(line)?.[1];
    if (url === undefined) continue;
    // Whatever it says later must not fill the pipe.
    child.stdout.resume();
    return url;
  }
  throw new Error(`The workspace ended before it was ready:\n${said.join("\n")}`);
}
