import { readFile } from "node:fs/promises";
import { resolve } from "node:path";
import { afterAll, afterEach, beforeAll, describe, expect, it } from "vitest";
import { connect, type PrismaClient } from "../../lib/database/client";
import { SolverRuns } from "../../lib/database/solver-runs";
import { RunComputer } from "../../lib/jobs/run-one";
import { type FreshDatabase, freshDatabase } from "../fresh-database";
import { startWorkerProcess } from "../server-process";

const MINUTE_MS = 60_000;
/** As DEVELOPERS.md tells: a run that broke off this often is given up. */
const MOST_ATTEMPTS = 5;
let fresh: FreshDatabase;
let client: PrismaClient;
let runs: SolverRuns;
let computer: RunComputer;
let circuit: string;

beforeAll(async () => {
  fresh = await freshDatabase();
  client = connect(fresh.url);
  runs = new SolverRuns(client);
  // Builds the thread's program; this test computes the runs itself.
  await (await startWorkerProcess({ databaseUrl: fresh.url })).kill();
  computer = withLimit(10 * MINUTE_MS);
  circuit = await readFile("tests/kept/ffc-2-B.json", "utf8");
  await client.$executeRaw`create sequence writes`;
  await client.$executeRaw`create table broken (at bigint)`;
  // The connection is cut in the middle of the n-th write, as when its process dies.
  await client.$executeRaw`
    create function cut() returns trigger language plpgsql as $$
    begin
      if nextval('writes') = (select at from broken) then
        perform pg_terminate_backend(pg_backend_pid());
      end if;
      return new;
    end $$`;
  await client.$executeRaw`
    create trigger cut before update on "SolverRun" for each row execute function cut()`;
}, 3 * MINUTE_MS);

afterEach(() => client.$executeRaw`truncate broken`);

afterAll(async () => {
  await computer.close();
  await client.$disconnect();
  await fresh.drop();
});

function withLimit(timeLimitMs: number): RunComputer {
  return new RunComputer(runs, timeLimitMs, resolve(".build/jobs/solving-thread.js"));
}

async function ask(address: string, proposed = circuit): Promise<void> {
  await runs.request({ address, kind: "solve", proposed, base: null, engine: "test" });
}

function row(address: string) {
  return client.solverRun.findUniqueOrThrow({ where: { address } });
}

async function cutWrite(n: number): Promise<void> {
  await client.$executeRaw`alter sequence writes restart`;
  await client.$executeRaw`truncate broken`;
  await client.$executeRaw`insert into broken values (${n})`;
}

describe("a run whose database goes away", () => {
  it.each([1, 2, 3, 4, 5, 6, 7, 8])(
    "at write %i is completed by whoever comes next, and stored once",
    async (n) => {
      const address = `cut at ${n}`;
      await ask(address);
      await cutWrite(n);
      await computer.run(address).catch(() => "cut");
      await client.$executeRaw`truncate broken`;
      await client.solverRun.updateMany({
        where: { address, state: "running" },
        data: { leaseUntil: new Date(0) },
      });
      const before = await row(address);
      expect(before.state).not.toBe("failed");
      const end = await computer.run(address);
      expect(end).toBe(before.state === "done" ? "notOurs" : "done");
      expect((await row(address)).resultDigest).toMatch(/^sha256:/);
    },
    MINUTE_MS,
  );
});

