import type { PersonRef } from '@shared/model/common';
import { classRank } from '@shared/model/laser-summary';
import type { LaserInput, Reach } from '@shared/model/lasers';
import type { LaserState } from '@shared/workflow/laser-life-cycle';
import { type ExpressionBuilder, type Kysely, type Selectable, sql } from 'kysely';

import { type Database, flag, type Tx } from '../../db/database';
import {
  type LaserRecord,
  type PlaceOf,
  serialKey,
  type StoredBlock,
  type StoredWaiver,
  tagKey,
} from './laser-record';
import { type EvaluationStanding, type LaserTable, NO_ATTENTION } from './laser-table';

/** A laser without any line sorts behind all others. */
const NO_WAVELENGTH_NM = 1e9;

interface JoinedRow extends Selectable<LaserTable> {
  area_code: string | null;
  area_name: string | null;
  area_department: string | null;
  area_supervisor_id: string | null;
  area_alternate_id: string | null;
  area_wall_distance_m: number | null;
  supervisor_name: string | null;
  alternate_name: string | null;
  area_supervisor_name: string | null;
}

/** Lasers with their area and people, for one record or a list. */
export function selectLasers(tx: Tx) {
  return tx
    .selectFrom('lasers')
    .leftJoin('areas', 'areas.id', 'lasers.area_id')
    .leftJoin('people as supervisors', 'supervisors.id', 'lasers.supervisor_id')
    .leftJoin('people as alternates', 'alternates.id', 'lasers.alternate_id')
    .leftJoin('people as area_supervisors', 'area_supervisors.id', 'areas.supervisor_id')
    .selectAll('lasers')
    .select([
      'areas.code as area_code',
      'areas.name as area_name',
      'areas.department as area_department',
      'areas.supervisor_id as area_supervisor_id',
      'areas.alternate_id as area_alternate_id',
      'areas.wall_distance_m as area_wall_distance_m',
      'supervisors.name as supervisor_name',
      'alternates.name as alternate_name',
      'area_supervisors.name as area_supervisor_name',
    ]);
}

export async function findLaser(tx: Tx, id: string): Promise<LaserRecord | undefined> {
  const row = await selectLasers(tx).where('lasers.id', '=', id).executeTakeFirst();
  return row && toLaser(row, await transferAreaOf(tx, row));
}

export function findLaserIdByTag(tx: Tx, tag: string): Promise<{ id: string } | undefined> {
  return tx
    .selectFrom('lasers')
    .select('lasers.id')
    .where('lasers.tag', '=', tag)
    .executeTakeFirst();
}

/** The next free number of tags like L-43. */
export async function nextTag(tx: Tx): Promise<string> {
  const last = await tx
    .selectFrom('lasers')
    .select('lasers.tag_key')
    .where('lasers.tag_key', '>=', 'l-0000000000')
    .where('lasers.tag_key', '<=', 'l-9999999999')
    .where(sql<boolean>`substr(lasers.tag_key, 3) not glob '*[^0-9]*'`)
    .orderBy('lasers.tag_key', 'desc')
    .executeTakeFirst();
  const number = Number(last?.tag_key.slice(2) ?? 0) + 1;
  return `L-${String(number).padStart(2, '0')}`;
}

export interface NewLaser {
  readonly id: string;
  readonly tag: string;
  readonly input: LaserInput;
  readonly area: PlaceOf | null;
  readonly state: LaserState;
  readonly createdBy: string | null;
  readonly at: string;
}

export async function insertLaser(tx: Tx, laser: NewLaser): Promise<void> {
  const { number } = await tx
    .insertInto('lasers')
    .values({
      ...columnsOf(laser),
      number: sql<number>`(select coalesce(max(number), 0) + 1 from lasers)`,
      id: laser.id,
      state: laser.state,
      state_since: laser.at,
      quarantine: 0,
      released_at: null,
      waiver: null,
      waiver_until_on: null,
      block: null,
      transfer_area_id: null,
      disposal_asked_by: null,
      evaluation_state: 'none',
      review_on: null,
      reach: null,
      eye_distance_m: -1,
      optical_density: -1,
      attention_rank: NO_ATTENTION,
      created_by: laser.createdBy,
      created_at: laser.at,
      updated_at: laser.at,
      version: 1,
    })
    .returning('number')
    .executeTakeFirstOrThrow();
  await writeIndexes(tx, number, laser);
}

