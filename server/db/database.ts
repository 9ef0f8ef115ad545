import type { Kysely } from 'kysely';

/**
 * The tables. Each `*-table.ts` adds its own by declaration merging, so that the core of the
 * server does not import a feature.
 */
export interface Database {
  applied_migrations: { name: string; applied_at: string };
}

/** A connection or the transaction that is open on it. */
export type Tx = Kysely<Database>;

/** How SQLite keeps a boolean. */
export type Flag = 0 | 1;

export function flag(value: boolean): Flag {
  return value ? 1 : 0;
}
