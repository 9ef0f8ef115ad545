import type { Tx } from '../db/database';
import type { InvitationTable } from './auth-table';

export async function insertInvitation(tx: Tx, row: InvitationTable): Promise<void> {
  await tx.insertInto('invitations').values(row).execute();
}

export function findInvitation(tx: Tx, tokenHash: string): Promise<InvitationTable | undefined> {
  return tx
    .selectFrom('invitations')
    .selectAll()
    .where('invitations.token_hash', '=', tokenHash)
    .executeTakeFirst();
}

/** Marks every open invitation of a person as used at `at`. */
export async function closeInvitations(tx: Tx, personId: string, at: string): Promise<void> {
  await tx
    .updateTable('invitations')
    .set({ used_at: at })
    .where('invitations.person_id', '=', personId)
    .where('invitations.used_at', 'is', null)
    .execute();
}

export async function replaceSetupToken(tx: Tx, tokenHash: string, at: string): Promise<void> {
  await tx.deleteFrom('setup_tokens').where('setup_tokens.used_at', 'is', null).execute();
  await tx
    .insertInto('setup_tokens')
    .values({ token_hash: tokenHash, created_at: at, used_at: null })
    .execute();
}

/** Uses up the one-time token; false when it is not the open one. */
export async function useSetupToken(tx: Tx, tokenHash: string, at: string): Promise<boolean> {
  const result = await tx
    .updateTable('setup_tokens')
    .set({ used_at: at })
    .where('setup_tokens.token_hash', '=', tokenHash)
    .where('setup_tokens.used_at', 'is', null)
    .executeTakeFirst();
  return result.numUpdatedRows === 1n;
}
