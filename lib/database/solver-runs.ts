import type { TransactionClient } from "./client";

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
/** A run that has killed this many workers is given up. */
const MOST_ATTEMPTS = 5;

/** The runs in Postgres. Every change of state is conditional on the lease in the run's own row. */
export class SolverRuns {
  constructor(private readonly client: TransactionClient) {}

  /** Asks for a run; one of the same address, done or not, is left as it is. @returns whether it is new */
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
    return count === 1;
  }

  /** Takes a run that is queued, or whose worker has let its lease run out. null: another has it, or it is done. */
  async claim(address: string, lease: string): Promise<ClaimedRun | null> {
    const now = new Date();
    const { count } = await this.client.solverRun.updateMany({
      where: {
        address,
        attempts: { lt: MOST_ATTEMPTS },
        OR: [{ state: "queued" }, { state: "running", leaseUntil: { lt: now } }],
      },
      data: {
        state: "running",
        lease,
        leaseUntil: new Date(now.getTime() + LEASE_MS),
        attempts: { increment: 1 },
        done: 0,
        of: 0,
        at: null,
      },
    });
    if (count === 0) return null;
    const run = await this.client.solverRun.findUniqueOrThrow({ where: { address } });
    return { address, kind: run.kind, proposed: run.proposed, base: run.base, lease };
  }

  /** Says that the worker lives and how far it is. false: the lease is another's by now. */
  async renew(
    run: ClaimedRun,
    progress: { readonly done: number; readonly of: number; readonly at: string | null },
  ): Promise<boolean> {
    const { count } = await this.client.solverRun.updateMany({
      where: { address: run.address, lease: run.lease, state: "running" },
      data: { ...progress, leaseUntil: new Date(Date.now() + LEASE_MS) },
    });
    return count === 1;
  }

  /** Stores a result once, and only from the worker that holds the lease. */
  async finish(run: ClaimedRun, result: string, resultDigest: string): Promise<boolean> {
    const { count } = await this.client.solverRun.updateMany({
      where: { address: run.address, lease: run.lease, state: "running" },
      data: { state: "done", result, resultDigest, finishedAt: new Date(), leaseUntil: null },
    });
    return count === 1;
  }

  /** Says in one sentence why a run cannot be done. */
  async fail(run: ClaimedRun, failure: string): Promise<boolean> {
    const { count } = await this.client.solverRun.updateMany({
      where: { address: run.address, lease: run.lease, state: "running" },
      data: { state: "failed", failure, finishedAt: new Date(), leaseUntil: null },
    });
    return count === 1;
  }

  /** The runs that wait for a worker or have lost theirs; what has failed too often is given up here. */
  async waiting(): Promise<readonly string[]> {
    const stale = { state: "running", leaseUntil: { lt: new Date() } };
    await this.client.solverRun.updateMany({
      where: { ...stale, attempts: { gte: MOST_ATTEMPTS } },
      data: {
        state: "failed",
        failure: "The worker stopped several times while computing this; it was given up.",
      },
    });
    const rows = await this.client.solverRun.findMany({
      where: { OR: [{ state: "queued" }, stale] },
      orderBy: { createdAt: "asc" },
      select: { address: true },
    });
    return rows.map((row) => row.address);
  }
}
