import type { AreaInput } from '@shared/model/areas';

import type { Tx } from '../../db/database';
import type { AreaTable } from './areas-table';

/** An area as stored, without what is joined to it for a screen. */
export interface StoredArea extends AreaInput {
  readonly id: string;
  readonly version: number;
  readonly createdAt: string;
}

export async function insertArea(tx: Tx, area: StoredArea): Promise<void> {
  await tx
    .insertInto('areas')
    .values({
      id: area.id,
      version: area.version,
      created_at: area.createdAt,
      ...columnsOf(area),
    })
    .execute();
}

export async function updateArea(tx: Tx, area: StoredArea): Promise<void> {
  await tx
    .updateTable('areas')
    .set({ version: area.version, ...columnsOf(area) })
    .where('areas.id', '=', area.id)
    .execute();
}

export async function findArea(tx: Tx, id: string): Promise<StoredArea | undefined> {
  const row = await tx
    .selectFrom('areas')
    .selectAll()
    .where('areas.id', '=', id)
    .executeTakeFirst();
  return row && toArea(row);
}

export async function findAreaByCode(tx: Tx, code: string): Promise<StoredArea | undefined> {
  const row = await tx
    .selectFrom('areas')
    .selectAll()
    .where('areas.code', '=', code)
    .executeTakeFirst();
  return row && toArea(row);
}

export function toArea(row: AreaTable): StoredArea {
  return {
    id: row.id,
    version: row.version,
    createdAt: row.created_at,
    code: row.code,
    name: row.name,
    building: row.building,
    room: row.room,
    department: row.department,
    supervisorId: row.supervisor_id ?? undefined,
    alternateId: row.alternate_id ?? undefined,
    wallDistanceM: row.wall_distance_m ?? undefined,
    phone: row.phone ?? undefined,
    note: row.note ?? undefined,
  };
}

function columnsOf(input: AreaInput) {
  return {
    code: input.code,
    name: input.name,
    building: input.building,
    room: input.room,
    department: input.department,
    supervisor_id: input.supervisorId ?? null,
    alternate_id: input.alternateId ?? null,
    wall_distance_m: input.wallDistanceM ?? null,
    phone: input.phone ?? null,
    note: input.note ?? null,
  };
}
