import type { Role } from '@shared/model/people';

import type { Actor } from '../context/context';
import type { Db } from '../db/open-database';

interface ActorRow {
  id: string;
  name: string;
  email: string;
  department: string | null;
  roles: string;
  area_ids: string;
}

const ACTOR_SQL = `
  select people.id, people.name, people.email, people.department, people.roles,
    (select json_group_array(areas.id) from areas
     where areas.supervisor_id = people.id or areas.alternate_id = people.id) as area_ids
  from people
  where people.id = ? and people.active = 1`;

const ID_SQL = 'select people.id from people where people.email = ? and people.active = 1';

/** The person as recorded now; undefined when not there or not active. Read at every request. */
export function findActor(db: Db, personId: string): Actor | undefined {
  const row = db.prepareRead<ActorRow>(ACTOR_SQL).get(personId);
  if (!row) return undefined;
  return {
    id: row.id,
    name: row.name,
    email: row.email,
    department: row.department ?? undefined,
    roles: JSON.parse(row.roles) as Role[],
    areaIds: JSON.parse(row.area_ids) as string[],
  };
}

/** The active person with this e-mail address, in any case of letters. */
export function findActorByEmail(db: Db, email: string): Actor | undefined {
  const row = db.prepareRead<{ id: string }>(ID_SQL).get(email);
  return row && findActor(db, row.id);
}
