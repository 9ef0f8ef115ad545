import { sessionSchema, signInSchema } from '@shared/model/session';

import { countAttempt, forgetAttempts } from '../../auth/attempt-limit';
import { NotSignedIn } from '../../http/errors';
import { json, NOTHING, route } from '../../http/route';
import { logFailedSignIn, readSession, recordSession } from './session-service';

export const SESSION_ROUTES = [
  route({
    method: 'get',
    path: '/api/session',
    action: 'session.read',
    summary: 'Who is signed in; also sets the cookie that changes have to prove',
    output: json(sessionSchema),
    handler: ({ ctx }) => readSession(ctx, ctx.actor),
  }),
  route({
    method: 'post',
    path: '/api/session',
    action: 'session.begin',
    summary: 'Sign in',
    input: { body: signInSchema },
    output: json(sessionSchema),
    transaction: 'own',
    handler: async ({ ctx, body, visit }) => {
      await countAttempt(ctx.edges, body.email, ctx.ip);
      const actor = await visit.check(body);
      if (!actor) {
        logFailedSignIn(ctx.edges, ctx);
        throw new NotSignedIn('The e-mail address or the password is not right.');
      }
      await forgetAttempts(ctx.edges, body.email, ctx.ip);
      await visit.begin(actor.id);
      await recordSession(ctx, actor, 'session.begin');
      return readSession(ctx, actor);
    },
  }),
  route({
    method: 'delete',
    path: '/api/session',
    action: 'session.end',
    summary: 'Sign out',
    output: NOTHING,
    transaction: 'own',
    handler: async ({ ctx, visit }) => {
      if (ctx.actor) await recordSession(ctx, ctx.actor, 'session.end');
      await visit.end();
    },
  }),
];
