import type { Role } from '@shared/model/people';

import { recordChange } from '../../audit-trail/record-change';
import { storePasswordHash } from '../../auth/credential-repository';
import { replaceSetupToken, useSetupToken } from '../../auth/invitation-repository';
import { useInvitation } from '../../auth/invitations';
import { endSessions } from '../../auth/sign-out-everywhere';
import { newToken, tokenHash } from '../../auth/tokens';
import { acting, type Context, type Edges, SYSTEM } from '../../context/context';
import { bookkeeping, transact } from '../../context/transact';
import { Gone } from '../../http/errors';
import { createPerson, hasAdministrator, readPerson } from '../people/people-service';

/** A new password of the signed-in person; every other session of that person ends. */
export async function storeNewPassword(
  ctx: Context,
  { passwordHash, keptSidHash }: { passwordHash: string; keptSidHash: string },
): Promise<void> {
  await storePasswordHash(ctx.tx, ctx.actor.id, { passwordHash, at: ctx.now.toISOString() });
  await endSessions(ctx, ctx.actor.id, keptSidHash);
  await recordChange(ctx, {
    action: 'account.change-password',
    recordKind: 'account',
    recordId: ctx.actor.id,
    recordName: ctx.actor.name,
  });
}

/** Sets the password of the person who was invited. */
export async function acceptInvitation(
  ctx: Context,
  { token, passwordHash }: { token: string; passwordHash: string },
): Promise<void> {
  const personId = await useInvitation(ctx, token);
  const person = await readPerson(ctx, personId);
  if (!person.active) throw new Gone('This account is not active.');
  await storePasswordHash(ctx.tx, personId, { passwordHash, at: ctx.now.toISOString() });
  await endSessions(ctx, personId);
  await recordChange(
    { ...ctx, actor: { ...person, areaIds: [] } },
    {
      action: 'account.accept-invitation',
      recordKind: 'account',
      recordId: personId,
      recordName: person.name,
    },
  );
}

export interface FirstAdministrator {
  readonly token: string;
  readonly name: string;
  readonly email: string;
  readonly passwordHash: string;
}

/** Makes the first administrator with the one-time token; answers the id. */
export async function setUp(ctx: Context, given: FirstAdministrator): Promise<string> {
  if (await hasAdministrator(ctx)) throw new Gone('This site is set up already.');
  const isRight = await useSetupToken(ctx.tx, tokenHash(given.token), ctx.now.toISOString());
  if (!isRight) throw new Gone('This is not the token that the server printed at its last start.');
  const roles: Role[] = ['administrator'];
  const { name, email, passwordHash } = given;
  const person = await createPerson(ctx, { name, email, roles, active: true });
  await storePasswordHash(ctx.tx, person.id, { passwordHash, at: ctx.now.toISOString() });
  await recordChange(ctx, {
    action: 'account.set-up',
    recordKind: 'account',
    recordId: person.id,
    recordName: person.name,
  });
  return person.id;
}

/** The token for the first administrator, while there is none; earlier ones end. */
export async function offerSetup(edges: Edges): Promise<string | undefined> {
  const isSetUp = await transact(edges, acting(SYSTEM, 'start'), hasAdministrator);
  if (isSetUp) return undefined;
  const token = newToken();
  const at = edges.clock().toISOString();
  await bookkeeping(edges, (tx) => replaceSetupToken(tx, tokenHash(token), at));
  return token;
}
