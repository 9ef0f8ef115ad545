import { spawnSync } from 'node:child_process';
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';

import BetterSqlite from 'better-sqlite3';
import { pino } from 'pino';
import { afterAll, beforeAll, expect, it } from 'vitest';

import { databaseFile } from '../../server/db/open-database';
import { acting, SYSTEM } from '../../server/context/context';
import { transact } from '../../server/context/transact';
import { seedInstitute } from '../../server/demo/demo-institute';
import { openProduct } from '../../server/start';
import { FakeClock } from '../support/fake-clock';
import { testConfig } from '../support/test-app';

let dataDir: string;
beforeAll(async () => {
  dataDir = mkdtempSync(join(tmpdir(), 'limen-verify-'));
  const log = pino({ level: 'silent' });
  const product = await openProduct(testConfig(dataDir), { clock: new FakeClock().read, log });
  await transact(product.edges, acting(SYSTEM, 'test'), seedInstitute);
  await product.close();
});
afterAll(() => rmSync(dataDir, { recursive: true }));

function verify(folder = dataDir) {
  const { PATH, HOME } = process.env;
  return spawnSync(process.execPath, ['--import', 'tsx', 'server/cli/verify-trail.ts'], {
    env: { PATH, HOME, DATA_DIR: folder },
    encoding: 'utf8',
  });
}

it('verify-trail says that all is well, or names the first bad entry and exits with 1', () => {
  const intact = verify();
  expect(intact.status).toBe(0);
  expect(intact.stdout).toMatch(/^Intact: [\d,]+ entries, 1 signed heads, head [0-9a-f]{64}$/m);
  const attacker = new BetterSqlite(databaseFile(dataDir));
  attacker.exec('drop trigger audit_trail_no_update');
  attacker.exec("update audit_trail set reason = 'invented' where sequence in (17, 23)");
  attacker.close();
  const altered = verify();
  expect(altered.status).toBe(1);
  expect(altered.stderr).toContain(
    'NOT INTACT at entry 17: The entry does not agree with its hash',
  );
});

it('verify-trail on a folder without a database says so and creates nothing', () => {
  const nowhere = verify(join(dataDir, 'nothing'));
  expect(nowhere.status).toBe(2);
  expect(nowhere.stderr).toContain('no database');
});
