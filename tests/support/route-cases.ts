import { isPublic, scopeOf } from '@shared/permissions/permissions';
import { type Role, ROLES } from '@shared/model/people';

import { ROUTES } from '../../server/app';
import { isMutating, type Route } from '../../server/http/route';

export const MUTATING_ROUTES = ROUTES.filter((route) => isMutating(route.method));

export function titleOf(route: Route): string {
  return `${route.method.toUpperCase()} ${route.path}`;
}

/** The path with ids that exist nowhere. */
export function somePath(route: Route): string {
  return route.path.replaceAll(/:\w+/g, 'nothing-here');
}

/** A role that may do what the route does; undefined for a route that asks for no sign-in. */
export function someRoleFor(route: Route): Role | undefined {
  if (isPublic(route.action)) return undefined;
  const role = ROLES.find((it) => scopeOf(route.action, [it]) !== undefined);
  if (!role) throw new Error(`No role may do ${route.action}.`);
  return role;
}
