import { execFileSync } from "node:child_process";
import { chmodSync, mkdtempSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { startWorkspace } from "../tests/workspace-process";

/** One way of starting, from the command to an answered page. */
export interface StartTime {
  readonly from: string;
  readonly seconds: number;
  readonly goalSeconds: number;
}

/**
 * Times `npm start` on a clean clone of HEAD: bare (the packages come from the registry), then built with empty data,
 * then built with the data of before.
 */
export async function startTimes(): Promise<readonly StartTime[]> {
  const folder = mkdtempSync(join(tmpdir(), "ampersign-start-"));
  chmodSync(folder, 0o755);
  const checkout = join(folder, "clone");
  try {
    execFileSync("git", ["clone", "--quiet", "--no-hardlinks", process.cwd(), checkout]);
    const once = async (from: string, goalSeconds: number, data: string): Promise<StartTime> => {
      const begun = performance.now();
      const workspace = await startWorkspace({ checkout, data: join(folder, data) });
      const answer = await fetch(`${workspace.url}/sign-in`);
      const seconds = (performance.now() - begun) / 1000;
      await workspace.stop();
      if (!answer.ok) throw new Error(`The sign-in page answered ${answer.status}.`);
      return { from, seconds, goalSeconds };
    };
    return [
      await once("bare clone", 180, "first"),
      await once("built, empty data", 10, "second"),
      await once("built, with data", 10, "second"),
    ];
  } finally {
    rmSync(folder, { recursive: true, force: true });
  }
}
