import { cpSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';

import BetterSqlite, { type Database } from 'better-sqlite3';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';

import { signHead } from '../../server/audit-trail/checkpoint';
import { GENESIS_HASH, rowHash } from '../../server/audit-trail/row-hash';
import { openTrailHeads } from '../../server/audit-trail/trail-heads';
import { verifyNewest, verifyTrail } from '../../server/audit-trail/verify-trail';
import { databaseFile, openDatabase } from '../../server/db/open-database';
import { createArea } from '../../server/features/areas/areas-service';
import { startTestApp, type TestApp } from '../support/test-app';

let app: TestApp;
/** A signed copy of the data directory for the attackers. */
let original: string;

beforeAll(async () => {
  app = await startTestApp();
  for (let count = 0; count < 60; count += 1) await recordArea(`R-${count}`);
  await signHead(app.edges);
  // A few entries after the last signature, as always in life.
  for (let count = 0; count < 5; count += 1) await recordArea(`S-${count}`);
  original = mkdtempSync(join(tmpdir(), 'limen-trail-'));
  await app.edges.db.backup(databaseFile(original));
  cpSync(join(app.dataDir, 'keys'), join(original, 'keys'), { recursive: true });
  cpSync(join(app.dataDir, 'trail-heads.log'), join(original, 'trail-heads.log'));
});
afterAll(async () => {
  await app.close();
  rmSync(original, { recursive: true });
});

function recordArea(code: string) {
  const place = { building: 'Main', room: code, department: 'Optics' };
  return app.as('lso', (ctx) => createArea(ctx, { code, name: `Lab ${code}`, ...place }));
}

/** What the verification says after somebody with write access to the files did `deed`. */
async function verdictAfter(deed: (db: Database, dataDir: string) => void) {
  const dataDir = mkdtempSync(join(tmpdir(), 'limen-attack-'));
  try {
    cpSync(original, dataDir, { recursive: true });
    const attacker = new BetterSqlite(databaseFile(dataDir));
    deed(attacker, dataDir);
    attacker.close();
    const db = openDatabase(databaseFile(dataDir));
    const verdict = await verifyTrail({ db, heads: openTrailHeads(dataDir) });
    await db.close();
    return verdict;
  } finally {
    rmSync(dataDir, { recursive: true });
  }
}

const TRIGGERS = [
  'audit_trail_no_update',
  'audit_trail_no_delete',
  'trail_checkpoints_no_update',
  'trail_checkpoints_no_delete',
];

/** Runs `deed` without the triggers and puts them back, as a careful attacker would. */
function behindTheTriggers(db: Database, deed: () => void): void {
  const find = db.prepare('select sql from sqlite_master where name = ?').pluck();
  const definitions = TRIGGERS.map((name) => find.get(name) as string);
  for (const name of TRIGGERS) db.exec(`drop trigger ${name}`);
  deed();
  for (const definition of definitions) db.exec(definition);
}

interface Entry {
  sequence: number;
  hash: string;
  [column: string]: unknown;
}

function entriesOf(db: Database): Entry[] {
  return db.prepare('select * from audit_trail order by sequence').all() as Entry[];
}

/** Recomputes every hash from `first` on, so that the chain is right in itself. */
function rehash(db: Database, first: number): void {
  const entries = entriesOf(db);
  let previous = entries.find((entry) => entry.sequence === first - 1)?.hash ?? GENESIS_HASH;
  const update = db.prepare('update audit_trail set hash = ? where sequence = ?');
  for (const entry of entries.filter((it) => it.sequence >= first)) {
    const content: Partial<Entry> = { ...entry };
    delete content.hash;
    previous = rowHash(previous, content as unknown as Parameters<typeof rowHash>[1]);
    update.run(previous, entry.sequence);
  }
}

describe('an entry', () => {
  it('says who, when, what, old and new value, and from where', async () => {
    const lso = await app.signIn('lso');
    const created = await lso
      .post('/api/areas', {
        code: 'E-1',
        name: 'Old',
        building: 'M',
        room: '1',
        department: 'Optics',
      })
      .expect(201);
    app.clock.advance({ minutes: 5 });
    const { id } = created.body;
    await lso
      .put(
        `/api/areas/${id}`,
        {
          code: 'E-1',
          name: 'New',
          building: 'M',
          room: '1',
          department: 'Optics',
          wallDistanceM: 4,
        },
        1,
      )
      .expect(200);
    const { body } = await lso.get(`/api/audit-trail?recordKind=area&recordId=${id}`).expect(200);
    expect(body.total).toBe(2);
    expect(body.rows[0]).toMatchObject({
      at: app.clock.read().toISOString(),
      actorId: app.personIds.lso,
      actorName: 'The lso',
      actorRole: 'lso',
      action: 'area.update',
      recordName: 'E-1',
      via: 'web',
      changes: [
        { field: 'name', before: 'Old', after: 'New' },
        { field: 'wallDistanceM', before: null, after: 4 },
      ],
    });
    expect(body.rows[1].action).toBe('area.create');
  });

  it('cannot be changed or removed through the database', () => {
    const db = new BetterSqlite(databaseFile(app.dataDir));
    expect(() => db.exec("update audit_trail set reason = 'x'")).toThrow(/append-only/);
    expect(() => db.exec('delete from audit_trail')).toThrow(/append-only/);
    expect(() => db.exec("update trail_checkpoints set hash = 'x'")).toThrow(/append-only/);
    expect(() => db.exec('delete from trail_checkpoints')).toThrow(/append-only/);
    db.close();
  });

  it('is written with its change or not at all', async () => {
    const before = (await verifyTrail(app.edges)).entries;
    const failing = app.as('lso', async (ctx) => {
      const place = { building: 'M', room: '1', department: 'Optics' };
      await createArea(ctx, { code: 'F-1', name: 'Lost', ...place });
      throw new Error('the power goes out here');
    });
    await expect(failing).rejects.toThrow('power');
    expect((await verifyTrail(app.edges)).entries).toBe(before);
    const lso = await app.signIn('lso');
    expect((await lso.get('/api/areas?q=F-1')).body.total).toBe(0);
  });

  it('is missed by nobody: a change without one is rolled back', async () => {
    const secretly = app.as('lso', (ctx) =>
      ctx.tx.updateTable('areas').set({ name: 'Changed secretly' }).execute(),
    );
    await expect(secretly).rejects.toThrow(/no audit entry/);
    const lso = await app.signIn('lso');
    expect((await lso.get('/api/areas?q=secretly')).body.total).toBe(0);
  });
});

describe('the verification', () => {
  it('finds an untouched trail intact', async () => {
    const verdict = await verdictAfter(() => undefined);
    expect(verdict).toMatchObject({ intact: true, firstBad: null });
    expect(verdict.entries).toBeGreaterThan(65);
    expect(verdict.checkpoints).toBeGreaterThan(0);
  });

  it('finds every single altered field, at the entry that was altered', async () => {
    const columns = Object.keys(entriesOf(new BetterSqlite(databaseFile(original)))[0] ?? {});
    for (const [index, column] of columns.entries()) {
      const sequence = 3 + index;
      const value = column === 'changes' ? '[]' : column === 'sequence' ? 9999 : 'altered';
      const verdict = await verdictAfter((db) =>
        behindTheTriggers(db, () => {
          db.prepare(`update audit_trail set ${column} = ? where sequence = ?`).run(
            value,
            sequence,
          );
        }),
      );
      expect(verdict.intact, column).toBe(false);
      expect(verdict.firstBad?.sequence, column).toBe(sequence);
    }
  });

  it('finds a deleted entry, wherever it stood', async () => {
    for (const sequence of [1, 2, 30, 60]) {
      const verdict = await verdictAfter((db) =>
        behindTheTriggers(db, () =>
          db.prepare('delete from audit_trail where sequence = ?').run(sequence),
        ),
      );
      expect(verdict.firstBad?.sequence).toBe(sequence);
    }
  });

  it('finds an inserted entry and two that were swapped', async () => {
    const inserted = await verdictAfter((db) =>
      behindTheTriggers(db, () => {
        const [first] = entriesOf(db);
        db.exec('update audit_trail set sequence = sequence + 10000 where sequence > 20');
        db.exec('update audit_trail set sequence = sequence - 9999 where sequence > 10000');
        const copy = { ...first, sequence: 21 };
        const names = Object.keys(copy);
        db.prepare(
          `insert into audit_trail (${names.join()}) values (${names.map((name) => `@${name}`).join()})`,
        ).run(copy);
      }),
    );
    expect(inserted.firstBad?.sequence).toBe(21);
    const swapped = await verdictAfter((db) =>
      behindTheTriggers(db, () => {
        db.exec('update audit_trail set sequence = -1 where sequence = 10');
        db.exec('update audit_trail set sequence = 10 where sequence = 11');
        db.exec('update audit_trail set sequence = 11 where sequence = -1');
      }),
    );
    expect(swapped.firstBad?.sequence).toBe(10);
  });

  it('finds a tail that was cut off', async () => {
    const verdict = await verdictAfter((db) =>
      behindTheTriggers(db, () => db.exec('delete from audit_trail where sequence > 40')),
    );
    expect(verdict.firstBad).toMatchObject({ sequence: 41 });
    expect(verdict.firstBad?.problem).toMatch(/cut/);
  });

  it('finds a cut tail although its checkpoints were removed as well', async () => {
    const verdict = await verdictAfter((db) =>
      behindTheTriggers(db, () => {
        db.exec('delete from audit_trail where sequence > 40');
        db.exec('delete from trail_checkpoints');
      }),
    );
    expect(verdict.firstBad?.sequence).toBe(41);
  });

  it('finds a trail rewritten with hashes that agree', async () => {
    const verdict = await verdictAfter((db) =>
      behindTheTriggers(db, () => {
        db.exec("update audit_trail set actor_name = 'Somebody else' where sequence = 5");
        rehash(db, 5);
      }),
    );
    expect(verdict.firstBad?.problem).toMatch(/rewritten/);
  });

  it('finds a rewritten trail although every checkpoint was forged along', async () => {
    const verdict = await verdictAfter((db, dataDir) => {
      behindTheTriggers(db, () => {
        db.exec("update audit_trail set actor_name = 'Somebody else' where sequence = 5");
        rehash(db, 5);
        db.exec(`update trail_checkpoints set hash =
          (select hash from audit_trail where audit_trail.sequence = trail_checkpoints.sequence)`);
      });
      const file = join(dataDir, 'trail-heads.log');
      const head = JSON.parse(readFileSync(file, 'utf8').trim().split('\n').at(-1) ?? '');
      const { hash } = db
        .prepare('select hash from audit_trail where sequence = ?')
        .get(head.sequence) as Entry;
      writeFileSync(file, `${JSON.stringify({ ...head, hash })}\n`);
    });
    expect(verdict.firstBad?.problem).toMatch(/not genuine/);
  });

  it('finds a file of signed heads that was removed, and triggers that are gone', async () => {
    const noFile = await verdictAfter((_db, dataDir) => rmSync(join(dataDir, 'trail-heads.log')));
    expect(noFile.firstBad?.problem).toMatch(/shortened/);
    const noTriggers = await verdictAfter((db) => db.exec('drop trigger audit_trail_no_update'));
    expect(noTriggers.firstBad?.problem).toMatch(/audit_trail_no_update/);
  });

  it('checks the newest entries at every start', async () => {
    expect(verifyNewest(app.edges.db, 1000)).toBeNull();
    expect(verifyNewest(app.edges.db, 10)).toBeNull();
    const dataDir = mkdtempSync(join(tmpdir(), 'limen-start-'));
    cpSync(original, dataDir, { recursive: true });
    const attacker = new BetterSqlite(databaseFile(dataDir));
    behindTheTriggers(attacker, () =>
      attacker.exec("update audit_trail set via = 'x' where sequence = 50"),
    );
    attacker.close();
    const db = openDatabase(databaseFile(dataDir));
    expect(verifyNewest(db, 1000)?.sequence).toBe(50);
    expect(verifyNewest(db, 10)).toBeNull();
    await db.close();
    rmSync(dataDir, { recursive: true });
  });

  it('is open to the LSO and the auditor, and exports the same entries', async () => {
    const auditor = await app.signIn('auditor');
    const { body } = await auditor.get('/api/audit-trail/verification').expect(200);
    expect(body.intact).toBe(true);
    const { text } = await auditor.get('/api/audit-trail.csv').expect(200);
    // Signing in wrote one more; the header is no entry.
    expect(text.trim().split('\r\n')).toHaveLength(body.entries + 1);
  });
});
