import type { Person, PersonInput, personListQuerySchema } from '@shared/model/people';
import type * as z from 'zod';

import { changesBetween, recordChange } from '../../audit-trail/record-change';
import { issueInvitation } from '../../auth/invitations';
import { endSessions } from '../../auth/sign-out-everywhere';
import type { Context } from '../../context/context';
import { newId } from '../../db/new-id';
import type { Page } from '../../db/paging';
import { Conflict, NotFound } from '../../http/errors';
import { requireVersion } from '../../http/etag';
import { countActiveAdministrators, listPeople } from './person-queries';
import { findPerson, findPersonIdByEmail, insertPerson, updatePerson } from './person-repository';

export type ReadContext = Pick<Context, 'tx'>;

export function readPeople(
  ctx: ReadContext,
  query: z.infer<typeof personListQuerySchema>,
): Promise<Page<Person>> {
  return listPeople(ctx.tx, query);
}

export async function readPerson(ctx: ReadContext, id: string): Promise<Person> {
  const person = await findPerson(ctx.tx, id);
  if (!person) throw new NotFound('person');
  return person;
}

export async function createPerson(ctx: Context, input: PersonInput): Promise<Person> {
  await requireFreeEmail(ctx, input.email, undefined);
  const person: Person = {
    ...normalized(input),
    id: newId(),
    version: 1,
    createdAt: ctx.now.toISOString(),
    hasPassword: false,
  };
  await insertPerson(ctx.tx, person);
  await recordPerson(ctx, 'person.create', { before: null, after: person });
  return person;
}

export async function changePerson(
  ctx: Context,
  id: string,
  { version, input }: { version: number; input: PersonInput },
): Promise<Person> {
  const before = await readPerson(ctx, id);
  requireVersion(before, version);
  await requireFreeEmail(ctx, input.email, id);
  const after: Person = { ...before, ...normalized(input), version: version + 1 };
  await requireAnAdministrator(ctx, before, after);
  await updatePerson(ctx.tx, after);
  await recordPerson(ctx, 'person.update', { before, after });
  // Rights that were lost, or gained, take a new sign-in.
  if (!after.active || before.roles.join() !== after.roles.join()) await endSessions(ctx, id);
  return after;
}

/** A person who can set a password by the token, once, within the hour. */
export async function invitePerson(
  ctx: Context,
  id: string,
): Promise<{ person: Person; invitationToken: string }> {
  const person = await readPerson(ctx, id);
  if (!person.active) throw new Conflict(`${person.name} is not active and cannot be invited.`);
  const invitationToken = await issueInvitation(ctx, person.id);
  await recordChange(ctx, {
    action: 'person.invite',
    recordKind: 'person',
    recordId: person.id,
    recordName: person.name,
  });
  return { person, invitationToken };
}

export async function hasAdministrator(ctx: ReadContext): Promise<boolean> {
  return (await countActiveAdministrators(ctx.tx)) > 0;
}

/** A person named in another record must exist. */
export async function findPersonName(ctx: ReadContext, id: string): Promise<string | undefined> {
  return (await findPerson(ctx.tx, id))?.name;
}

function normalized(input: PersonInput): PersonInput {
  return { ...input, department: input.department || undefined, roles: [...new Set(input.roles)] };
}

async function requireFreeEmail(ctx: Context, email: string, ownId: string | undefined) {
  const holder = await findPersonIdByEmail(ctx.tx, email);
  if (holder === undefined || holder === ownId) return;
  const message = `Somebody with the address ${email} is recorded already.`;
  throw new Conflict(message, [{ path: 'email', message }]);
}

async function requireAnAdministrator(ctx: Context, before: Person, after: Person) {
  const is = (person: Person): boolean => person.active && person.roles.includes('administrator');
  if (!is(before) || is(after)) return;
  if ((await countActiveAdministrators(ctx.tx, after.id)) > 0) return;
  throw new Conflict('This is the last active administrator; name another one first.');
}

function recordPerson(
  ctx: Context,
  action: string,
  { before, after }: { before: Person | null; after: Person },
): Promise<void> {
  return recordChange(ctx, {
    action,
    recordKind: 'person',
    recordId: after.id,
    recordName: after.name,
    changes: changesBetween(before && inputOf(before), inputOf(after)),
  });
}

function inputOf({ name, email, department, roles, active }: Person): PersonInput {
  return { name, email, department, roles, active };
}
