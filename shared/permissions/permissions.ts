import type { Role } from '../model/people';

/**
 * How far an action reaches. `public`: no sign-in. `self`: one's own records. `own-areas`: areas one
 * supervises, as supervisor or alternate. `department`: these and the areas of one's department.
 * `site`: everything.
 */
export type Scope = 'public' | 'signed-in' | 'self' | 'own-areas' | 'department' | 'site';

type Grants = Readonly<Partial<Record<Role, Scope>>>;

const EVERYONE_READS: Grants = {
  administrator: 'site',
  lso: 'site',
  'deputy-lso': 'site',
  auditor: 'site',
  committee: 'site',
  'laser-supervisor': 'department',
  'department-head': 'department',
  operator: 'department',
  'interlock-technician': 'site',
  purchasing: 'site',
};
const EVALUATION_READERS: Grants = {
  lso: 'site',
  'deputy-lso': 'site',
  auditor: 'site',
  committee: 'site',
  'laser-supervisor': 'department',
  'department-head': 'department',
  operator: 'department',
};
const REGISTRARS: Grants = { lso: 'site', 'deputy-lso': 'site', 'laser-supervisor': 'own-areas' };

/**
 * Which role may do what, and how far. The server enforces it on every route; the client only hides
 * by it. Deciding in one's own matter is refused by the guards of the workflow, whatever the role.
 */
// prettier-ignore
export const PERMISSIONS = {
  'health.read':            { scope: 'public' },
  'session.read':           { scope: 'public' },
  'session.begin':          { scope: 'public' },
  'session.end':            { scope: 'public' },
  'account.set-up':         { scope: 'public' },
  'account.accept-invitation': { scope: 'public' },
  'api-description.read':   { scope: 'public' },
  'account.change-password': { scope: 'signed-in' },
  'case.evaluate':          { scope: 'signed-in' },
  'today.read':             { scope: 'signed-in' },
  'person.list':            { grants: { administrator: 'site', lso: 'site', 'deputy-lso': 'site', auditor: 'site', 'laser-supervisor': 'site', committee: 'site' } },
  'person.create':          { grants: { administrator: 'site' } },
  'person.update':          { grants: { administrator: 'site' } },
  'person.invite':          { grants: { administrator: 'site' } },
  'area.read':              { grants: EVERYONE_READS },
  'area.create':            { grants: { lso: 'site', administrator: 'site' } },
  'area.update':            { grants: { lso: 'site', 'deputy-lso': 'site', 'laser-supervisor': 'own-areas' } },
  'laser.read':             { grants: EVERYONE_READS },
  'laser.register':         { grants: REGISTRARS },
  'laser.declare-found':    { scope: 'signed-in' },
  'laser.update':           { grants: REGISTRARS },
  'laser.transition':       { grants: { ...REGISTRARS, committee: 'site', purchasing: 'site' } },
  'laser.import':           { grants: { lso: 'site', 'deputy-lso': 'site', 'laser-supervisor': 'own-areas' } },
  'laser.attach-file':      { grants: REGISTRARS },
  'evaluation.read':        { grants: EVALUATION_READERS },
  'evaluation.begin':       { grants: REGISTRARS },
  'evaluation.update':      { grants: REGISTRARS },
  'evaluation.transition':  { grants: { ...REGISTRARS, committee: 'site' } },
  'settings.read':          { scope: 'signed-in' },
  'settings.update':        { grants: { administrator: 'site', lso: 'site' } },
  'audit-trail.read':       { grants: { lso: 'site', 'deputy-lso': 'site', auditor: 'site', administrator: 'site' } },
  'audit-trail.verify':     { grants: { lso: 'site', auditor: 'site', administrator: 'site' } },
} as const satisfies Record<string, { scope: 'public' | 'signed-in' } | { grants: Grants }>;

export type Action = keyof typeof PERMISSIONS;

const WIDTH: Readonly<Record<Scope, number>> = {
  public: 0,
  self: 1,
  'signed-in': 1,
  'own-areas': 2,
  department: 3,
  site: 4,
};

/** The widest scope in which somebody with these roles may do `action`; undefined when not at all. */
export function scopeOf(action: Action, roles: readonly Role[]): Scope | undefined {
  const rule: { scope?: Scope; grants?: Grants } = PERMISSIONS[action];
  if (rule.scope) return rule.scope;
  return roles.flatMap((role) => rule.grants?.[role] ?? []).sort((a, b) => WIDTH[b] - WIDTH[a])[0];
}

/** Whether `action` needs no sign-in. */
export function isPublic(action: Action): boolean {
  const rule: { scope?: Scope; grants?: Grants } = PERMISSIONS[action];
  return rule.scope === 'public';
}

/** What decides whether a record lies within a scope. */
export interface Placement {
  readonly department?: string | undefined;
  readonly supervisorIds: readonly string[];
}

/** Whether a record at `place` lies within the scope of the person. */
export function covers(
  scope: Scope | undefined,
  person: { id: string; department?: string | undefined },
  place: Placement,
): boolean {
  switch (scope) {
    case 'site':
      return true;
    case 'department':
      return (
        place.supervisorIds.includes(person.id) ||
        (place.department !== undefined && place.department === person.department)
      );
    case 'own-areas':
      return place.supervisorIds.includes(person.id);
    default:
      return false;
  }
}
