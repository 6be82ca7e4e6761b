import { database, databaseUrl } from "../database/client";
import { SolverRuns } from "../database/solver-runs";
import { openQueue, type RunQueue } from "../jobs/queue";
import { engineVersion } from "../mna/engine-version";
import { log } from "./log";

declare global {
  // Next loads a module several times over; one queue serves them all.
  var ampersignQueue: Promise<RunQueue> | undefined;
}

/** Asks for a computation and wakes a worker. One that is done or under way is not begun again. */
export async function requestRun(run: {
  readonly address: string;
  readonly kind: "solve" | "compare";
  readonly proposed: string;
  readonly base: string | null;
}): Promise<void> {
  await new SolverRuns(database()).request({ ...run, engine: engineVersion });
  globalThis.ampersignQueue ??= openQueue(databaseUrl(), (error) => log.warn({ error }, "queue"));
  // Should the waking fail, the worker's own sweep finds the run within seconds.
  await globalThis.ampersignQueue
    .then((queue) => queue.wake(run.address))
    .catch((error: unknown) => log.warn({ error }, "the worker was not woken"));
}
