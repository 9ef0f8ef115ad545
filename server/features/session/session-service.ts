import type { Session } from '@shared/model/session';

import { recordChange } from '../../audit-trail/record-change';
import { IDLE_TIMEOUT_S } from '../../auth/session-store';
import type { Actor, Context, Edges } from '../../context/context';
import { transact } from '../../context/transact';
import type { OpenContext } from '../../http/route';
import { hasAdministrator } from '../people/people-service';
import { readSettings } from '../settings/settings-service';
import { demoAccounts } from '../../config/demo-accounts';

/** Who is signed in here, and what the sign-in page needs to know. */
export async function readSession(
  ctx: Pick<OpenContext, 'tx' | 'edges'>,
  actor: Actor | undefined,
): Promise<Session> {
  const settings = await readSettings(ctx);
  return {
    user: actor ? userOf(actor) : null,
    site: { name: settings.siteName, zone: settings.zone },
    demo: ctx.edges.config.production ? null : { accounts: demoAccounts() },
    needsSetup: !(await hasAdministrator(ctx)),
    idleTimeoutS: IDLE_TIMEOUT_S,
  };
}

/** Notes in the trail that a session began or ended. */
export function recordSession(
  ctx: Pick<Context, 'edges' | 'requestId' | 'ip' | 'via'>,
  actor: Actor,
  action: 'session.begin' | 'session.end',
): Promise<void> {
  const { requestId, ip, via } = ctx;
  return transact(ctx.edges, { actor, requestId, ip, via, proof: null }, (inside) =>
    recordChange(inside, {
      action,
      recordKind: 'session',
      recordId: actor.id,
      recordName: actor.name,
    }),
  );
}

/** For the log of the machine: no name that was typed, only that it failed and from where. */
export function logFailedSignIn(
  edges: Edges,
  { requestId, ip }: { requestId: string; ip: string },
) {
  edges.log.warn({ requestId, ip, event: 'session.refused' }, 'sign-in refused');
}

function userOf(actor: Actor): Session['user'] {
  const { id, name, email, department, roles, areaIds } = actor;
  return { id, name, email, department, roles: [...roles], areaIds: [...areaIds] };
}
