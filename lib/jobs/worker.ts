/** The worker's program: computes solver runs, one at a time. Killed at any moment, it leaves nothing half done. */
import { connect, databaseUrl } from "../database/client";
import { SolverRuns } from "../database/solver-runs";
import { openQueue } from "./queue";
import { RunComputer } from "./run-one";

/** Runs that nobody was woken for (their asker died in between) are found within this time. */
const SWEEP_MS = 3_000;

const url = databaseUrl();
const database = connect(url);
const runs = new SolverRuns(database);
const computer = new RunComputer(runs);
const queue = await openQueue(url, (error) => say("queue", error.message));

await queue.work(async (address) => {
  say(await computer.run(address), address);
});

let sweeping = false;
const sweep = setInterval(() => {
  if (sweeping) return;
  sweeping = true;
  sweepOnce()
    .catch((error: unknown) => say("sweep", String(error)))
    .finally(() => {
      sweeping = false;
    });
}, SWEEP_MS);

async function sweepOnce(): Promise<void> {
  for (const address of await runs.waiting()) {
    const end = await computer.run(address);
    if (end !== "notOurs") say(end, address);
  }
}

function say(what: string, about: string): void {
  process.stdout.write(`${JSON.stringify({ level: 30, name: "worker", what, about })}\n`);
}

async function stop(): Promise<void> {
  clearInterval(sweep);
  await queue.close();
  await computer.close();
  await database.$disconnect();
  process.exit(0);
}

process.once("SIGTERM", () => void stop());
process.once("SIGINT", () => void stop());
