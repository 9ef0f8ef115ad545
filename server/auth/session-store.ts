import { createHash } from 'node:crypto';

import session, { type SessionData } from 'express-session';

import { bookkeeping } from '../context/transact';
import type { Edges } from '../context/context';
import type { SessionTable } from './auth-table';
import {
  markSeen,
  removeSession,
  removeSessionsUnseenSince,
  storeSession,
} from './session-repository';

export const IDLE_TIMEOUT_S = 30 * 60;
export const ABSOLUTE_TIMEOUT_S = 12 * 60 * 60;

/** Seen less than this ago: no write for one more request. */
const SEEN_STEP_S = 30;

type Callback<T = void> = (error?: unknown, result?: T) => void;

/** Sessions in the product's own database, by the hash of their id. */
export class SessionStore extends session.Store {
  readonly #edges: Pick<Edges, 'db' | 'clock'>;

  constructor(edges: Pick<Edges, 'db' | 'clock'>) {
    super();
    this.#edges = edges;
  }

  override get(sid: string, callback: Callback<SessionData | null>): void {
    answer(callback, async () => {
      const row = this.#find(sid);
      if (!row) return null;
      if (!this.#hasEnded(row)) return JSON.parse(row.data) as SessionData;
      await bookkeeping(this.#edges, (tx) => removeSession(tx, row.sid_hash));
      return null;
    });
  }

  override set(sid: string, data: SessionData, callback: Callback = () => undefined): void {
    const now = this.#edges.clock().toISOString();
    answer(callback, () =>
      bookkeeping(this.#edges, (tx) =>
        storeSession(tx, {
          sid_hash: hashOfSid(sid),
          person_id: data.passport?.user ?? null,
          data: JSON.stringify(data),
          created_at: now,
          seen_at: now,
        }),
      ),
    );
  }

  override touch(sid: string, _data: SessionData, callback: Callback = () => undefined): void {
    answer(callback, async () => {
      const row = this.#find(sid);
      if (!row || this.#secondsSince(row.seen_at) < SEEN_STEP_S) return;
      const now = this.#edges.clock().toISOString();
      await bookkeeping(this.#edges, (tx) => markSeen(tx, row.sid_hash, now));
    });
  }

  override destroy(sid: string, callback: Callback = () => undefined): void {
    answer(callback, () => bookkeeping(this.#edges, (tx) => removeSession(tx, hashOfSid(sid))));
  }

  /** Removes what nobody can use any more. */
  async purge(): Promise<void> {
    const unseenSince = new Date(this.#edges.clock().getTime() - IDLE_TIMEOUT_S * 1000);
    await bookkeeping(this.#edges, (tx) =>
      removeSessionsUnseenSince(tx, unseenSince.toISOString()),
    );
  }

  #find(sid: string): SessionTable | undefined {
    return this.#edges.db
      .prepareRead<SessionTable>('select * from sessions where sid_hash = ?')
      .get(hashOfSid(sid));
  }

  #hasEnded(row: SessionTable): boolean {
    return (
      this.#secondsSince(row.seen_at) > IDLE_TIMEOUT_S ||
      this.#secondsSince(row.created_at) > ABSOLUTE_TIMEOUT_S
    );
  }

  #secondsSince(instant: string): number {
    return (this.#edges.clock().getTime() - Date.parse(instant)) / 1000;
  }
}

export function hashOfSid(sid: string): string {
  return createHash('sha256').update(sid).digest('hex');
}

/** express-session speaks in callbacks. */
function answer<T>(callback: Callback<T>, work: () => Promise<T>): void {
  work().then(
    (result) => callback(undefined, result),
    (error: unknown) => callback(error),
  );
}

declare module 'express-session' {
  interface SessionData {
    /** Kept by passport: the id of the signed-in person. */
    passport?: { user?: string };
  }
}
