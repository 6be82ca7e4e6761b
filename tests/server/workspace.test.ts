import { existsSync, readFileSync } from "node:fs";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { startWorkspace, type WorkspaceProcess } from "../workspace-process";

const BUILD_MS = 180_000;
let workspace: WorkspaceProcess;

beforeAll(async () => {
  workspace = await startWorkspace();
}, BUILD_MS);

afterAll(() => workspace.stop());

/** Processes that the workspace's own has started and that run this program. */
function processesOf(program: string): readonly number[] {
  const { pid } = workspace;
  return readFileSync(`/proc/${pid}/task/${pid}/children`, "utf8")
    .split(" ")
    .filter((child) => child !== "" && existsSync(`/proc/${child}`))
    .filter((child) => readFileSync(`/proc/${child}/cmdline`, "utf8").includes(program))
    .map(Number);
}

function only(pids: readonly number[]): number {
  expect(pids).toHaveLength(1);
  return pids[0] ?? 0;
}

describe("a workspace, as npm start gives it", () => {
  it("is alive, reaches its database and shows the sign-in page", async () => {
    const answers = await Promise.all(
      ["/healthz", "/readyz", "/sign-in"].map((path) => fetch(workspace.url + path)),
    );
    expect(answers.map(({ status }) => status)).toEqual([200, 200, 200]);
  });

  it("starts a worker again that was killed", async () => {
    const killed = only(processesOf("jobs/worker"));
    process.kill(killed, "SIGKILL");
    await expect.poll(() => processesOf("jobs/worker"), { timeout: 10_000 }).not.toContain(killed);
    await expect.poll(() => processesOf("jobs/worker"), { timeout: 10_000 }).toHaveLength(1);
  });

  it("ends everything when told to, its database last", async () => {
    const running = ["server/main", "jobs/worker", "postgres"].map((name) =>
      only(processesOf(name)),
    );
    await workspace.stop();
    expect(running.filter((pid) => existsSync(`/proc/${pid}`))).toEqual([]);
  });
});
