import type { Person, PersonInput } from '@shared/model/people';

import { storePasswordHash } from '../auth/credential-repository';
import { hashPassword } from '../auth/passwords';
import { type Actor, type Context, SYSTEM } from '../context/context';
import { createArea } from '../features/areas/areas-service';
import { changePerson, createPerson } from '../features/people/people-service';
import { DEMO_PASSWORD, demoEmail } from '../config/demo-accounts';
import { changeSettings } from '../features/settings/settings-service';
import { DEMO_AREAS } from './demo-areas';
import { DEMO_PEOPLE, type DemoPerson, type DemoPersonId, DEPARTMENTS } from './demo-people';

/** Days before today on which people and areas were recorded. */
const FOUNDED_DAYS_AGO = 900;
const DAY_MS = 24 * 60 * 60 * 1000;
/** 08:30 UTC: within the working day of the site. */
const MORNING_MS = 8.5 * 60 * 60 * 1000;

/** The institute as recorded: who and where, for the parts of the seed that build on it. */
export interface Institute {
  /** The context in which a person does something some days before today. */
  as(person: DemoPersonId, daysAgo: number): Context;
  personId(person: DemoPersonId): string;
  areaId(code: string): string;
}

/** Settings, people and areas of the demo institute, recorded through the services. */
export async function seedInstitute(ctx: Context): Promise<Institute> {
  const people = await seedPeople(ctx);
  const areaIds = new Map<string, string>();
  const institute: Institute = {
    as: (id, daysAgo) => at({ ...ctx, actor: actorFrom(need(people, id)) }, daysAgo),
    personId: (id) => need(people, id).id,
    areaId: (code) => need(areaIds, code),
  };
  const lso = institute.as('P01', FOUNDED_DAYS_AGO);
  for (const { supervisor, alternate, department, ...area } of DEMO_AREAS) {
    const { id } = await createArea(lso, {
      ...area,
      room: area.code,
      department: DEPARTMENTS[department],
      supervisorId: institute.personId(supervisor),
      alternateId: alternate && institute.personId(alternate),
    });
    areaIds.set(area.code, id);
  }
  await seedSettings(institute.as('P04', FOUNDED_DAYS_AGO));
  return institute;
}

/** Those who left, once everything they did is recorded. */
export async function seedLeavers(institute: Institute): Promise<void> {
  for (const [id, person] of Object.entries(DEMO_PEOPLE) as [DemoPersonId, DemoPerson][]) {
    if (person.leftDaysAgo === undefined) continue;
    const ctx = institute.as('P04', person.leftDaysAgo);
    const input: PersonInput = { ...inputOf(person), active: false };
    await changePerson(ctx, institute.personId(id), { version: 1, input });
  }
}

async function seedPeople(ctx: Context): Promise<Map<string, Person>> {
  const people = new Map<string, Person>();
  const passwordHash = await hashPassword(DEMO_PASSWORD);
  const founding = at({ ...ctx, actor: SYSTEM }, FOUNDED_DAYS_AGO);
  const administrator = await createPerson(founding, inputOf(DEMO_PEOPLE.P04));
  people.set('P04', administrator);
  const recording: Context = { ...founding, actor: actorFrom(administrator) };
  for (const [id, person] of Object.entries(DEMO_PEOPLE)) {
    if (id !== 'P04') people.set(id, await createPerson(recording, inputOf(person)));
  }
  for (const { id } of people.values()) {
    await storePasswordHash(ctx.tx, id, { passwordHash, at: founding.now.toISOString() });
  }
  return people;
}

async function seedSettings(ctx: Context): Promise<void> {
  await changeSettings(ctx, {
    version: 1,
    input: {
      siteName: 'Halvermere Institute',
      zone: 'Europe/Berlin',
      ruleSet: 'iec-60825-1-2014',
      classScheme: 'iec-60825-1-2014',
      authorMayApprove: false,
      evaluationReviewMonths: 24,
      emergencyPhone: '555-0100',
      lsoPhone: '555-0101',
    },
  });
}

function at(ctx: Context, daysAgo: number): Context {
  const today = Math.floor(ctx.edges.clock().getTime() / DAY_MS) * DAY_MS;
  return { ...ctx, now: new Date(today - daysAgo * DAY_MS + MORNING_MS) };
}

function actorFrom({ id, name, email, department, roles }: Person): Actor {
  return { id, name, email, department, roles, areaIds: [] };
}

function inputOf(person: DemoPerson): PersonInput {
  return {
    name: person.name,
    email: person.email ?? demoEmail(person.name),
    department: person.department && DEPARTMENTS[person.department],
    roles: person.role ? [person.role] : [],
    active: true,
  };
}

function need<T>(map: ReadonlyMap<string, T>, key: string): T {
  const value = map.get(key);
  if (value === undefined) throw new Error(`The demo institute has no ${key}.`);
  return value;
}
