import type { LaserFile } from '@shared/model/files';

import type { Tx } from '../../db/database';
import type { LaserFileTable } from './laser-table';

/** Files of a laser, oldest first, without those removed. */
export async function listFiles(tx: Tx, laserId: string): Promise<LaserFile[]> {
  const rows = await selectFiles(tx).where('laser_files.laser_id', '=', laserId).execute();
  return rows.map(toFile);
}

export async function findFile(
  tx: Tx,
  laserId: string,
  fileId: string,
): Promise<LaserFile | undefined> {
  const row = await selectFiles(tx)
    .where('laser_files.laser_id', '=', laserId)
    .where('laser_files.id', '=', fileId)
    .executeTakeFirst();
  return row && toFile(row);
}

export async function insertFile(tx: Tx, row: LaserFileTable): Promise<void> {
  await tx.insertInto('laser_files').values(row).execute();
}

/** The record stays; the file is no longer shown. */
export async function markFileRemoved(tx: Tx, fileId: string, at: string): Promise<void> {
  await tx
    .updateTable('laser_files')
    .set({ removed_at: at })
    .where('laser_files.id', '=', fileId)
    .execute();
}

function selectFiles(tx: Tx) {
  return tx
    .selectFrom('laser_files')
    .innerJoin('people', 'people.id', 'laser_files.uploaded_by')
    .selectAll('laser_files')
    .select('people.name as uploader_name')
    .where('laser_files.removed_at', 'is', null)
    .orderBy('laser_files.uploaded_at')
    .orderBy('laser_files.id');
}

function toFile(row: LaserFileTable & { uploader_name: string }): LaserFile {
  return {
    id: row.id,
    kind: row.kind as LaserFile['kind'],
    name: row.name,
    mediaType: row.media_type,
    sizeBytes: row.size_bytes,
    sha256: row.sha256,
    ...(row.note === null ? {} : { note: row.note }),
    uploadedBy: { id: row.uploaded_by, name: row.uploader_name },
    uploadedAt: row.uploaded_at,
  };
}
