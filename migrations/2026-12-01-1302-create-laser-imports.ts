import { type Kysely, sql } from 'kysely';

/** A dry run and its plan; nothing of it is a record until it is saved. */
export async function up(db: Kysely<unknown>): Promise<void> {
  await sql`
    create table laser_imports (
      id text primary key,
      person_id text not null references people (id),
      file_name text not null,
      status text not null,
      rows_total integer not null,
      rows_done integer not null,
      rows_good integer not null,
      lasers integer not null,
      errors text not null check (json_valid(errors)),
      error_count integer not null,
      warnings text not null check (json_valid(warnings)),
      plan text not null check (json_valid(plan)),
      created_at text not null,
      updated_at text not null
    ) strict`.execute(db);
  await sql`create index laser_imports_by_person on laser_imports (person_id, created_at)`.execute(
    db,
  );
}
