import type { TransactionClient } from "./client";
import { Prisma } from "./generated/client";

/** What a worker needs to compute a run. */
export interface ClaimedRun {
  readonly address: string;
  readonly kind: string;
  readonly proposed: string;
  readonly base: string | null;
  readonly lease: string;
}

/** A worker that says nothing for this long has lost its run. */
export const LEASE_MS = 15_000;
/** A run that has broken off this often, or killed as many workers, is given up. */
const MOST_ATTEMPTS = 5;

/** The database's clock: workers on several machines need not agree on the time. */
const NOW = Prisma.sql`timezone('utc', clock_timestamp())`;
const LEASE_END = Prisma.sql`${NOW} + make_interval(secs => ${LEASE_MS / 1000}::float8)`;

/** The runs in Postgres. Every change of state is conditional on the lease in the run's own row. */
export class SolverRuns {
  constructor(private readonly client: TransactionClient) {}

  /** Asks for a run. One of the same address that waits, runs or is done is left as it is; a failed one is tried again. @returns whether a worker has to be woken */
  async request(run: {
    readonly address: string;
    readonly kind: string;
    readonly proposed: string;
    readonly base: string | null;
    readonly engine: string;
  }): Promise<boolean> {
    const { count } = await this.client.solverRun.createMany({
      data: [{ ...run, state: "queued" }],
      skipDuplicates: true,
    });
    if (count === 1) return true;
    await this.lock(run.address);
    const again = await this.client.solverRun.updateMany({
      where: { address: run.address, state: "failed" },
      data: { state: "queued", attempts: 0, failure: null, finishedAt: null },
    });
    return again.count === 1;
  }

  /** Takes a run that is queued, or whose worker has let its lease run out. null: another has it, or it is done. */
  async claim(address: string, lease: string): Promise<ClaimedRun | null> {
    const rows = await this.client.$queryRaw<Omit<ClaimedRun, "lease">[]>`
      update "SolverRun"
      set state = 'running', lease = ${lease}, "leaseUntil" = ${LEASE_END},
          attempts = attempts + 1, done = 0, "of" = 0, "at" = null
      where address = ${address} and attempts < ${MOST_ATTEMPTS}
        and (state = 'queued' or (state = 'running' and "leaseUntil" < ${NOW}))
      returning address, kind, proposed, base`;
    const [run] = rows;
    return run === undefined ? null : { ...run, lease };
  }

  /** Says that the worker lives and how far it is. false: the lease is another's by now, or the run was called off. */
  async renew(
    run: ClaimedRun,
    progress: { readonly done: number; readonly of: number; readonly at: string | null },
  ): Promise<boolean> {
    const count = await this.client.$executeRaw`
      update "SolverRun"
      set done = ${progress.done}, "of" = ${progress.of}, "at" = ${progress.at},
          "leaseUntil" = ${LEASE_END}
      where address = ${run.address} and lease = ${run.lease} and state = 'running'`;
    return count === 1;
  }

  /** Stores a result once, and only from the worker that holds the lease. */
  async finish(run: ClaimedRun, result: string, resultDigest: string): Promise<boolean> {
    return this.end(run, { state: "done", result, resultDigest });
  }

  /** Says in one sentence why a run cannot be done. */
  async fail(run: ClaimedRun, failure: string): Promise<boolean> {
    return this.end(run, { state: "failed", failure });
  }

  /** Gives a run back that broke off through no fault of its own: it waits again, or is given up after too many attempts. */
  async giveBack(run: ClaimedRun, reason: string): Promise<"waits" | "givenUp" | "leaseLost"> {
    const held = { address: run.address, lease: run.lease, state: "running" };
    const waits = await this.client.solverRun.updateMany({
      where: { ...held, attempts: { lt: MOST_ATTEMPTS } },
      data: { state: "queued", lease: null, leaseUntil: null },
    });
    if (waits.count === 1) return "waits";
    const sentence = `The computation broke off ${MOST_ATTEMPTS} times, lastly: ${reason}`;
    return (await this.fail(run, sentence)) ? "givenUp" : "leaseLost";
  }

  /**
   * Calls off a run unless a revision that was not returned needs it; whoever computes it finds its lease gone. To be
   * called in a transaction, as `request` is: who asks for it meanwhile waits, and then has it queued again.
   * @returns whether it was called off
   */
  async cancel(address: string, sentence: string): Promise<boolean> {
    await this.lock(address);
    const needed = await this.client.revision.count({
      where: {
        OR: [{ runAddress: address }, { comparisonAddress: address }],
        state: { not: "returned" },
      },
    });
    if (needed > 0) return false;
    const { count } = await this.client.solverRun.updateMany({
      where: { address, state: { in: ["queued", "running"] } },
      data: { state: "failed", failure: sentence, lease: null, leaseUntil: null },
    });
    return count === 1;
  }

  /** The runs that wait for a worker or have lost theirs; what has failed too often is given up here. */
  async waiting(): Promise<readonly string[]> {
    await this.client.$executeRaw`
      update "SolverRun"
      set state = 'failed', lease = null, "leaseUntil" = null,
          failure = 'The worker stopped several times while computing this; it was given up.'
      where state = 'running' and "leaseUntil" < ${NOW} and attempts >= ${MOST_ATTEMPTS}`;
    const rows = await this.client.$queryRaw<{ address: string }[]>`
      select address from "SolverRun"
      where state = 'queued' or (state = 'running' and "leaseUntil" < ${NOW})
      order by "createdAt"`;
    return rows.map((row) => row.address);
  }

  private async lock(address: string): Promise<void> {
    await this.client.$queryRaw`
      select address from "SolverRun" where address = ${address} for update`;
  }

  private async end(
    run: ClaimedRun,
    end:
      | { readonly state: "done"; readonly result: string; readonly resultDigest: string }
      | { readonly state: "failed"; readonly failure: string },
  ): Promise<boolean> {
    const { count } = await this.client.solverRun.updateMany({
      where: { address: run.address, lease: run.lease, state: "running" },
      data: { ...end, finishedAt: new Date(), leaseUntil: null },
    });
    return count === 1;
  }
}
