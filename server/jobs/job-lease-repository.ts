import type { Tx } from '../db/database';
import type { JobLeaseTable } from './job-lease-table';

export function findLease(tx: Tx, name: string): Promise<JobLeaseTable | undefined> {
  return tx
    .selectFrom('job_leases')
    .selectAll()
    .where('job_leases.name', '=', name)
    .executeTakeFirst();
}

export async function storeLease(tx: Tx, row: JobLeaseTable): Promise<void> {
  await tx
    .insertInto('job_leases')
    .values(row)
    .onConflict((conflict) => conflict.column('name').doUpdateSet(row))
    .execute();
}
