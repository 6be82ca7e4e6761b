import { PgBoss } from "pg-boss";

const QUEUE = "runs";
/** A worker that dies is noticed by its missing heartbeat; retries are found by polling, not told. */
const HEARTBEAT_S = 10;

/** The queue in Postgres that wakes workers. Whose run it is, and whether its result counts, the run's own row decides. */
export interface RunQueue {
  /** Wakes a worker for a run. */
  readonly wake: (address: string) => Promise<void>;
  /** Does runs as they come, one at a time, until the queue is closed. */
  readonly work: (handle: (address: string) => Promise<void>) => Promise<void>;
  readonly close: () => Promise<void>;
}

/** Opens the queue; its tables are made at the first opening. `onError` is told of what the queue survives. */
export async function openQueue(url: string, onError: (error: Error) => void): Promise<RunQueue> {
  const boss = new PgBoss({ connectionString: url, application_name: "ampersign jobs" });
  boss.on("error", onError);
  await boss.start();
  await boss.createQueue(QUEUE, {
    policy: "exclusive",
    retryLimit: 5,
    heartbeatSeconds: HEARTBEAT_S,
  });
  return {
    wake: async (address) => {
      await boss.send(QUEUE, { address }, { singletonKey: address });
    },
    work: async (handle) => {
      await boss.work<{ address: string }>(
        QUEUE,
        { batchSize: 1, pollingIntervalSeconds: 1 },
        async ([job]) => {
          if (job !== undefined) await handle(job.data.address);
        },
      );
    },
    close: () => boss.stop({ graceful: true, timeout: 5000 }),
  };
}
