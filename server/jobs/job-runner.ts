import { newId } from '../db/new-id';
import type { Edges } from '../context/context';
import { bookkeeping } from '../context/transact';
import { findLease, storeLease } from './job-lease-repository';

/** Work that is due by time. It is a query over the data, so that a missed period is caught up. */
export interface Job {
  readonly name: string;
  readonly periodS: number;
  /** The time since the last run, half open. */
  readonly run: (edges: Edges, period: { from: Date; to: Date }) => Promise<void>;
}

export interface JobRunner {
  /** Runs what is due now; two processes never run the same job at once. */
  tick(): Promise<void>;
  start(): void;
  /** Waits for what runs and gives the leases back. */
  stop(): Promise<void>;
}

const TICK_MS = 15_000;
const LEASE_MS = 120_000;

export function createJobRunner(edges: Edges, jobs: readonly Job[]): JobRunner {
  const owner = newId();
  let timer: NodeJS.Timeout | undefined;
  let running = Promise.resolve();

  async function tick(): Promise<void> {
    for (const job of jobs) {
      try {
        await runWhenDue(edges, job, owner);
      } catch (error) {
        // Whatever the work throws: the next tick tries again, and other jobs must not wait for it.
        edges.log.error({ err: error, job: job.name }, 'a job failed; it will run again');
      }
    }
  }
  function tickOnce(): Promise<void> {
    running = running.then(tick);
    return running;
  }
  return {
    tick: tickOnce,
    start: () => {
      timer = setInterval(() => void tickOnce(), TICK_MS);
      timer.unref();
    },
    stop: async () => {
      clearInterval(timer);
      await running;
    },
  };
}

async function runWhenDue(edges: Edges, job: Job, owner: string): Promise<void> {
  const to = edges.clock();
  const from = await takeLease(edges, job, { owner, to });
  if (!from) return;
  let doneUntil = from;
  try {
    await job.run(edges, { from, to });
    doneUntil = to;
  } finally {
    await bookkeeping(edges, (tx) =>
      storeLease(tx, {
        name: job.name,
        owner,
        leased_until: edges.clock().toISOString(),
        done_until: doneUntil.toISOString(),
      }),
    );
  }
}

/** The start of the period to work off, with the lease taken; undefined when not due or not ours. */
function takeLease(
  edges: Edges,
  job: Job,
  { owner, to }: { owner: string; to: Date },
): Promise<Date | undefined> {
  return bookkeeping(edges, async (tx) => {
    const lease = await findLease(tx, job.name);
    const from = lease ? new Date(lease.done_until) : new Date(to.getTime() - job.periodS * 1000);
    const isDue = to.getTime() - from.getTime() >= job.periodS * 1000;
    const isTaken =
      lease !== undefined && lease.owner !== owner && new Date(lease.leased_until) > to;
    if (!isDue || isTaken) return undefined;
    await storeLease(tx, {
      name: job.name,
      owner,
      leased_until: new Date(to.getTime() + LEASE_MS).toISOString(),
      done_until: from.toISOString(),
    });
    return from;
  });
}
