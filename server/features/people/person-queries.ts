import type { Person, personListQuerySchema } from '@shared/model/people';
import type * as z from 'zod';

import type { Tx } from '../../db/database';
import { countRows, type Page, pageByKey } from '../../db/paging';
import { hasJsonItem, matches, nocase } from '../../db/sql-helpers';
import { selectPeople, toPerson } from './person-repository';

export type PersonListQuery = z.infer<typeof personListQuerySchema>;

/** People by name. */
export async function listPeople(tx: Tx, query: PersonListQuery): Promise<Page<Person>> {
  let people = selectPeople(tx);
  if (query.role) people = people.where(hasJsonItem('people.roles', query.role));
  for (const word of query.q?.split(/\s+/).filter(Boolean) ?? []) {
    people = people.where((eb) =>
      eb.or([
        matches('people.name', word),
        matches('people.email', word),
        matches('people.department', word),
      ]),
    );
  }
  const page = await pageByKey(people, {
    keys: [
      { column: nocase('people.name'), direction: 'asc', value: (row) => row.name },
      { column: 'people.id', direction: 'asc', value: (row) => row.id },
    ],
    after: query.after,
    limit: query.limit,
    total: await countRows(people),
  });
  return { ...page, rows: page.rows.map(toPerson) };
}

export async function countActiveAdministrators(tx: Tx, exceptId = ''): Promise<number> {
  const row = await tx
    .selectFrom('people')
    .select((eb) => eb.fn.countAll<number>().as('count'))
    .where('people.active', '=', 1)
    .where('people.id', '!=', exceptId)
    .where(hasJsonItem('people.roles', 'administrator'))
    .executeTakeFirstOrThrow();
  return row.count;
}
