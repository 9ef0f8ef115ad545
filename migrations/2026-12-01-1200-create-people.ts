import { type Kysely, sql } from 'kysely';

export async function up(db: Kysely<unknown>): Promise<void> {
  await sql`
    create table people (
      id text primary key,
      name text not null,
      email text not null collate nocase unique,
      department text,
      roles text not null check (json_valid(roles)),
      active integer not null check (active in (0, 1)),
      version integer not null,
      created_at text not null
    ) strict`.execute(db);
  await sql`create index people_by_name on people (name collate nocase, id)`.execute(db);
  await sql`
    create table credentials (
      person_id text primary key references people (id),
      password_hash text not null,
      changed_at text not null
    ) strict`.execute(db);
  await sql`
    create table invitations (
      token_hash text primary key,
      person_id text not null references people (id),
      expires_at text not null,
      used_at text
    ) strict`.execute(db);
  await sql`create index invitations_by_person on invitations (person_id)`.execute(db);
  await sql`
    create table setup_tokens (
      token_hash text primary key,
      created_at text not null,
      used_at text
    ) strict`.execute(db);
}
