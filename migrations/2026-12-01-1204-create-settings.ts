import { type Kysely, sql } from 'kysely';

/** One row, there from the beginning: a site always has settings. */
export async function up(db: Kysely<unknown>): Promise<void> {
  await sql`
    create table settings (
      id integer primary key check (id = 1),
      site_name text not null,
      zone text not null,
      rule_set text not null,
      class_scheme text not null,
      author_may_approve integer not null check (author_may_approve in (0, 1)),
      author_may_approve_reason text,
      evaluation_review_months integer not null,
      emergency_phone text not null,
      lso_phone text,
      version integer not null,
      updated_at text not null
    ) strict`.execute(db);
  await sql`
    insert into settings values (
      1, 'Our institute', 'UTC', 'iec-60825-1-2014', 'iec-60825-1-2014', 0, null, 24, '112', null, 1,
      strftime('%Y-%m-%dT%H:%M:%fZ', 'now')
    )`.execute(db);
}
