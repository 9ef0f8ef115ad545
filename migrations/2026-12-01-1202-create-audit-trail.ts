import { type Kysely, sql } from 'kysely';

export async function up(db: Kysely<unknown>): Promise<void> {
  await sql`
    create table audit_trail (
      sequence integer primary key,
      at text not null,
      actor_id text,
      actor_name text not null,
      actor_role text not null,
      acting_for text,
      action text not null,
      record_kind text not null,
      record_id text not null,
      record_name text not null,
      from_state text,
      to_state text,
      changes text not null check (json_valid(changes)),
      reason text,
      request_id text not null,
      ip text not null,
      via text not null,
      hash text not null
    ) strict`.execute(db);
  await sql`
    create index audit_trail_by_record on audit_trail (record_kind, record_id, sequence)`.execute(
    db,
  );
  await sql`create index audit_trail_by_actor on audit_trail (actor_id, sequence)`.execute(db);
  await sql`create index audit_trail_by_action on audit_trail (action, sequence)`.execute(db);
  await sql`create index audit_trail_by_time on audit_trail (at)`.execute(db);
  await sql`
    create table trail_checkpoints (
      sequence integer primary key,
      hash text not null,
      at text not null,
      signature text not null
    ) strict`.execute(db);
  await sql`
    create trigger audit_trail_no_update before update on audit_trail
    begin select raise(abort, 'the audit trail is append-only'); end`.execute(db);
  await sql`
    create trigger audit_trail_no_delete before delete on audit_trail
    begin select raise(abort, 'the audit trail is append-only'); end`.execute(db);
  await sql`
    create trigger trail_checkpoints_no_update before update on trail_checkpoints
    begin select raise(abort, 'the checkpoints are append-only'); end`.execute(db);
  await sql`
    create trigger trail_checkpoints_no_delete before delete on trail_checkpoints
    begin select raise(abort, 'the checkpoints are append-only'); end`.execute(db);
}
