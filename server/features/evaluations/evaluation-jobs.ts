import { localDateAt } from '@shared/model/local-date';

import { acting, type Context, type Edges, reading, SYSTEM } from '../../context/context';
import { bookkeeping, transact } from '../../context/transact';
import type { Job } from '../../jobs/job-runner';
import { everyLaserId, refreshStanding } from '../lasers/laser-standing-service';
import { endWaiver, lasersPastWaiver } from '../lasers/laser-transition-service';
import { readSettings } from '../settings/settings-service';
import { evaluationsPastReview } from './evaluation-queries';
import { findEvaluation } from './evaluation-repository';
import { goStaleByReview } from './evaluation-staleness-service';

/** So many lasers at once; then other requests have their turn. */
const PORTION = 50;

/** What the calendar does: reviews fall due, waivers end, and the lists say so. */
export const AGEING: Job = {
  name: 'evaluations-and-waivers-age',
  periodS: 900,
  run: async (edges, { from, to }) => {
    const { zone } = await readSettings({ tx: edges.db.read });
    const today = localDateAt(to, zone);
    await passReviews(edges, today);
    await endWaivers(edges, today);
    // What is due within days changes with the date only.
    if (localDateAt(from, zone) !== today) await refreshAll(edges);
  },
};

async function passReviews(edges: Edges, today: string): Promise<void> {
  for (const { id } of await evaluationsPastReview(edges.db.read, today)) {
    await transact(edges, acting(SYSTEM, 'job'), async (ctx) => {
      const evaluation = await findEvaluation(ctx.tx, id);
      if (evaluation?.state === 'approved') await goStaleByReview(ctx, evaluation);
    });
  }
}

async function endWaivers(edges: Edges, today: string): Promise<void> {
  const systemReading = reading(edges, acting(SYSTEM, 'job'));
  for (const id of await lasersPastWaiver(systemReading, today)) {
    await transact(edges, acting(SYSTEM, 'job'), (ctx) => endWaiver(ctx, id));
  }
}

async function refreshAll(edges: Edges): Promise<void> {
  const ids = await everyLaserId(reading(edges, acting(SYSTEM, 'job')));
  for (let start = 0; start < ids.length; start += PORTION) {
    await bookkeeping(edges, async (tx) => {
      const ctx: Pick<Context, 'tx' | 'now'> = { tx, now: edges.clock() };
      for (const id of ids.slice(start, start + PORTION)) await refreshStanding(ctx, id);
    });
    await new Promise((resolve) => setImmediate(resolve));
  }
}
