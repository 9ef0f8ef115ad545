import { acceptInvitationSchema } from '@shared/model/people';
import { changePasswordSchema, sessionSchema, setupSchema } from '@shared/model/session';

import { findActor } from '../../auth/actor-queries';
import { countAttempt, forgetAttempts } from '../../auth/attempt-limit';
import { isPasswordOf } from '../../auth/gate';
import { requireGoodPassword } from '../../auth/password-rules';
import { hashPassword } from '../../auth/passwords';
import { SYSTEM } from '../../context/context';
import { transact } from '../../context/transact';
import { InvalidInput } from '../../http/errors';
import { json, NOTHING, route } from '../../http/route';
import { readSession } from '../session/session-service';
import { acceptInvitation, setUp, storeNewPassword } from './account-service';

export const ACCOUNT_ROUTES = [
  route({
    method: 'put',
    path: '/api/session/password',
    action: 'account.change-password',
    summary: 'Change the own password; other sessions end',
    input: { body: changePasswordSchema },
    output: NOTHING,
    transaction: 'own',
    handler: async ({ ctx, body, visit }) => {
      const account = `password ${ctx.actor.id}`;
      await countAttempt(ctx.edges, account, ctx.ip);
      if (!(await isPasswordOf(ctx.edges, ctx.actor.id, body.currentPassword))) {
        const message = 'This is not your present password.';
        throw new InvalidInput([{ path: 'currentPassword', message }]);
      }
      await forgetAttempts(ctx.edges, account, ctx.ip);
      requireGoodPassword('newPassword', body.newPassword, ctx.actor);
      const passwordHash = await hashPassword(body.newPassword);
      await transact(ctx.edges, ctx, (inside) =>
        storeNewPassword(inside, { passwordHash, keptSidHash: visit.sidHash }),
      );
    },
  }),
  route({
    method: 'post',
    path: '/api/invitations/accept',
    action: 'account.accept-invitation',
    summary: 'Set a password with the one-time token of an invitation',
    input: { body: acceptInvitationSchema },
    output: NOTHING,
    transaction: 'own',
    handler: async ({ ctx, body }) => {
      await countAttempt(ctx.edges, `invitation ${body.token}`, ctx.ip);
      requireGoodPassword('password', body.password);
      const passwordHash = await hashPassword(body.password);
      await transact(ctx.edges, { ...ctx, actor: SYSTEM }, (inside) =>
        acceptInvitation(inside, { token: body.token, passwordHash }),
      );
    },
  }),
  route({
    method: 'post',
    path: '/api/setup',
    action: 'account.set-up',
    summary: 'Make the first administrator with the token that the server printed',
    input: { body: setupSchema },
    output: json(sessionSchema),
    status: 201,
    transaction: 'own',
    handler: async ({ ctx, body, visit }) => {
      await countAttempt(ctx.edges, 'setup', ctx.ip);
      requireGoodPassword('password', body.password, body);
      const passwordHash = await hashPassword(body.password);
      const id = await transact(ctx.edges, { ...ctx, actor: SYSTEM }, (inside) =>
        setUp(inside, { ...body, passwordHash }),
      );
      await visit.begin(id);
      return readSession(ctx, findActor(ctx.edges.db, id));
    },
  }),
];
