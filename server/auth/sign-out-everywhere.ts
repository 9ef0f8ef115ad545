import type { Context } from '../context/context';
import { endSessionsOf } from './session-repository';

/** Ends the sessions of a person, with the change that is the reason; `kept` is spared. */
export function endSessions(ctx: Context, personId: string, keptSidHash?: string): Promise<void> {
  return endSessionsOf(ctx.tx, personId, keptSidHash);
}
