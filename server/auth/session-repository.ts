import type { Tx } from '../db/database';
import type { SessionTable } from './auth-table';

export async function storeSession(tx: Tx, row: SessionTable): Promise<void> {
  const { person_id, data, seen_at } = row;
  await tx
    .insertInto('sessions')
    .values(row)
    .onConflict((conflict) => conflict.column('sid_hash').doUpdateSet({ person_id, data, seen_at }))
    .execute();
}

export async function markSeen(tx: Tx, sidHash: string, at: string): Promise<void> {
  await tx
    .updateTable('sessions')
    .set({ seen_at: at })
    .where('sessions.sid_hash', '=', sidHash)
    .execute();
}

export async function removeSession(tx: Tx, sidHash: string): Promise<void> {
  await tx.deleteFrom('sessions').where('sessions.sid_hash', '=', sidHash).execute();
}

/** Ends every session of a person but the one kept. */
export async function endSessionsOf(tx: Tx, personId: string, keptSidHash = ''): Promise<void> {
  await tx
    .deleteFrom('sessions')
    .where('sessions.person_id', '=', personId)
    .where('sessions.sid_hash', '!=', keptSidHash)
    .execute();
}

/** Ends the oldest sessions of a person beyond `most`. */
export async function endOldestSessions(tx: Tx, personId: string, most: number): Promise<void> {
  const kept = tx
    .selectFrom('sessions')
    .select('sessions.sid_hash')
    .where('sessions.person_id', '=', personId)
    .orderBy('sessions.created_at', 'desc')
    .orderBy('sessions.sid_hash')
    .limit(most);
  await tx
    .deleteFrom('sessions')
    .where('sessions.person_id', '=', personId)
    .where('sessions.sid_hash', 'not in', kept)
    .execute();
}

export async function removeSessionsUnseenSince(tx: Tx, instant: string): Promise<void> {
  await tx.deleteFrom('sessions').where('sessions.seen_at', '<', instant).execute();
}
