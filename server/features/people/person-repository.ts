import type { Person, PersonInput, Role } from '@shared/model/people';

import { flag, type Tx } from '../../db/database';
import type { PersonTable } from './people-table';

export async function insertPerson(tx: Tx, person: Person): Promise<void> {
  await tx
    .insertInto('people')
    .values({
      id: person.id,
      version: person.version,
      created_at: person.createdAt,
      ...columnsOf(person),
    })
    .execute();
}

export async function updatePerson(tx: Tx, person: Person): Promise<void> {
  await tx
    .updateTable('people')
    .set({ version: person.version, ...columnsOf(person) })
    .where('people.id', '=', person.id)
    .execute();
}

export async function findPerson(tx: Tx, id: string): Promise<Person | undefined> {
  const row = await selectPeople(tx).where('people.id', '=', id).executeTakeFirst();
  return row && toPerson(row);
}

export function findPersonIdByEmail(tx: Tx, email: string): Promise<string | undefined> {
  return tx
    .selectFrom('people')
    .select('people.id')
    .where('people.email', '=', email)
    .executeTakeFirst()
    .then((row) => row?.id);
}

export type PersonRow = PersonTable & { password_hash: string | null };

/** People with what tells whether they have a password. */
export function selectPeople(tx: Tx) {
  return tx
    .selectFrom('people')
    .leftJoin('credentials', 'credentials.person_id', 'people.id')
    .selectAll('people')
    .select('credentials.password_hash');
}

export function toPerson(row: PersonRow): Person {
  return {
    id: row.id,
    version: row.version,
    createdAt: row.created_at,
    name: row.name,
    email: row.email,
    department: row.department ?? undefined,
    roles: JSON.parse(row.roles) as Role[],
    active: row.active === 1,
    hasPassword: row.password_hash !== null,
  };
}

function columnsOf(input: PersonInput) {
  return {
    name: input.name,
    email: input.email,
    department: input.department ?? null,
    roles: JSON.stringify(input.roles),
    active: flag(input.active),
  };
}