/** The whole record anew, in the next version. */
export async function updateLaserInput(
  tx: Tx,
  stored: LaserRecord,
  next: { input: LaserInput; tag: string; area: PlaceOf | null; at: string },
): Promise<void> {
  await tx
    .updateTable('lasers')
    .set({ ...columnsOf(next), updated_at: next.at, version: stored.version + 1 })
    .where('lasers.id', '=', stored.id)
    .execute();
  await tx.deleteFrom('laser_lines').where('laser_number', '=', stored.number).execute();
  await writeIndexes(tx, stored.number, next);
}

/** Fields that steps of the life cycle write. */
export interface LaserMarks {
  readonly state?: LaserState;
  readonly stateSince?: string;
  readonly quarantine?: boolean;
  readonly releasedAt?: string;
  readonly waiver?: StoredWaiver | null;
  readonly block?: StoredBlock | null;
  readonly transferAreaId?: string | null;
  readonly disposalAskedBy?: string | null;
}

/** Marks of the life cycle, in the next version. */
export async function updateLaserMarks(
  tx: Tx,
  id: string,
  marks: LaserMarks & { at: string },
): Promise<void> {
  await tx
    .updateTable('lasers')
    .set({ ...markColumns(marks), updated_at: marks.at })
    .set((column: ExpressionBuilder<Database, 'lasers'>) => ({
      version: column('version', '+', 1),
    }))
    .where('lasers.id', '=', id)
    .execute();
}

export interface LaserStanding {
  readonly standing: EvaluationStanding;
  readonly reviewOn: string | null;
  readonly reach: Reach | null;
  readonly attentionRank: number;
}

/** What follows from evaluations and dates; no version of the record. */
export async function updateLaserStanding(
  tx: Tx,
  id: string,
  { standing, reviewOn, reach, attentionRank }: LaserStanding,
): Promise<void> {
  await tx
    .updateTable('lasers')
    .set({
      evaluation_state: standing,
      review_on: reviewOn,
      reach: reach && JSON.stringify(reach),
      eye_distance_m: reach?.eyeDistanceM ?? -1,
      optical_density: reach?.opticalDensity ?? -1,
      attention_rank: attentionRank,
    })
    .where('lasers.id', '=', id)
    .execute();
}

export async function addPlace(
  tx: Tx,
  place: { laserId: string; areaId: string | null; at: string },
): Promise<void> {
  await tx
    .insertInto('laser_places')
    .values({ laser_id: place.laserId, since_at: place.at, area_id: place.areaId })
    .onConflict((conflict) =>
      conflict.columns(['laser_id', 'since_at']).doUpdateSet({ area_id: place.areaId }),
    )
    .execute();
}

export async function findPlace(tx: Tx, areaId: string): Promise<PlaceOf | undefined> {
  const row = await tx
    .selectFrom('areas')
    .selectAll()
    .where('areas.id', '=', areaId)
    .executeTakeFirst();
  return row && placeOf(row);
}

/** Whether this is an active person. */
export async function isPerson(tx: Tx, id: string): Promise<boolean> {
  const row = await tx
    .selectFrom('people')
    .select('people.id')
    .where('people.id', '=', id)
    .executeTakeFirst();
  return row !== undefined;
}

export function toLaser(row: JoinedRow, transferArea: PlaceOf | null = null): LaserRecord {
  return {
    number: row.number,
    id: row.id,
    version: row.version,
    tag: row.tag,
    input: JSON.parse(row.record) as LaserInput,
    state: row.state,
    stateSince: row.state_since,
    quarantine: row.quarantine === 1,
    releasedAt: row.released_at,
    waiver: row.waiver === null ? null : (JSON.parse(row.waiver) as StoredWaiver),
    block: row.block === null ? null : (JSON.parse(row.block) as StoredBlock),
    transferArea,
    disposalAskedBy: row.disposal_asked_by,
    standing: row.evaluation_state,
    reviewOn: row.review_on,
    reach: row.reach === null ? null : (JSON.parse(row.reach) as Reach),
    createdBy: row.created_by,
    createdAt: row.created_at,
    updatedAt: row.updated_at,
    area: areaOf(row),
    supervisor:
      personRef(row.supervisor_id, row.supervisor_name) ??
      personRef(row.area_supervisor_id, row.area_supervisor_name),
    alternate: personRef(row.alternate_id, row.alternate_name),
  };
}

