import type { Edges } from '../context/context';
import { bookkeeping } from '../context/transact';
import { appendCheckpoint, lastCheckpoint, lastEntry } from './audit-trail-repository';

/** Signs the head of the trail when it moved since the last time. */
export async function signHead(edges: Pick<Edges, 'db' | 'clock' | 'heads'>): Promise<void> {
  await bookkeeping(edges, async (tx) => {
    const head = await lastEntry(tx);
    const last = await lastCheckpoint(tx);
    if (!head || head.sequence === last?.sequence) return;
    const signed = edges.heads.sign({
      sequence: head.sequence,
      hash: head.hash,
      at: edges.clock().toISOString(),
    });
    // The file first: a checkpoint in the database alone would look like a shortened file.
    edges.heads.append(signed);
    await appendCheckpoint(tx, signed);
  });
}
