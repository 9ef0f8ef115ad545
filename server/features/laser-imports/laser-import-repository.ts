import type { ImportError, LaserImport } from '@shared/model/laser-imports';

import type { Tx } from '../../db/database';
import type { LaserImportTable, PlannedLaser } from './laser-import-table';

/** An import as stored, with whose it is and what it would save. */
export interface StoredImport extends LaserImport {
  readonly personId: string;
  readonly plan: readonly PlannedLaser[];
}

export async function insertImport(tx: Tx, stored: StoredImport): Promise<void> {
  await tx.insertInto('laser_imports').values(rowOf(stored)).execute();
}

export async function updateImport(tx: Tx, stored: StoredImport, at: string): Promise<void> {
  const { id, ...row } = rowOf(stored);
  await tx
    .updateTable('laser_imports')
    .set({ ...row, updated_at: at })
    .where('laser_imports.id', '=', id)
    .execute();
}

export async function findImport(tx: Tx, id: string): Promise<StoredImport | undefined> {
  const row = await tx
    .selectFrom('laser_imports')
    .selectAll()
    .where('laser_imports.id', '=', id)
    .executeTakeFirst();
  return row && toImport(row);
}

/** What names of the file are looked up in: areas by code, people by address. */
export async function findNames(tx: Tx): Promise<{
  areas: { id: string; code: string }[];
  people: { id: string; email: string }[];
}> {
  const areas = await tx
    .selectFrom('areas')
    .select(['areas.id', 'areas.code'])
    .orderBy('areas.code')
    .execute();
  const people = await tx
    .selectFrom('people')
    .select(['people.id', 'people.email'])
    .where('people.active', '=', 1)
    .execute();
  return { areas, people };
}

function rowOf(stored: StoredImport): LaserImportTable {
  return {
    id: stored.id,
    person_id: stored.personId,
    file_name: stored.fileName,
    status: stored.status,
    rows_total: stored.rowsTotal,
    rows_done: stored.rowsDone,
    rows_good: stored.rowsGood,
    lasers: stored.lasers,
    errors: JSON.stringify(stored.errors),
    error_count: stored.errorCount,
    warnings: JSON.stringify(stored.warnings),
    plan: JSON.stringify(stored.plan),
    created_at: stored.createdAt,
    updated_at: stored.createdAt,
  };
}

function toImport(row: LaserImportTable): StoredImport {
  return {
    id: row.id,
    personId: row.person_id,
    fileName: row.file_name,
    status: row.status,
    rowsTotal: row.rows_total,
    rowsDone: row.rows_done,
    rowsGood: row.rows_good,
    lasers: row.lasers,
    errors: JSON.parse(row.errors) as ImportError[],
    errorCount: row.error_count,
    warnings: JSON.parse(row.warnings) as StoredImport['warnings'],
    plan: JSON.parse(row.plan) as PlannedLaser[],
    createdAt: row.created_at,
  };
}
