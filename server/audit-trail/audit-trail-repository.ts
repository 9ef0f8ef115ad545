import type { Tx } from '../db/database';
import type { AuditTrailTable, TrailCheckpointTable } from './audit-trail-table';

export function lastEntry(tx: Tx): Promise<Pick<AuditTrailTable, 'sequence' | 'hash'> | undefined> {
  return tx
    .selectFrom('audit_trail')
    .select(['audit_trail.sequence', 'audit_trail.hash'])
    .orderBy('audit_trail.sequence', 'desc')
    .limit(1)
    .executeTakeFirst();
}

export async function appendEntry(tx: Tx, row: AuditTrailTable): Promise<void> {
  await tx.insertInto('audit_trail').values(row).execute();
}

export function lastCheckpoint(tx: Tx): Promise<TrailCheckpointTable | undefined> {
  return tx
    .selectFrom('trail_checkpoints')
    .selectAll()
    .orderBy('sequence', 'desc')
    .limit(1)
    .executeTakeFirst();
}

export async function appendCheckpoint(tx: Tx, row: TrailCheckpointTable): Promise<void> {
  await tx.insertInto('trail_checkpoints').values(row).execute();
}
