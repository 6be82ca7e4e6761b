import { randomUUID } from "node:crypto";
import { existsSync } from "node:fs";
import { fileURLToPath } from "node:url";
import { MessageChannel } from "node:worker_threads";
import { Piscina } from "piscina";
import { type ClaimedRun, LEASE_MS, type SolverRuns } from "../database/solver-runs";
import type { RunOutcome, RunProgress, RunTask } from "./run-task";

/** What became of a run that this worker was woken for; one given back waits for another attempt. */
export type RunEnd = "done" | "failed" | "givenBack" | "notOurs" | "leaseLost";

/** A run may take this long; what takes longer would keep everybody else waiting. */
const TIME_LIMIT_MS = 10 * 60_000;
/** The memory of one run, MB. */
const MOST_MEMORY_MB = 1536;

/** Computes runs in a thread, so that the worker can say meanwhile that it lives. */
export class RunComputer {
  private readonly threads: Piscina;

  constructor(
    private readonly runs: SolverRuns,
    private readonly timeLimitMs = TIME_LIMIT_MS,
    program = threadFile(),
  ) {
    this.threads = new Piscina({
      filename: program,
      minThreads: 1,
      maxThreads: 1,
      resourceLimits: { maxOldGenerationSizeMb: MOST_MEMORY_MB },
    });
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
    const late = AbortSignal.timeout(this.timeLimitMs);
    const halt = AbortSignal.any([lost.signal, late]);
    try {
      const outcome = await this.compute(claimed, halt, (told) => {
        progress = told;
        renew();
      });
      return await this.store(claimed, outcome);
    } catch (error) {
      if (lost.signal.aborted) return "leaseLost";
      return await this.brokenOff(claimed, error, late.aborted);
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

  /** What would happen again at each attempt fails; anything else is tried again. */
  private async brokenOff(run: ClaimedRun, error: unknown, late: boolean): Promise<RunEnd> {
    const refusal = late
      ? `The computation took longer than ${this.timeLimitMs / 60_000} minutes and was stopped. Take fewer parts or conditions.`
      : isOutOfMemory(error)
        ? `The computation took more than ${MOST_MEMORY_MB} MB and was stopped. Take fewer parts or conditions.`
        : null;
    if (refusal !== null) return this.store(run, { kind: "failed", sentence: refusal });
    const end = await this.runs.giveBack(run, error instanceof Error ? error.message : `${error}`);
    if (end === "leaseLost") return end;
    return end === "waits" ? "givenBack" : "failed";
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

function isOutOfMemory(error: unknown): boolean {
  return error instanceof Error && "code" in error && error.code === "ERR_WORKER_OUT_OF_MEMORY";
}

/** Built, it stands in `jobs` beside or next to the program that bundles this file; from source, beside this file. */
function threadFile(): string {
  const places = ["./solving-thread.js", "../jobs/solving-thread.js", "./solving-thread.ts"];
  const files = places.map((place) => fileURLToPath(new URL(place, import.meta.url)));
  const found = files.find((file) => existsSync(file));
  if (found === undefined) throw new Error("The solving thread's program is not built");
  return found;
}
