import { mkdirSync } from 'node:fs';
import { dirname, join } from 'node:path';

import { type Kysely, sql } from 'kysely';

import type { Db } from './open-database';

/** One step of the schema, forward only. It imports nothing of ours. */
export interface Migration {
  up(db: Kysely<unknown>): Promise<void>;
}

/** The file was written by a newer version of the product. */
export class NewerSchemaError extends Error {
  override readonly name = 'NewerSchemaError';
}

/** Applies what is missing, each step in a transaction of its own; answers the names applied. */
export async function migrate(
  db: Db,
  migrations: Readonly<Record<string, Migration>>,
  now: Date,
): Promise<string[]> {
  await db.write.schema
    .createTable('applied_migrations')
    .ifNotExists()
    .addColumn('name', 'text', (column) => column.primaryKey())
    .addColumn('applied_at', 'text', (column) => column.notNull())
    .execute();
  const applied = await appliedNames(db);
  refuseNewer(applied, migrations);
  const pending = Object.keys(migrations)
    .sort()
    .filter((name) => !applied.includes(name));
  if (pending.length > 0 && applied.length > 0) await backUpFirst(db, now);
  for (const name of pending) {
    await applyOne(db, name, migrations[name] as Migration, now);
  }
  return pending;
}

async function appliedNames(db: Db): Promise<string[]> {
  const rows = await db.write
    .selectFrom('applied_migrations')
    .select('applied_migrations.name')
    .execute();
  return rows.map((row) => row.name);
}

function refuseNewer(
  applied: readonly string[],
  migrations: Readonly<Record<string, Migration>>,
): void {
  const unknown = applied.filter((name) => !(name in migrations));
  if (unknown.length === 0) return;
  throw new NewerSchemaError(
    `The database was written by a newer version (${unknown.join(', ')}). ` +
      'Start that version, or restore a backup of before.',
  );
}

async function backUpFirst(db: Db, now: Date): Promise<void> {
  const folder = join(dirname(db.file), 'backups');
  mkdirSync(folder, { recursive: true });
  const stamp = now.toISOString().replaceAll(/[:.]/g, '-');
  await db.backup(join(folder, `before-migration-${stamp}.db`));
}

async function applyOne(db: Db, name: string, migration: Migration, now: Date): Promise<void> {
  await db.write.transaction().execute(async (tx) => {
    await migration.up(tx as unknown as Kysely<unknown>);
    const broken = await sql<{ table: string }>`pragma foreign_key_check`.execute(tx);
    if (broken.rows.length > 0) {
      const tables = [...new Set(broken.rows.map((row) => row.table))].join(', ');
      throw new Error(`Migration ${name} leaves broken references in ${tables}.`);
    }
    await tx
      .insertInto('applied_migrations')
      .values({ name, applied_at: now.toISOString() })
      .execute();
  });
}