function columnsOf(laser: { tag: string; input: LaserInput; area: PlaceOf | null }) {
  const { input } = laser;
  return {
    tag: laser.tag,
    tag_key: tagKey(laser.tag),
    maker: input.maker,
    model: input.model,
    serial: input.serial ?? null,
    serial_key: serialKey(input.serial),
    area_id: input.areaId ?? null,
    supervisor_id: input.supervisorId ?? null,
    alternate_id: input.alternateId ?? null,
    department: input.department ?? null,
    declared_class: input.declaredClass ?? null,
    verified_class: input.verifiedClass ?? null,
    class_rank: classRank(input.verifiedClass ?? input.declaredClass),
    shortest_nm: Math.min(
      NO_WAVELENGTH_NM,
      ...input.emissions.map((emission) => emission.wavelengthNm.value),
    ),
    record: JSON.stringify({ ...input, tag: laser.tag }),
  };
}

async function writeIndexes(
  tx: Tx,
  number: number,
  { tag, input }: { tag: string; input: LaserInput },
): Promise<void> {
  const lines = input.emissions.map((emission, position) => ({
    laser_number: number,
    position,
    from_nm: emission.wavelengthNm.value,
    to_nm: emission.wavelengthToNm?.value ?? emission.wavelengthNm.value,
  }));
  if (lines.length > 0) await tx.insertInto('laser_lines').values(lines).execute();
  const words = { tag, serial: input.serial ?? '', maker: input.maker, model: input.model };
  await tx.deleteFrom('laser_search').where('laser_search.rowid', '=', number).execute();
  await tx
    .insertInto('laser_search')
    .values({ rowid: number, ...words })
    .execute();
}

function markColumns(marks: LaserMarks) {
  const { waiver, block } = marks;
  return {
    ...(marks.state ? { state: marks.state } : {}),
    ...(marks.stateSince ? { state_since: marks.stateSince } : {}),
    ...(marks.quarantine === undefined ? {} : { quarantine: flag(marks.quarantine) }),
    ...(marks.releasedAt ? { released_at: marks.releasedAt } : {}),
    ...(waiver === undefined
      ? {}
      : { waiver: waiver && JSON.stringify(waiver), waiver_until_on: waiver?.untilOn ?? null }),
    ...(block === undefined ? {} : { block: block && JSON.stringify(block) }),
    ...(marks.transferAreaId === undefined ? {} : { transfer_area_id: marks.transferAreaId }),
    ...(marks.disposalAskedBy === undefined ? {} : { disposal_asked_by: marks.disposalAskedBy }),
  };
}

async function transferAreaOf(tx: Kysely<Database>, row: JoinedRow): Promise<PlaceOf | null> {
  if (row.transfer_area_id === null) return null;
  return (await findPlace(tx, row.transfer_area_id)) ?? null;
}

function personRef(id: string | null, name: string | null): PersonRef | undefined {
  return id !== null && name !== null ? { id, name } : undefined;
}

function areaOf(row: JoinedRow): PlaceOf | null {
  if (row.area_id === null) return null;
  return {
    id: row.area_id,
    code: row.area_code ?? '',
    name: row.area_name ?? '',
    department: row.area_department ?? '',
    supervisorId: row.area_supervisor_id,
    alternateId: row.area_alternate_id,
    wallDistanceM: row.area_wall_distance_m,
  };
}

function placeOf(row: {
  id: string;
  code: string;
  name: string;
  department: string;
  supervisor_id: string | null;
  alternate_id: string | null;
  wall_distance_m: number | null;
}): PlaceOf {
  return {
    id: row.id,
    code: row.code,
    name: row.name,
    department: row.department,
    supervisorId: row.supervisor_id,
    alternateId: row.alternate_id,
    wallDistanceM: row.wall_distance_m,
  };
}
