import { type Kysely, sql } from 'kysely';

/** What is sealed never changes: the triggers refuse it whoever asks. */
export async function up(db: Kysely<unknown>): Promise<void> {
  await sql`
    create table evaluations (
      id text primary key,
      laser_id text not null references lasers (id),
      number integer not null,
      state text not null,
      round integer not null,
      author_id text not null references people (id),
      checker_id text references people (id),
      approver_id text references people (id),
      rule_set text not null,
      edition text not null,
      input text not null check (json_valid(input)),
      laser_inputs text not null check (json_valid(laser_inputs)),
      laser_inputs_hash text not null,
      engine_version text not null,
      results text not null check (json_valid(results)),
      eye_distance_m real,
      skin_distance_m real,
      optical_density real,
      sealed_at text,
      signed_at text,
      review_on text,
      supersedes_id text references evaluations (id),
      superseded_by_id text references evaluations (id),
      stale_reasons text not null check (json_valid(stale_reasons)),
      return_comment text,
      created_at text not null,
      updated_at text not null,
      version integer not null,
      unique (laser_id, number)
    ) strict`.execute(db);
  await sql`create index evaluations_by_update on evaluations (updated_at, id)`.execute(db);
  await sql`create index evaluations_by_state on evaluations (state, updated_at, id)`.execute(db);
  await sql`create index evaluations_by_author on evaluations (author_id, state)`.execute(db);
  await sql`
    create index evaluations_by_review on evaluations (review_on) where state = 'approved'`.execute(
    db,
  );
  await sql`
    create table evaluation_signatures (
      id text primary key,
      evaluation_id text not null references evaluations (id),
      round integer not null,
      meaning text not null,
      signer_id text not null references people (id),
      signer_name text not null,
      signer_role text not null,
      acting_for text,
      at text not null,
      zone text not null,
      statement text not null,
      comment text,
      proof text not null,
      content_sha256 text not null,
      sha256 text not null
    ) strict`.execute(db);
  await sql`
    create index evaluation_signatures_by_evaluation
      on evaluation_signatures (evaluation_id, at)`.execute(db);
  await sql`
    create table evaluation_seals (
      evaluation_id text primary key references evaluations (id),
      canonical_json text not null check (json_valid(canonical_json)),
      sha256 text not null,
      sealed_at text not null
    ) strict`.execute(db);
  await sql`
    create trigger evaluations_no_delete before delete on evaluations
    begin select raise(abort, 'an evaluation is never deleted'); end`.execute(db);
  await sql`
    create trigger evaluations_sealed before update of
      id, laser_id, number, author_id, checker_id, approver_id, rule_set, edition, input,
      laser_inputs, laser_inputs_hash, engine_version, results, eye_distance_m, skin_distance_m,
      optical_density, sealed_at, signed_at, supersedes_id
    on evaluations when old.sealed_at is not null
    begin select raise(abort, 'a sealed evaluation is never changed'); end`.execute(db);
  await sql`
    create trigger evaluation_signatures_no_update before update on evaluation_signatures
    begin select raise(abort, 'a signature is never changed'); end`.execute(db);
  await sql`
    create trigger evaluation_signatures_no_delete before delete on evaluation_signatures
    begin select raise(abort, 'a signature is never deleted'); end`.execute(db);
  await sql`
    create trigger evaluation_seals_no_update before update on evaluation_seals
    begin select raise(abort, 'a seal is never changed'); end`.execute(db);
  await sql`
    create trigger evaluation_seals_no_delete before delete on evaluation_seals
    begin select raise(abort, 'a seal is never deleted'); end`.execute(db);
}
