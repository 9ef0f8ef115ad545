import { type Kysely, sql } from 'kysely';

export async function up(db: Kysely<unknown>): Promise<void> {
  await sql`
    create table lasers (
      number integer primary key,
      id text not null unique,
      tag text not null collate nocase unique,
      tag_key text not null,
      maker text not null collate nocase,
      model text not null,
      serial text,
      serial_key text,
      area_id text references areas (id),
      supervisor_id text references people (id),
      alternate_id text references people (id),
      department text,
      declared_class text,
      verified_class text,
      class_rank integer not null,
      shortest_nm real not null,
      record text not null check (json_valid(record)),
      state text not null,
      state_since text not null,
      quarantine integer not null check (quarantine in (0, 1)),
      released_at text,
      waiver text check (waiver is null or json_valid(waiver)),
      waiver_until_on text,
      block text check (block is null or json_valid(block)),
      transfer_area_id text references areas (id),
      disposal_asked_by text references people (id),
      evaluation_state text not null,
      review_on text,
      reach text check (reach is null or json_valid(reach)),
      eye_distance_m real not null,
      optical_density real not null,
      attention_rank integer not null,
      created_by text,
      created_at text not null,
      updated_at text not null,
      version integer not null
    ) strict`.execute(db);
  await sql`create index lasers_by_attention on lasers (attention_rank, tag_key, id)`.execute(db);
  await sql`create index lasers_by_tag on lasers (tag_key, id)`.execute(db);
  await sql`create index lasers_by_maker on lasers (maker, tag_key, id)`.execute(db);
  await sql`create index lasers_by_class on lasers (class_rank, tag_key, id)`.execute(db);
  await sql`create index lasers_by_wavelength on lasers (shortest_nm, tag_key, id)`.execute(db);
  await sql`create index lasers_by_distance on lasers (eye_distance_m, tag_key, id)`.execute(db);
  await sql`create index lasers_by_density on lasers (optical_density, tag_key, id)`.execute(db);
  await sql`create index lasers_by_state on lasers (state, tag_key, id)`.execute(db);
  await sql`create index lasers_by_area on lasers (area_id, tag_key, id)`.execute(db);
  await sql`create index lasers_by_supervisor on lasers (supervisor_id)`.execute(db);
  await sql`create index lasers_by_alternate on lasers (alternate_id)`.execute(db);
  await sql`create index lasers_by_department on lasers (department)`.execute(db);
  await sql`create index lasers_by_serial on lasers (serial_key) where serial_key is not null`.execute(
    db,
  );
  await sql`
    create index lasers_by_waiver on lasers (waiver_until_on)
      where waiver_until_on is not null`.execute(db);
  await sql`
    create table laser_lines (
      laser_number integer not null references lasers (number),
      position integer not null,
      from_nm real not null,
      to_nm real not null,
      primary key (laser_number, position)
    ) strict, without rowid`.execute(db);
  await sql`create index laser_lines_by_wavelength on laser_lines (from_nm, to_nm)`.execute(db);
  await sql`
    create virtual table laser_search using fts5 (
      tag, serial, maker, model, tokenize = 'unicode61 remove_diacritics 2', prefix = '2 3'
    )`.execute(db);
  await sql`
    create table laser_places (
      laser_id text not null references lasers (id),
      since_at text not null,
      area_id text references areas (id),
      primary key (laser_id, since_at)
    ) strict`.execute(db);
  await sql`
    create table laser_files (
      id text primary key,
      laser_id text not null references lasers (id),
      kind text not null,
      name text not null,
      media_type text not null,
      size_bytes integer not null,
      sha256 text not null,
      note text,
      uploaded_by text not null references people (id),
      uploaded_at text not null,
      removed_at text
    ) strict`.execute(db);
  await sql`create index laser_files_by_laser on laser_files (laser_id, uploaded_at)`.execute(db);
}
