import { readFile } from "node:fs/promises";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { digest } from "../../lib/circuit/digest";
import { compare } from "../../lib/comparison/compare";
import { readSide } from "../../lib/comparison/read-side";
import { connect, type PrismaClient } from "../../lib/database/client";
import { SolverRuns } from "../../lib/database/solver-runs";
import { engineVersion } from "../../lib/mna/engine-version";
import { type FreshDatabase, freshDatabase } from "../fresh-database";
import { type RunningProcess, startWorkerProcess } from "../server-process";

const MINUTES_MS = 180_000;
let fresh: FreshDatabase;
let client: PrismaClient;
let runs: SolverRuns;
const workers: RunningProcess[] = [];

beforeAll(async () => {
  fresh = await freshDatabase();
  client = connect(fresh.url);
  runs = new SolverRuns(client);
}, MINUTES_MS);

afterAll(async () => {
  for (const worker of workers) await worker.stop();
  await client.$disconnect();
  await fresh.drop();
});

async function worker(): Promise<RunningProcess> {
  const started = await startWorkerProcess({ databaseUrl: fresh.url });
  workers.push(started);
  return started;
}

function runRow(address: string) {
  return client.solverRun.findUniqueOrThrow({ where: { address } });
}

describe("a worker that is killed", () => {
  it(
    "leaves its run to the next one, which completes it; the result is stored once and is right",
    async () => {
      const [base, proposed] = await Promise.all(
        ["B", "C"].map((letter) => readFile(`tests/kept/ffc-2-${letter}.json`, "utf8")),
      );
      const given = { kind: "compare", proposed: proposed ?? "", base: base ?? "" };
      await runs.request({ address: "comparison", ...given, engine: engineVersion });
      const first = await worker();
      await expect
        .poll(async () => (await runRow("comparison")).state, { timeout: 60_000, interval: 5 })
        .toBe("running");
      await first.kill();
      const left = await runRow("comparison");
      expect(left.state).toBe("running");
      expect(left.result).toBeNull();

      const second = await worker();
      await expect
        .poll(async () => (await runRow("comparison")).state, { timeout: 90_000, interval: 200 })
        .toBe("done");
      const done = await runRow("comparison");
      expect(done.attempts).toBe(2);
      const sides = [readSide(given.base), readSide(given.proposed)];
      const [was, is] = sides.map((side) => (side.ok ? side.value : null));
      if (was == null || is == null) throw new Error("The kept files cannot be read");
      expect(done.resultDigest).toBe(digest(compare(was, is)));
      await second.stop();
    },
    MINUTES_MS,
  );

  it("cannot store a result when it comes back late: the lease is another's", async () => {
    await runs.request({
      address: "late",
      kind: "solve",
      proposed: "{}",
      base: null,
      engine: engineVersion,
    });
    const stalled = await runs.claim("late", "first lease");
    if (stalled === null) throw new Error("The run is there to be claimed");
    await client.solverRun.update({
      where: { address: "late" },
      data: { leaseUntil: new Date(0) },
    });
    const next = await runs.claim("late", "second lease");
    if (next === null) throw new Error("A lapsed lease is there to be taken");
    expect(await runs.finish(stalled, "late", "late")).toBe(false);
    expect(await runs.renew(stalled, { done: 1, of: 2, at: null })).toBe(false);
    expect(await runs.finish(next, "right", "right")).toBe(true);
    expect(await runs.finish(next, "twice", "twice")).toBe(false);
    expect((await runRow("late")).result).toBe("right");
  });

  it("is not asked again for what is done", async () => {
    const again = await runs.request({
      address: "late",
      kind: "solve",
      proposed: "{}",
      base: null,
      engine: engineVersion,
    });
    expect(again).toBe(false);
    expect(await runs.claim("late", "third lease")).toBeNull();
  });
});
