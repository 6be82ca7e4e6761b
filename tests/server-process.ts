/**
 * The built server and worker as real processes on a database of the caller's, to be killed and started again. Sessions
 * made in the test process are good there too: set AMPERSIGN_SECRET to {@link TEST_SECRET} and DATABASE_URL first.
 */
import { type ChildProcess, spawn } from "node:child_process";
import { once } from "node:events";

export const TEST_SECRET = "a secret that only the tests know, and long enough";

export interface RunningProcess {
  readonly pid: number;
  /** kill -9: nothing is put in order. */
  kill(): Promise<void>;
  /** SIGTERM, and its end. */
  stop(): Promise<void>;
}

export interface ServerProcess extends RunningProcess {
  /** `http://127.0.0.1:PORT` */
  readonly url: string;
}

/**
 * Builds what changed (under a lock: test files may ask at the same time), then starts the server.
 * @param given the port to use again after a kill; any free one if absent
 */
export async function startServerProcess(given: {
  readonly databaseUrl: string;
  readonly port?: number;
}): Promise<ServerProcess> {
  const child = await startBuilt(".build/server/main.js", given.databaseUrl, given.port ?? 0);
  const ended = once(child, "exit").then(([code, signal]) => {
    throw new Error(`The server ended before it was ready (${signal ?? code}).`);
  });
  const url = await Promise.race([once(child, "message"), ended]).then(([message]) =>
    String(message),
  );
  ended.catch(() => undefined);
  return { url, ...handles(child) };
}

/** Starts the built worker, which takes solver runs from the queue. */
export async function startWorkerProcess(given: {
  readonly databaseUrl: string;
}): Promise<RunningProcess> {
  return handles(await startBuilt(".build/jobs/worker.js", given.databaseUrl, 0));
}

async function startBuilt(
  program: string,
  databaseUrl: string,
  port: number,
): Promise<ChildProcess> {
  const build = spawn(process.execPath, [".ci/build.mjs"], { stdio: "inherit" });
  const [code] = await once(build, "exit");
  if (code !== 0) throw new Error("The build failed; the reason stands above.");
  return spawn(
    process.execPath,
    ["--enable-source-maps", "--import", "./lib/server/end-with-parent.mjs", program],
    {
      stdio: ["ignore", "inherit", "inherit", "ipc"],
      env: {
        ...process.env,
        NODE_ENV: "production",
        DATABASE_URL: databaseUrl,
        AMPERSIGN_SECRET: TEST_SECRET,
        PORT: String(port),
      },
    },
  );
}

function handles(child: ChildProcess): RunningProcess {
  const { pid } = child;
  if (pid === undefined) throw new Error("The process did not start.");
  const end = async (signal: "SIGKILL" | "SIGTERM") => {
    if (child.exitCode !== null || child.signalCode !== null) return;
    const gone = once(child, "exit");
    child.kill(signal);
    await gone;
  };
  return { pid, kill: () => end("SIGKILL"), stop: () => end("SIGTERM") };
}
