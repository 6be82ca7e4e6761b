import { randomUUID } from "node:crypto";
import { existsSync } from "node:fs";
import { fileURLToPath } from "node:url";
import { MessageChannel } from "node:worker_threads";
import { Piscina } from "piscina";
import { type ClaimedRun, LEASE_MS, type SolverRuns } from "../database/solver-runs";
import type { RunOutcome, RunProgress, RunTask } from "./run-task";

/** What became of a run that this worker was woken for. */
export type RunEnd = "done" | "failed" | "notOurs" | "leaseLost";

/** Computes runs in a thread, so that the worker can say meanwhile that it lives. */
export class RunComputer {
  private readonly threads: Piscina;

  constructor(private readonly runs: SolverRuns) {
    this.threads = new Piscina({ filename: threadFile(), minThreads: 1, maxThreads: 1 });
  }

  /** Claims a run, computes it and stores its result; each step only while the lease is ours. */
  async run(address: string): Promise<RunEnd> {
    const claimed = await this.runs.claim(address, randomUUID());
    if (claimed === null) return "notOurs";
    let progress: RunProgress = { done: 0, of: 0, at: null };
    const lost = new AbortController();
    const renew = (): void => {
      this.runs.renew(claimed, progress).then(
        (ours) => {
          if (!ours) lost.abort();
        },
        // The database is away: the lease runs out, and whoever comes next computes it again.
        () => undefined,
      );
    };
    const heartbeat = setInterval(renew, LEASE_MS / 3);
    try {
      const outcome = await this.compute(claimed, lost.signal, (told) => {
        progress = told;
        renew();
      });
      return await this.store(claimed, outcome);
    } catch (error) {
      if (lost.signal.aborted) return "leaseLost";
      const reason = error instanceof Error ? error.message : String(error);
      return (await this.runs.fail(claimed, `The computation broke off: ${reason}`))
        ? "failed"
        : "leaseLost";
    } finally {
      clearInterval(heartbeat);
    }
  }

  close(): Promise<void> {
    return this.threads.destroy();
  }

  private async compute(
    run: ClaimedRun,
    signal: AbortSignal,
    onProgress: (progress: RunProgress) => void,
  ): Promise<RunOutcome> {
    const { port1, port2 } = new MessageChannel();
    port1.on("message", onProgress);
    const task: RunTask = { kind: run.kind, proposed: run.proposed, base: run.base };
    try {
      const outcome: RunOutcome = await this.threads.run(
        { task, port: port2 },
        { transferList: [port2], signal },
      );
      return outcome;
    } finally {
      port1.close();
    }
  }

  private async store(run: ClaimedRun, outcome: RunOutcome): Promise<RunEnd> {
    const stored =
      outcome.kind === "done"
        ? await this.runs.finish(run, outcome.result, outcome.resultDigest)
        : await this.runs.fail(run, outcome.sentence);
    if (!stored) return "leaseLost";
    return outcome.kind;
  }
}

/** Built, it stands in `jobs` beside or next to the program that bundles this file; from source, beside this file. */
function threadFile(): string {
  const places = ["./solving-thread.js", "../jobs/solving-thread.js", "./solving-thread.ts"];
  const files = places.map((place) => fileURLToPath(new URL(place, import.meta.url)));
  const found = files.find((file) => existsSync(file));
  if (found === undefined) throw new Error("The solving thread's program is not built");
  return found;
}
