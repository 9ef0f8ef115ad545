import {
  type ExpressionBuilder,
  type ReferenceExpression,
  type SelectQueryBuilder,
  sql,
} from 'kysely';

import { InvalidInput } from '../http/errors';

type KeyValue = string | number;

export interface Page<Row> {
  readonly rows: Row[];
  readonly next: string | null;
  readonly total: number;
}

/** One column of the order of a list; the last one must be unique. */
export interface SortKey<DB, TB extends keyof DB, Row> {
  readonly column: ReferenceExpression<DB, TB>;
  readonly direction: 'asc' | 'desc';
  /** Reads the column's value from a row; never null (order by a coalesced expression). */
  readonly value: (row: Row) => KeyValue;
}

/**
 * One page of a list, by key: rows after the key of the page before. `query` has every filter but
 * neither order nor limit; `total` counts what it finds.
 */
export async function pageByKey<DB, TB extends keyof DB, Row>(
  query: SelectQueryBuilder<DB, TB, Row>,
  page: {
    readonly keys: readonly SortKey<DB, TB, Row>[];
    readonly after?: string | undefined;
    readonly limit: number;
    readonly total: number;
  },
): Promise<Page<Row>> {
  let ordered = query;
  if (page.after !== undefined) {
    const values = decodeKey(page.after, page.keys.length);
    ordered = ordered.where((eb) => isAfter(eb, page.keys, values));
  }
  for (const key of page.keys) ordered = ordered.orderBy(key.column as never, key.direction);
  const found = await ordered.limit(page.limit + 1).execute();
  const rows = found.slice(0, page.limit);
  const last = rows.at(-1);
  const hasMore = found.length > page.limit && last !== undefined;
  return {
    rows,
    next: hasMore ? encodeKey(page.keys.map((key) => key.value(last))) : null,
    total: page.total,
  };
}

/** Rows that a query finds, before order and limit. */
export async function countRows<DB, TB extends keyof DB, Row>(
  query: SelectQueryBuilder<DB, TB, Row>,
): Promise<number> {
  const counted = await query
    .clearSelect()
    .select(sql<number>`count(*)`.as('count'))
    .executeTakeFirst();
  return (counted as { count: number } | undefined)?.count ?? 0;
}

function encodeKey(values: readonly KeyValue[]): string {
  return Buffer.from(JSON.stringify(values)).toString('base64url');
}

function decodeKey(after: string, length: number): KeyValue[] {
  try {
    const values: unknown = JSON.parse(Buffer.from(after, 'base64url').toString('utf8'));
    if (isKey(values, length)) return values;
  } catch {
    // A SyntaxError: the text is no key of ours.
  }
  throw new InvalidInput([
    { path: 'after', message: 'This is no key of a page.', allowed: 'the "next" of a page before' },
  ]);
}

function isKey(values: unknown, length: number): values is KeyValue[] {
  return (
    Array.isArray(values) &&
    values.length === length &&
    values.every((value) => typeof value === 'string' || Number.isFinite(value))
  );
}

/** (a, b, c) after (x, y, z), each in its own direction. */
function isAfter<DB, TB extends keyof DB, Row>(
  eb: ExpressionBuilder<DB, TB>,
  keys: readonly SortKey<DB, TB, Row>[],
  values: readonly KeyValue[],
) {
  return eb.or(
    keys.map((key, index) =>
      eb.and([
        ...keys.slice(0, index).map((before, at) => eb(before.column, '=', values[at] as never)),
        eb(key.column, key.direction === 'asc' ? '>' : '<', values[index] as never),
      ]),
    ),
  );
}
