import type { Tx } from '../db/database';
import type { AttemptTable } from './auth-table';

export function findAttempts(tx: Tx, key: string): Promise<AttemptTable | undefined> {
  return tx.selectFrom('attempts').selectAll().where('attempts.key', '=', key).executeTakeFirst();
}

export async function storeAttempts(tx: Tx, row: AttemptTable): Promise<void> {
  await tx
    .insertInto('attempts')
    .values(row)
    .onConflict((conflict) => conflict.column('key').doUpdateSet(row))
    .execute();
}

export async function clearAttempts(tx: Tx, key: string): Promise<void> {
  await tx.deleteFrom('attempts').where('attempts.key', '=', key).execute();
}

export async function removeAttemptsBefore(tx: Tx, instant: string): Promise<void> {
  await tx.deleteFrom('attempts').where('attempts.window_started_at', '<', instant).execute();
}
