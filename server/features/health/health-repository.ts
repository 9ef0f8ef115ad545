import type { Edges } from '../../context/context';
import { bookkeeping } from '../../context/transact';

/** Writes and syncs one row, as a real change would. */
export async function writeProbe(edges: Pick<Edges, 'db' | 'clock'>): Promise<void> {
  const now = edges.clock().toISOString();
  const row = { name: 'readiness-probe', owner: '', leased_until: now, done_until: now };
  await bookkeeping(edges, (tx) =>
    tx
      .insertInto('job_leases')
      .values(row)
      .onConflict((conflict) => conflict.column('name').doUpdateSet(row))
      .execute(),
  );
}
