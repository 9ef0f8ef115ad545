import {
  closeSync,
  mkdtempSync,
  openSync,
  readdirSync,
  rmSync,
  statSync,
  writeSync,
} from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';

import BetterSqlite from 'better-sqlite3';
import { pino } from 'pino';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';

import { databaseFile } from '../../server/db/open-database';
import { acting, SYSTEM } from '../../server/context/context';
import { transact } from '../../server/context/transact';
import { seedInstitute } from '../../server/demo/demo-institute';
import { isEmpty, seedDemo } from '../../server/demo/seed-demo';
import { openEdges, openProduct } from '../../server/start';
import { FakeClock } from '../support/fake-clock';
import { testConfig } from '../support/test-app';

const LOG = pino({ level: 'silent' });
let dataDir: string;
beforeEach(() => {
  dataDir = mkdtempSync(join(tmpdir(), 'limen-start-'));
});
afterEach(() => rmSync(dataDir, { recursive: true }));

function open() {
  return openProduct(testConfig(dataDir), { clock: new FakeClock().read, log: LOG });
}

describe('a start', () => {
  it('keeps keys where only the product reads them', async () => {
    const product = await openProduct(testConfig(dataDir, { sessionSecret: undefined }), {
      clock: new FakeClock().read,
      log: LOG,
    });
    await product.close();
    const keys = readdirSync(join(dataDir, 'keys'));
    expect(keys.sort()).toEqual(['demo-session-secret', 'trail-ed25519.pem']);
    for (const key of keys) {
      expect(statSync(join(dataDir, 'keys', key)).mode & 0o077, key).toBe(0);
    }
  });

  it('leaves one whole file behind when it is closed', async () => {
    const product = await open();
    await transact(product.edges, acting(SYSTEM, 'test'), seedInstitute);
    await product.close();
    expect(readdirSync(dataDir).filter((name) => name.startsWith('limen.db'))).toEqual([
      'limen.db',
    ]);
  });

  it('on a trail that was altered is refused, and says where', async () => {
    const product = await open();
    await transact(product.edges, acting(SYSTEM, 'test'), seedInstitute);
    await product.close();
    const attacker = new BetterSqlite(databaseFile(dataDir));
    attacker.exec('drop trigger audit_trail_no_update');
    const last = attacker.prepare('select max(sequence) from audit_trail').pluck().get() as number;
    attacker.prepare("update audit_trail set actor_name = 'x' where sequence = ?").run(last - 5);
    attacker.close();
    await expect(open()).rejects.toThrow(new RegExp(`entry ${last - 5}`));
  });

  it('on a damaged file is refused', async () => {
    const product = await open();
    await transact(product.edges, acting(SYSTEM, 'test'), seedInstitute);
    await product.close();
    const handle = openSync(databaseFile(dataDir), 'r+');
    for (let page = 3; page < 40; page += 1)
      writeSync(handle, Buffer.alloc(600, 0xa5), 0, 600, page * 4096);
    closeSync(handle);
    await expect(open()).rejects.toThrow();
  });
});

describe('the demo institute', () => {
  it('is recorded whole, with an entry in the trail for each record', async () => {
    const edges = await openEdges(testConfig(dataDir), { clock: new FakeClock().read, log: LOG });
    expect(await isEmpty(edges)).toBe(true);
    await seedDemo(edges);
    expect(await isEmpty(edges)).toBe(false);
    const count = (sql: string) => edges.db.prepareRead<{ n: number }>(sql).get()?.n;
    expect(count('select count(*) as n from people')).toBe(60);
    expect(count('select count(*) as n from areas')).toBe(12);
    for (const kind of ['person', 'area']) {
      const table = kind === 'person' ? 'people' : 'areas';
      expect(
        count(
          `select count(*) as n from ${table} where not exists (select 1 from audit_trail
           where record_kind = '${kind}' and record_id = ${table}.id)`,
        ),
      ).toBe(0);
    }
    await edges.db.close();
  });

  it('never comes to a production site', async () => {
    const config = testConfig(dataDir, { production: true });
    const edges = await openEdges(config, { clock: new FakeClock().read, log: LOG });
    await expect(seedDemo(edges)).rejects.toThrow('not for production');
    await edges.db.close();
  });
});