describe("a run that breaks off", () => {
  it("is tried again a bounded number of times, and may then be asked for again", async () => {
    await ask("broken");
    for (let attempt = 1; attempt <= MOST_ATTEMPTS; attempt += 1) {
      const claimed = await runs.claim("broken", `lease ${attempt}`);
      if (claimed === null) throw new Error("The run waits");
      const end = await runs.giveBack(claimed, "no memory left");
      expect(end).toBe(attempt < MOST_ATTEMPTS ? "waits" : "givenUp");
    }
    expect(await row("broken")).toMatchObject({ state: "failed", attempts: MOST_ATTEMPTS });
    expect((await row("broken")).failure).toContain("no memory left");
    expect(await runs.claim("broken", "one more")).toBeNull();
    await ask("broken");
    expect(await computer.run("broken")).toBe("done");
  });

  it("is given up when its workers die each time", async () => {
    await ask("deadly");
    for (let attempt = 1; attempt <= MOST_ATTEMPTS; attempt += 1) {
      expect(await runs.waiting()).toContain("deadly");
      expect(await runs.claim("deadly", `lease ${attempt}`)).not.toBeNull();
      await client.solverRun.update({
        where: { address: "deadly" },
        data: { leaseUntil: new Date(0) },
      });
    }
    expect(await runs.waiting()).not.toContain("deadly");
    expect((await row("deadly")).failure).toContain("stopped several times");
  });

  it("leases by the database's clock", async () => {
    await ask("leased");
    await runs.claim("leased", "mine");
    const [lease] = await client.$queryRaw<{ left: number }[]>`
      select extract(epoch from "leaseUntil" - timezone('utc', clock_timestamp()))::float8 as left
      from "SolverRun" where address = 'leased'`;
    expect(lease?.left).toBeGreaterThan(5);
    expect(lease?.left).toBeLessThanOrEqual(15);
    expect(await runs.waiting()).not.toContain("leased");
  });
});

describe("a run that should not go on", () => {
  it("is stopped at its time limit, with a sentence", async () => {
    const hasty = withLimit(1);
    await ask("long");
    expect(await hasty.run("long")).toBe("failed");
    expect((await row("long")).failure).toContain("took longer than");
    await hasty.close();
  });

  it("is stopped when it is called off, and stores nothing", async () => {
    await ask("called off");
    const ends = computer.run("called off");
    await expect.poll(async () => (await row("called off")).state, { interval: 1 }).toBe("running");
    expect(await runs.cancel("called off", "Nobody needs it.")).toBe(true);
    expect(await ends).toBe("leaseLost");
    expect(await row("called off")).toMatchObject({ state: "failed", result: null });
    expect(await runs.cancel("called off", "Again.")).toBe(false);
  });

  it("goes on while a revision needs it, and can be asked for again after it was called off", async () => {
    await ask("wanted");
    await client.workspace.create({
      data: {
        name: "Ours",
        designs: {
          create: {
            number: "FFC-2",
            title: "Fan",
            revisions: {
              create: {
                letter: "A",
                circuit,
                digest: "sha256:0",
                changeNote: "First issue",
                authors: [],
                frozenAt: new Date(),
                state: "underReview",
                runAddress: "wanted",
                comparisonAddress: "wanted",
              },
            },
          },
        },
      },
    });
    expect(await runs.cancel("wanted", "Returned.")).toBe(false);
    await client.revision.updateMany({ data: { state: "returned" } });
    expect(await runs.cancel("wanted", "Returned.")).toBe(true);
    expect(await runs.claim("wanted", "late")).toBeNull();
    await ask("wanted");
    expect(await row("wanted")).toMatchObject({ state: "queued", attempts: 0, failure: null });
  });

  it("is refused with a sentence where the file has too many parts, or cannot be read", async () => {
    const resistors = Array.from({ length: 20_001 }, (_, index) => [
      `R${index + 1}`,
      { kind: "resistor", pins: { "1": "A", "2": "GND" }, resistance: "1k" },
    ]);
    const large = {
      ampersign: 1,
      top: "main",
      blocks: { main: { parts: Object.fromEntries(resistors) } },
      conditions: [],
    };
    await ask("large", JSON.stringify(large));
    expect(await computer.run("large")).toBe("failed");
    expect((await row("large")).failure).toMatch(/\.$/);
    await ask("unreadable", "{");
    expect(await computer.run("unreadable")).toBe("failed");
    expect((await row("unreadable")).failure).toMatch(/\.$/);
  });
});
