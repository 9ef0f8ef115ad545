import type { Role } from '@shared/model/people';
import type { Logger } from 'pino';

import type { TrailHeads } from '../audit-trail/trail-heads';
import type { Config } from '../config/config';
import type { Tx } from '../db/database';
import type { Db } from '../db/open-database';
import type { FileStore } from '../files/file-store';

/** Everything outside the process that is swapped in tests; made once in `app.ts`. */
export interface Edges {
  readonly config: Config;
  readonly db: Db;
  readonly clock: () => Date;
  readonly files: FileStore;
  readonly heads: TrailHeads;
  readonly log: Logger;
  readonly consequences: Consequences;
}

/** What a feature does, in the same transaction, when a record of another one changes. */
export interface Consequences {
  readonly areaChanged: (ctx: Context, areaId: string) => Promise<void>;
}

/** Who acts: a person as the database knows them at this moment, or the system. */
export interface Actor {
  readonly id: string;
  readonly name: string;
  readonly email: string;
  readonly department?: string | undefined;
  readonly roles: readonly Role[];
  /** Areas this person supervises, as supervisor or alternate. */
  readonly areaIds: readonly string[];
}

/** The product itself, where no person acts: jobs, set-up, the first seed. */
export const SYSTEM: Actor = { id: 'system', name: 'Limen', email: '', roles: [], areaIds: [] };

/** Who acts, from where, and how presence was proven, if it was. */
export interface Acting {
  readonly actor: Actor;
  readonly requestId: string;
  readonly ip: string;
  /** The way in: web, demo, job, command line. */
  readonly via: string;
  /** How the person proved presence in this request; null when not. */
  readonly proof: string | null;
}

/** First argument of every service function: carries all that an audit entry needs. */
export interface Context extends Acting {
  /** The open transaction in a writing route; the reading connection otherwise. */
  readonly tx: Tx;
  readonly now: Date;
  readonly edges: Edges;
  /** Runs once the transaction is committed; never when it is rolled back. */
  afterCommit(work: () => void | Promise<void>): void;
  /** Counts the audit entries of this transaction. */
  readonly journal: { entries: number };
}

/** A context for reading, outside a transaction. */
export function reading(edges: Edges, acting: Acting): Context {
  return {
    ...pick(acting),
    edges,
    tx: edges.db.read,
    now: edges.clock(),
    journal: { entries: 0 },
    afterCommit: () => {
      throw new Error('Nothing is committed in a reading context.');
    },
  };
}

export function acting(actor: Actor, via: string): Acting {
  return { actor, requestId: via, ip: '', via, proof: null };
}

/** Only the acting part, also of a context that is passed on. */
export function pick({ actor, requestId, ip, via, proof }: Acting): Acting {
  return { actor, requestId, ip, via, proof };
}
