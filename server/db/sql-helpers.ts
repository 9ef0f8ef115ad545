import { type RawBuilder, sql, type SqlBool } from 'kysely';

import type { Reach } from '../auth/scope';

/** Whether a JSON list column holds `item`. */
export function hasJsonItem(column: string, item: string): RawBuilder<SqlBool> {
  return sql<SqlBool>`exists (select 1 from json_each(${sql.ref(column)}) where value = ${item})`;
}

/** Whether a text column contains `word`, in any case of letters; `%` and `_` are ordinary. */
export function matches(column: string, word: string): RawBuilder<SqlBool> {
  const pattern = `%${word.replaceAll(/[\\%_]/g, String.raw`\$&`)}%`;
  return sql<SqlBool>`${sql.ref(column)} like ${pattern} escape '\\'`;
}

/** The column as `order by` and keys of pages compare names: without regard to case. */
export function nocase(column: string): RawBuilder<string> {
  return sql<string>`${sql.ref(column)} collate nocase`;
}

/**
 * Whether a row's area lies within reach: for queries that hold `areas`. A record without an area
 * is within reach of the whole site only.
 */
export function withinReach(reach: Reach): RawBuilder<SqlBool> {
  if (reach.kind === 'everything') return sql<SqlBool>`1`;
  if (reach.kind === 'nothing') return sql<SqlBool>`0`;
  return sql<SqlBool>`(coalesce(areas.supervisor_id = ${reach.personId}, 0)
    or coalesce(areas.alternate_id = ${reach.personId}, 0)
    or coalesce(areas.department = ${reach.department ?? null}, 0))`;
}
