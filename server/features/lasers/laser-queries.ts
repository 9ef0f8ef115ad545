import type { LaserFilter, LaserListQuery, LaserPage } from '@shared/model/lasers';
import { type SelectQueryBuilder, sql, type SqlBool } from 'kysely';

import type { Reach } from '../../auth/scope';
import type { Tx } from '../../db/database';
import { countRows, type Page, pageByKey, type SortKey } from '../../db/paging';
import { matches } from '../../db/sql-helpers';
import type { LaserRecord } from './laser-record';
import { selectLasers, toLaser } from './laser-repository';
import { NO_ATTENTION } from './laser-table';

type Lasers = ReturnType<typeof selectLasers>;
type Row = Awaited<ReturnType<Lasers['execute']>>[number];
type Key =
  Lasers extends SelectQueryBuilder<infer DB, infer TB, Row> ? SortKey<DB, TB, Row> : never;

/** A search as understood: every part must hold. */
export interface LaserSearch {
  /** Bands that a line or tuning range must meet. */
  readonly bands: readonly { readonly fromNm: number; readonly toNm: number }[];
  /** Classes, verified before declared. */
  readonly classes: readonly string[];
  /** Beginnings of words of tag, serial, maker, model, or parts of the area's code, name, room. */
  readonly words: readonly string[];
}

/** The filter with its search understood. */
export type RegisterFilter = Omit<LaserFilter, 'q'> & { readonly search?: LaserSearch | undefined };
export type RegisterQuery = RegisterFilter &
  Pick<LaserListQuery, 'sort' | 'order' | 'limit' | 'after'>;

export interface RegisterPage extends Page<LaserRecord> {
  readonly counts: LaserPage['counts'];
}

/** One page of the register, with the counts over all that the person may see. */
export async function listLasers(
  tx: Tx,
  reach: Reach,
  query: RegisterQuery,
): Promise<RegisterPage> {
  const found = filtered(within(selectLasers(tx), reach), query);
  const page = await pageByKey(found, {
    keys: keysOf(query),
    after: query.after,
    limit: query.limit,
    total: await countRows(found),
  });
  return {
    ...page,
    rows: page.rows.map((row) => toLaser(row)),
    counts: await countLasers(tx, reach),
  };
}

/** Every laser that the filter finds, by tag, read in portions: memory stays flat. */
export async function* eachLaser(
  tx: Tx,
  reach: Reach,
  filter: RegisterFilter,
): AsyncGenerator<LaserRecord> {
  const found = filtered(within(selectLasers(tx), reach), filter);
  let after: string | undefined;
  do {
    const page = await pageByKey(found, {
      keys: keysOf({ sort: 'tag', order: 'asc' }),
      after,
      limit: 200,
      total: 0,
    });
    for (const row of page.rows) yield toLaser(row);
    after = page.next ?? undefined;
  } while (after !== undefined);
}

/** Lasers with this serial, in whatever spelling. */
export async function findBySerial(
  tx: Tx,
  {
    key,
    maker,
    exceptId,
  }: { key: string; maker?: string | undefined; exceptId?: string | undefined },
): Promise<LaserRecord[]> {
  let found = selectLasers(tx).where('lasers.serial_key', '=', key);
  if (maker) found = found.where('lasers.maker', '=', maker);
  if (exceptId) found = found.where('lasers.id', '!=', exceptId);
  const rows = await found.orderBy('lasers.tag_key').limit(20).execute();
  return rows.map((row) => toLaser(row));
}

/** Lasers in use whose waiver has ended before a day. */
export async function lasersWithEndedWaiver(tx: Tx, today: string): Promise<{ id: string }[]> {
  return tx
    .selectFrom('lasers')
    .select('lasers.id')
    .where('lasers.waiver_until_on', 'is not', null)
    .where('lasers.waiver_until_on', '<', today)
    .where('lasers.state', 'in', ['in-use', 'change-open', 'service-open'])
    .execute();
}

export function allLaserIds(tx: Tx): Promise<{ id: string }[]> {
  return tx.selectFrom('lasers').select('lasers.id').orderBy('lasers.number').execute();
}

export function laserIdsOfArea(tx: Tx, areaId: string): Promise<{ id: string }[]> {
  return tx.selectFrom('lasers').select('lasers.id').where('lasers.area_id', '=', areaId).execute();
}

async function countLasers(tx: Tx, reach: Reach): Promise<LaserPage['counts']> {
  const count = (condition: ReturnType<typeof sql<SqlBool>>) =>
    sql<number>`coalesce(sum(${condition}), 0)`;
  const row = await here(within(selectLasers(tx), reach))
    .clearSelect()
    .select([
      sql<number>`count(*)`.as('all'),
      count(sql`lasers.attention_rank < ${NO_ATTENTION}`).as('attention'),
      count(sql`lasers.state = 'blocked'`).as('blocked'),
      count(sql`lasers.evaluation_state = 'stale'`).as('stale'),
      count(sql`lasers.evaluation_state in ('none', 'open')`).as('notEvaluated'),
    ])
    .executeTakeFirstOrThrow();
  const { all, attention, blocked, stale, notEvaluated } = row;
  return { all, attention, blocked, stale, notEvaluated };
}

