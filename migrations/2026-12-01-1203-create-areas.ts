import { type Kysely, sql } from 'kysely';

export async function up(db: Kysely<unknown>): Promise<void> {
  await sql`
    create table areas (
      id text primary key,
      code text not null collate nocase unique,
      name text not null,
      building text not null,
      room text not null,
      department text not null,
      supervisor_id text references people (id),
      alternate_id text references people (id),
      wall_distance_m real,
      phone text,
      note text,
      version integer not null,
      created_at text not null
    ) strict`.execute(db);
  await sql`create index areas_by_department on areas (department, code)`.execute(db);
  await sql`create index areas_by_supervisor on areas (supervisor_id)`.execute(db);
  await sql`create index areas_by_alternate on areas (alternate_id)`.execute(db);
}
