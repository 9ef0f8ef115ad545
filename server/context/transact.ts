import { type Acting, type Context, type Edges, pick } from './context';

/**
 * Runs `work` in one transaction that holds the write lock. Every transaction that changes rows
 * must have written an audit entry, else it is rolled back.
 */
export async function transact<T>(
  edges: Edges,
  acting: Acting,
  work: (ctx: Context) => Promise<T>,
): Promise<T> {
  const committed: (() => void | Promise<void>)[] = [];
  const journal = { entries: 0 };
  const result = await edges.db.write.transaction().execute(async (tx) => {
    const before = edges.db.totalChanges();
    const answer = await work({
      ...pick(acting),
      tx,
      edges,
      journal,
      now: edges.clock(),
      afterCommit: (then) => committed.push(then),
    });
    if (journal.entries === 0 && edges.db.totalChanges() > before) {
      throw new Error(`A change by ${acting.via} has no audit entry; it was rolled back.`);
    }
    return answer;
  });
  for (const then of committed) await then();
  return result;
}

/** For rows that are no records: sessions, counters, leases, the progress of an import. */
export function bookkeeping<T>(
  edges: Pick<Edges, 'db'>,
  work: (tx: Context['tx']) => Promise<T>,
): Promise<T> {
  return edges.db.write.transaction().execute(work);
}
