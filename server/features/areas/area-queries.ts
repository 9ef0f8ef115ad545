import type { AreaListQuery } from '@shared/model/areas';
import type { PersonRef } from '@shared/model/common';
import { LASER_LIFE_CYCLE } from '@shared/workflow/laser-life-cycle';

import type { Reach } from '../../auth/scope';
import type { Tx } from '../../db/database';
import { countRows, type Page, pageByKey } from '../../db/paging';
import { matches, nocase, withinReach } from '../../db/sql-helpers';
import { type StoredArea, toArea } from './area-repository';
import type { AreaTable } from './areas-table';

/** An area with the names that its page shows. */
export interface AreaRow extends StoredArea {
  readonly supervisor?: PersonRef | undefined;
  readonly alternate?: PersonRef | undefined;
  readonly laserCount: number;
  /** Of the lasers there, verified before declared. */
  readonly highestClass?: string | undefined;
}

/** Areas within reach, by code. */
export async function listAreas(
  tx: Tx,
  query: AreaListQuery,
  reach: Reach,
): Promise<Page<AreaRow>> {
  let areas = selectAreas(tx).where(withinReach(reach));
  if (query.department) areas = areas.where('areas.department', '=', query.department);
  for (const word of query.q?.split(/\s+/).filter(Boolean) ?? []) {
    areas = areas.where((eb) =>
      eb.or([
        matches('areas.code', word),
        matches('areas.name', word),
        matches('areas.building', word),
        matches('supervisors.name', word),
      ]),
    );
  }
  const page = await pageByKey(areas, {
    keys: [
      { column: nocase('areas.code'), direction: 'asc', value: (row) => row.code },
      { column: 'areas.id', direction: 'asc', value: (row) => row.id },
    ],
    after: query.after,
    limit: query.limit,
    total: await countRows(areas),
  });
  return { ...page, rows: page.rows.map(toAreaRow) };
}

export async function findAreaRow(tx: Tx, id: string): Promise<AreaRow | undefined> {
  const row = await selectAreas(tx).where('areas.id', '=', id).executeTakeFirst();
  return row && toAreaRow(row);
}

function selectAreas(tx: Tx) {
  return tx
    .selectFrom('areas')
    .leftJoin('people as supervisors', 'supervisors.id', 'areas.supervisor_id')
    .leftJoin('people as alternates', 'alternates.id', 'areas.alternate_id')
    .selectAll('areas')
    .select(['supervisors.name as supervisor_name', 'alternates.name as alternate_name'])
    .select((eb) => {
      const lasers = eb
        .selectFrom('lasers')
        .whereRef('lasers.area_id', '=', 'areas.id')
        .where('lasers.state', 'not in', LASER_LIFE_CYCLE.terminal);
      return [
        lasers.select(eb.fn.countAll<number>().as('count')).as('laser_count'),
        lasers
          .select(({ fn }) =>
            fn.coalesce('lasers.verified_class', 'lasers.declared_class').as('class'),
          )
          .orderBy('lasers.class_rank', 'desc')
          .limit(1)
          .as('highest_class'),
      ];
    });
}

interface JoinedRow extends AreaTable {
  supervisor_name: string | null;
  alternate_name: string | null;
  laser_count: number | null;
  highest_class: string | null;
}

function toAreaRow(row: JoinedRow): AreaRow {
  return {
    ...toArea(row),
    supervisor: personRef(row.supervisor_id, row.supervisor_name),
    alternate: personRef(row.alternate_id, row.alternate_name),
    laserCount: row.laser_count ?? 0,
    highestClass: row.highest_class ?? undefined,
  };
}

function personRef(id: string | null, name: string | null): PersonRef | undefined {
  return id !== null && name !== null ? { id, name } : undefined;
}
