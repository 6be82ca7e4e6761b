import { type ChildProcess, spawn } from "node:child_process";
import { once } from "node:events";
import { pathToFileURL } from "node:url";

const STOP_SECONDS = 15;

/** A program of ours to run as a process of its own. */
export interface Program {
  /** Without folder and ending: `server/main`. */
  readonly name: string;
  readonly development: boolean;
  readonly environment: Readonly<Record<string, string>>;
}

/**
 * Starts it: its source in development, what was built of it otherwise. It is in a group of its own, so that Ctrl-C
 * reaches the supervisor alone, which then ends things in order.
 */
export function startProgram({ name, development, environment }: Program): ChildProcess {
  const together = pathToFileURL("lib/server/end-with-parent.mjs").href;
  const options = development
    ? ["--import", "tsx", "--import", together, `lib/${name}.ts`]
    : ["--enable-source-maps", "--import", together, `.build/${name}.js`];
  return spawn(process.execPath, options, {
    detached: true,
    stdio: ["ignore", "inherit", "inherit", "ipc"],
    env: {
      ...process.env,
      ...environment,
      NODE_ENV: development ? "development" : "production",
      NEXT_TELEMETRY_DISABLED: "1",
    },
  });
}

export function isRunning(child: ChildProcess): boolean {
  return child.exitCode === null && child.signalCode === null;
}

/** Asks it to end and waits; after a while it is made to. */
export async function stopProgram(child: ChildProcess): Promise<void> {
  if (!isRunning(child)) return;
  const gone = once(child, "exit");
  child.kill("SIGTERM");
  const late = setTimeout(() => child.kill("SIGKILL"), STOP_SECONDS * 1000);
  await gone;
  clearTimeout(late);
}
