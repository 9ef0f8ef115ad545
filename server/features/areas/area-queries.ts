import type { AreaListQuery } from '@shared/model/areas';
import type { PersonRef } from '@shared/model/common';

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
    .select(['supervisors.name as supervisor_name', 'alternates.name as alternate_name']);
}

function toAreaRow(
  row: AreaTable & { supervisor_name: string | null; alternate_name: string | null },
): AreaRow {
  return {
    ...toArea(row),
    supervisor: personRef(row.supervisor_id, row.supervisor_name),
    alternate: personRef(row.alternate_id, row.alternate_name),
  };
}

function personRef(id: string | null, name: string | null): PersonRef | undefined {
  return id !== null && name !== null ? { id, name } : undefined;
}
