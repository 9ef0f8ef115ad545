import { type Action, covers, type Placement, scopeOf } from '@shared/permissions/permissions';

import type { Actor } from '../context/context';
import { NotAllowed, NotFound } from '../http/errors';

interface Asking {
  readonly actor: Actor;
}

/** Whether the person may do `action` to a record at this place. */
export function isInScope({ actor }: Asking, action: Action, place: Placement): boolean {
  return covers(scopeOf(action, actor.roles), actor, place);
}

/** Refuses an action on a record outside the person's scope; what may not be read is not there. */
export function requireScope(
  ctx: Asking,
  action: Action,
  { place, what }: { place: Placement; what: string },
): void {
  if (isInScope(ctx, action, place)) return;
  if (action.endsWith('.read')) throw new NotFound(what);
  throw new NotAllowed(`Your roles do not reach this ${what}.`);
}

/** How far an action reaches, for the `where` of a list; see `withinReach` in `db/sql-helpers`. */
export type Reach =
  | { readonly kind: 'everything' }
  | { readonly kind: 'areas'; readonly personId: string; readonly department: string | undefined }
  | { readonly kind: 'nothing' };

export function reachOf({ actor }: Asking, action: Action): Reach {
  switch (scopeOf(action, actor.roles)) {
    case 'site':
      return { kind: 'everything' };
    case 'department':
      return { kind: 'areas', personId: actor.id, department: actor.department };
    case 'own-areas':
      return { kind: 'areas', personId: actor.id, department: undefined };
    default:
      return { kind: 'nothing' };
  }
}
