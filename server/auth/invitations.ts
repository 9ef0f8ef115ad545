import type { Context } from '../context/context';
import { Gone } from '../http/errors';
import { closeInvitations, findInvitation, insertInvitation } from './invitation-repository';
import { newToken, tokenHash } from './tokens';

const VALID_MIN = 60;

/** A new one-time token for setting a password; earlier ones of the person end. */
export async function issueInvitation(ctx: Context, personId: string): Promise<string> {
  const token = newToken();
  await closeInvitations(ctx.tx, personId, ctx.now.toISOString());
  await insertInvitation(ctx.tx, {
    token_hash: tokenHash(token),
    person_id: personId,
    expires_at: new Date(ctx.now.getTime() + VALID_MIN * 60_000).toISOString(),
    used_at: null,
  });
  return token;
}

/** Uses an invitation up; answers whose it was. */
export async function useInvitation(ctx: Context, token: string): Promise<string> {
  const row = await findInvitation(ctx.tx, tokenHash(token));
  if (!row || row.used_at !== null || row.expires_at <= ctx.now.toISOString()) {
    throw new Gone('This invitation was used or has ended. Ask an administrator for a new one.');
  }
  await closeInvitations(ctx.tx, row.person_id, ctx.now.toISOString());
  return row.person_id;
}
