import type { Context } from '../context/context';
import type { Institute } from './demo-institute';
import type { DemoPersonId } from './demo-people';

/** Who does something, in a context of that time. */
export type Hand = (person: DemoPersonId) => Context;

interface Event {
  readonly daysAgo: number;
  readonly happens: (by: Hand) => Promise<void>;
}

/** What happened at the institute, told in the order in which it happened. */
export interface Chronicle {
  /** Notes something to happen `daysAgo`; on one day, in the order in which it was noted. */
  note(daysAgo: number, happens: Event['happens']): void;
  /** Lets everything happen, the oldest first, each a little later than the one before. */
  unfold(institute: Institute): Promise<void>;
}

const STEP_MS = 60_000;

/** Signatures of the seed say that nobody was there. */
const DEMO_PROOF = 'demo, no proof of presence';

export function newChronicle(): Chronicle {
  const events: Event[] = [];
  return {
    note: (daysAgo, happens) => void events.push({ daysAgo, happens }),
    unfold: async (institute) => {
      let last = 0;
      const inOrder = [...events].sort((a, b) => b.daysAgo - a.daysAgo);
      for (const { daysAgo, happens } of inOrder) {
        await happens((person) => {
          const ctx = institute.as(person, daysAgo);
          const latest = ctx.edges.clock().getTime();
          last = Math.min(latest, Math.max(last + STEP_MS, ctx.now.getTime()));
          return { ...ctx, now: new Date(last), proof: DEMO_PROOF };
        });
      }
    },
  };
}
