import { type Kysely, sql } from 'kysely';

export async function up(db: Kysely<unknown>): Promise<void> {
  await sql`
    create table sessions (
      sid_hash text primary key,
      person_id text references people (id),
      data text not null,
      created_at text not null,
      seen_at text not null
    ) strict`.execute(db);
  await sql`create index sessions_by_person on sessions (person_id, created_at)`.execute(db);
  await sql`create index sessions_by_seen on sessions (seen_at)`.execute(db);
  await sql`
    create table attempts (
      key text primary key,
      window_started_at text not null,
      count integer not null
    ) strict`.execute(db);
  await sql`create index attempts_by_window on attempts (window_started_at)`.execute(db);
}
