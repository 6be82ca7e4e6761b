import { spawn } from "node:child_process";
import { once } from "node:events";
import { fileURLToPath } from "node:url";

const PROGRAM = fileURLToPath(new URL("./document-program.ts", import.meta.url));

export interface DocumentProcess {
  /** `ws://127.0.0.1:PORT` */
  readonly url: string;
  /** kill -9: at once, nothing is put in order. */
  kill(): Promise<void>;
}

/** Starts document-program.ts as a process of its own, on a database. */
export async function startDocumentProcess(databaseUrl: string): Promise<DocumentProcess> {
  const child = spawn(
    process.execPath,
    ["--import", "tsx", "--import", "./lib/server/end-with-parent.mjs", PROGRAM],
    {
      stdio: ["ignore", "inherit", "inherit", "ipc"],
      env: { ...process.env, DATABASE_URL: databaseUrl },
    },
  );
  const ended = once(child, "exit").then(([code]) => {
    throw new Error(`The program ended before it was ready (${code}).`);
  });
  const [url] = await Promise.race([once(child, "message"), ended]);
  ended.catch(() => undefined);
  return {
    url: String(url),
    kill: async () => {
      if (child.exitCode !== null || child.signalCode !== null) return;
      const gone = once(child, "exit");
      child.kill("SIGKILL");
      await gone;
    },
  };
}
