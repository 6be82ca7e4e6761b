import { databaseUrl } from "../database/client";
import { openQueue, type RunQueue } from "../jobs/queue";
import { log } from "./log";

declare global {
  // Next loads a module several times over; one queue serves them all.
  var ampersignQueue: Promise<RunQueue> | undefined;
}

/** Wakes a worker for runs that stand in the database. Should that fail, the worker's own sweep finds them within seconds. */
export async function wakeWorkers(addresses: readonly string[]): Promise<void> {
  globalThis.ampersignQueue ??= openQueue(databaseUrl(), (error) => log.warn({ error }, "queue"));
  try {
    const queue = await globalThis.ampersignQueue;
    for (const address of addresses) await queue.wake(address);
  } catch (error) {
    log.warn({ error }, "the worker was not woken");
  }
}