/** Only what lies within reach: of one's areas, or supervised by name. */
function within(lasers: Lasers, reach: Reach): Lasers {
  if (reach.kind === 'everything') return lasers;
  if (reach.kind === 'nothing') return lasers.where(sql<SqlBool>`0`);
  const { personId, department } = reach;
  return lasers.where((eb) =>
    eb.or([
      eb('lasers.supervisor_id', '=', personId),
      eb('lasers.alternate_id', '=', personId),
      eb('areas.supervisor_id', '=', personId),
      eb('areas.alternate_id', '=', personId),
      ...(department === undefined
        ? []
        : [eb(sql`coalesce(lasers.department, areas.department)`, '=', department)]),
    ]),
  );
}

/** The register shows what is here: not what is still to come, nor what has left. */
function here(lasers: Lasers): Lasers {
  return lasers.where('lasers.state', 'not in', [
    'requested',
    'approved-to-buy',
    'on-order',
    'rejected',
    'withdrawn',
    'transferred',
    'disposed',
  ]);
}

function filtered(lasers: Lasers, filter: RegisterFilter): Lasers {
  let found = filter.state ? lasers.where('lasers.state', '=', filter.state) : here(lasers);
  if (filter.areaId) found = found.where('lasers.area_id', '=', filter.areaId);
  if (filter.department) {
    found = found.where(sql`coalesce(lasers.department, areas.department)`, '=', filter.department);
  }
  if (filter.supervisorId) found = supervisedBy(found, filter.supervisorId);
  if (filter.class) found = ofClass(found, filter.class);
  if (filter.fromNm !== undefined || filter.toNm !== undefined) {
    found = meeting(found, { fromNm: filter.fromNm ?? 0, toNm: filter.toNm ?? 1e6 });
  }
  if (filter.attention) found = needing(found, filter.attention);
  return filter.search ? searched(found, filter.search) : found;
}

function supervisedBy(lasers: Lasers, personId: string): Lasers {
  return lasers.where((eb) =>
    eb.or([
      eb('lasers.supervisor_id', '=', personId),
      eb.and([eb('lasers.supervisor_id', 'is', null), eb('areas.supervisor_id', '=', personId)]),
    ]),
  );
}

function ofClass(lasers: Lasers, laserClass: string): Lasers {
  return lasers.where(sql`coalesce(lasers.verified_class, lasers.declared_class)`, '=', laserClass);
}

function meeting(lasers: Lasers, { fromNm, toNm }: { fromNm: number; toNm: number }): Lasers {
  return lasers.where((eb) =>
    eb.exists(
      eb
        .selectFrom('laser_lines')
        .select('laser_lines.position')
        .whereRef('laser_lines.laser_number', '=', 'lasers.number')
        .where('laser_lines.from_nm', '<=', toNm)
        .where('laser_lines.to_nm', '>=', fromNm),
    ),
  );
}

function needing(lasers: Lasers, attention: NonNullable<LaserFilter['attention']>): Lasers {
  switch (attention) {
    case 'any':
      return lasers.where('lasers.attention_rank', '<', NO_ATTENTION);
    case 'blocked':
      return lasers.where('lasers.state', '=', 'blocked');
    case 'stale':
      return lasers.where('lasers.evaluation_state', '=', 'stale');
    case 'not-evaluated':
      return lasers.where('lasers.evaluation_state', 'in', ['none', 'open']);
  }
}

function searched(lasers: Lasers, { bands, classes, words }: LaserSearch): Lasers {
  let found = lasers;
  for (const band of bands) found = meeting(found, band);
  for (const laserClass of classes) found = ofClass(found, laserClass);
  for (const word of words) found = withWord(found, word);
  return found;
}

/** The word begins one of the laser's own words, or is part of its area's. */
function withWord(lasers: Lasers, word: string): Lasers {
  const phrase = `"${word.replaceAll('"', '""')}"*`;
  // A word of punctuation only is no phrase: then the area alone can hold it.
  const hasText = /[\p{L}\p{N}]/u.test(word);
  return lasers.where((eb) =>
    eb.or([
      ...(hasText
        ? [
            sql<SqlBool>`lasers.number in
              (select rowid from laser_search where laser_search match ${phrase})`,
          ]
        : []),
      matches('areas.code', word),
      matches('areas.room', word),
      matches('areas.name', word),
    ]),
  );
}

function keysOf({ sort, order }: Pick<LaserListQuery, 'sort' | 'order'>): Key[] {
  const key = (column: unknown, value: (row: Row) => string | number): Key =>
    ({ column, direction: order, value }) as Key;
  const byTag = [
    { column: 'lasers.tag_key', direction: 'asc', value: (row: Row) => row.tag_key },
    { column: 'lasers.id', direction: 'asc', value: (row: Row) => row.id },
  ] as Key[];
  switch (sort) {
    case 'attention':
      return [key('lasers.attention_rank', (row) => row.attention_rank), ...byTag];
    case 'tag':
      return [key('lasers.tag_key', (row) => row.tag_key), ...byTag.slice(1)];
    case 'maker':
      return [key('lasers.maker', (row) => row.maker), ...byTag];
    case 'area':
      return [
        key(sql`coalesce(areas.code, '') collate nocase`, (row) => row.area_code ?? ''),
        ...byTag,
      ];
    case 'class':
      return [key('lasers.class_rank', (row) => row.class_rank), ...byTag];
    case 'wavelength':
      return [key('lasers.shortest_nm', (row) => row.shortest_nm), ...byTag];
    case 'eye-distance':
      return [key('lasers.eye_distance_m', (row) => row.eye_distance_m), ...byTag];
    case 'optical-density':
      return [key('lasers.optical_density', (row) => row.optical_density), ...byTag];
    case 'state':
      return [key('lasers.state', (row) => row.state), ...byTag];
  }
}
