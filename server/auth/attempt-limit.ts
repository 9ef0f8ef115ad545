import { createHash } from 'node:crypto';

import { bookkeeping } from '../context/transact';
import type { Edges } from '../context/context';
import { TooMany } from '../http/errors';
import {
  clearAttempts,
  findAttempts,
  removeAttemptsBefore,
  storeAttempts,
} from './attempt-repository';

const WINDOW_S = 15 * 60;

/** Most attempts in fifteen minutes. The counters live in the database: a restart resets nothing. */
export const ATTEMPT_LIMITS = { accountAndIp: 10, ip: 100 } as const;

type Counters = Pick<Edges, 'db' | 'clock'>;

/** Counts one attempt with a password or a token; refuses it when there were too many. */
export async function countAttempt(edges: Counters, account: string, ip: string): Promise<void> {
  const now = edges.clock();
  const waitS = await bookkeeping(edges, async (tx) => {
    const limits = [
      { key: keyOf('account', account, ip), most: ATTEMPT_LIMITS.accountAndIp },
      { key: keyOf('ip', ip), most: ATTEMPT_LIMITS.ip },
    ];
    let wait = 0;
    for (const { key, most } of limits) {
      const row = await findAttempts(tx, key);
      const ageS = row ? (now.getTime() - Date.parse(row.window_started_at)) / 1000 : Infinity;
      const isOpen = row !== undefined && ageS < WINDOW_S;
      if (isOpen && row.count >= most) wait = Math.max(wait, WINDOW_S - ageS);
      await storeAttempts(tx, {
        key,
        window_started_at: isOpen ? row.window_started_at : now.toISOString(),
        count: isOpen ? Math.min(row.count + 1, most + 1) : 1,
      });
    }
    return wait;
  });
  if (waitS > 0) {
    const minutes = Math.ceil(waitS / 60);
    throw new TooMany(`Too many attempts. Try again in ${minutes} min.`, waitS);
  }
}

/** After a success the account's counter starts anew; the address's does not. */
export function forgetAttempts(edges: Counters, account: string, ip: string): Promise<void> {
  return bookkeeping(edges, (tx) => clearAttempts(tx, keyOf('account', account, ip)));
}

export function purgeAttempts(edges: Counters): Promise<void> {
  const before = new Date(edges.clock().getTime() - WINDOW_S * 1000).toISOString();
  return bookkeeping(edges, (tx) => removeAttemptsBefore(tx, before));
}

/** Hashed, so that the table is no list of what people typed as their name. */
function keyOf(...parts: readonly string[]): string {
  return createHash('sha256').update(parts.join('\n').toLowerCase()).digest('base64url');
}
