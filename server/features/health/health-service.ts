import type { Context } from '../../context/context';
import { Unavailable } from '../../http/errors';
import { writeProbe } from './health-repository';

/** Whether the product can do its work: the database takes a write. */
export async function checkReady(ctx: Pick<Context, 'edges'>): Promise<void> {
  try {
    await writeProbe(ctx.edges);
  } catch (error) {
    // SqliteError: disk full, read-only or locked; the answer says only that it is so.
    ctx.edges.log.error({ err: error }, 'write probe failed');
    throw new Unavailable('The database does not take writes at the moment.');
  }
}
