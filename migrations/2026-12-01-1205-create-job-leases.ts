import { type Kysely, sql } from 'kysely';

export async function up(db: Kysely<unknown>): Promise<void> {
  await sql`
    create table job_leases (
      name text primary key,
      owner text not null,
      leased_until text not null,
      done_until text not null
    ) strict`.execute(db);
}
