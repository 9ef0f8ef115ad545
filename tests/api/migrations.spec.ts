import { existsSync, mkdtempSync, readdirSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';

import { type Kysely, sql } from 'kysely';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';

import { MIGRATIONS } from '../../migrations/index';
import { type Migration, migrate, NewerSchemaError } from '../../server/db/migrate';
import { databaseFile, type Db, openDatabase } from '../../server/db/open-database';

const NOW = new Date('2026-12-01T09:00:00.000Z');
let dataDir: string;
let db: Db;
beforeEach(() => {
  dataDir = mkdtempSync(join(tmpdir(), 'limen-migrations-'));
  db = openDatabase(databaseFile(dataDir));
});
afterEach(async () => {
  await db.close();
  rmSync(dataDir, { recursive: true });
});

describe('migrations', () => {
  it('are listed once each, by the name of their file', () => {
    const files = readdirSync('migrations').filter((name) => name !== 'index.ts');
    expect(Object.keys(MIGRATIONS).sort()).toEqual(
      files.map((name) => name.replace('.ts', '')).sort(),
    );
    for (const file of files) {
      const imports = readFileSync(join('migrations', file), 'utf8').match(/from '([^']+)'/g);
      expect(imports).toEqual(["from 'kysely'"]);
    }
  });

  it('run once, in order, and leave every table strict', async () => {
    const applied = await migrate(db, MIGRATIONS, NOW);
    expect(applied).toEqual(Object.keys(MIGRATIONS).sort());
    expect(await migrate(db, MIGRATIONS, NOW)).toEqual([]);
    const tables = db
      .prepareRead<{ name: string; type: string; strict: number }>('pragma table_list')
      .all();
    // What a search index keeps for itself has types of its own.
    const ours = tables.filter(
      ({ name, type }) => type === 'table' && !/^sqlite_|^applied_migrations$/.test(name),
    );
    expect(ours.length).toBeGreaterThan(8);
    for (const { name, strict } of ours) expect([name, strict]).toEqual([name, 1]);
  });

  it('that fail leave nothing behind, and a backup was made before', async () => {
    await migrate(db, MIGRATIONS, NOW);
    const failing: Migration = {
      up: async (tx: Kysely<unknown>) => {
        await sql`create table half_done (id text primary key) strict`.execute(tx);
        throw new Error('no space');
      },
    };
    const more = { ...MIGRATIONS, '2999-01-01-0000-fails': failing };
    await expect(migrate(db, more, NOW)).rejects.toThrow('no space');
    const left = db.prepareRead("select 1 from sqlite_master where name = 'half_done'").all();
    expect(left).toEqual([]);
    expect(
      existsSync(join(dataDir, 'backups', 'before-migration-2026-12-01T09-00-00-000Z.db')),
    ).toBe(true);
  });

  it('of a newer version are refused', async () => {
    await migrate(db, MIGRATIONS, NOW);
    const older = Object.fromEntries(Object.entries(MIGRATIONS).slice(1));
    await expect(migrate(db, older, NOW)).rejects.toThrow(NewerSchemaError);
  });
});

describe('the database', () => {
  it('commits to the disk before it answers, and checks references', () => {
    const pragma = (name: string) =>
      db.prepareRead<Record<string, unknown>>(`pragma ${name}`).get();
    expect(pragma('journal_mode')).toEqual({ journal_mode: 'wal' });
    expect(pragma('synchronous')).toEqual({ synchronous: 2 });
    expect(pragma('foreign_keys')).toEqual({ foreign_keys: 1 });
    expect(pragma('trusted_schema')).toEqual({ trusted_schema: 0 });
  });

  it('lets two processes write in turn without an error', async () => {
    await migrate(db, MIGRATIONS, NOW);
    const other = openDatabase(databaseFile(dataDir));
    const write = (from: Db, name: string) =>
      from.write.transaction().execute(async (tx) => {
        const rows = await tx.selectFrom('job_leases').select('name').execute();
        await tx
          .insertInto('job_leases')
          .values({ name: `${name}-${rows.length}`, owner: '', leased_until: '', done_until: '' })
          .execute();
      });
    for (let count = 0; count < 50; count += 1) {
      await write(db, 'one');
      await write(other, 'two');
    }
    await other.close();
    expect(db.prepareRead<{ n: number }>('select count(*) as n from job_leases').get()?.n).toBe(
      100,
    );
  });
});
