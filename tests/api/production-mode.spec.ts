import { type ChildProcess, spawn } from 'node:child_process';
import { existsSync, mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { createServer } from 'node:net';
import { tmpdir } from 'node:os';
import { join } from 'node:path';

import BetterSqlite from 'better-sqlite3';
import request from 'supertest';
import { afterEach, beforeEach, expect, it } from 'vitest';

import { databaseFile } from '../../server/db/open-database';

const SECRET = 'k7Zt2vQp9xWm4RsB8nLc6yHd3gFj5aTe';
let dataDir: string;
const started: ChildProcess[] = [];

beforeEach(() => {
  dataDir = mkdtempSync(join(tmpdir(), 'limen-production-'));
});
afterEach(() => {
  for (const child of started.splice(0)) child.kill('SIGKILL');
  rmSync(dataDir, { recursive: true, force: true });
});

interface Run {
  output: () => string;
  child: ChildProcess;
  exit: Promise<number | null>;
}

function start(environment: Record<string, string>): Run {
  const { PATH, HOME } = process.env;
  const child = spawn(process.execPath, ['--import', 'tsx', 'server/main.ts'], {
    env: {
      PATH,
      HOME,
      DATA_DIR: dataDir,
      NODE_ENV: 'production',
      LOG_LEVEL: 'warn',
      ...environment,
    },
  });
  started.push(child);
  let text = '';
  child.stdout.on('data', (chunk) => (text += chunk));
  child.stderr.on('data', (chunk) => (text += chunk));
  const exit = new Promise<number | null>((resolve) => child.once('exit', resolve));
  return { output: () => text, child, exit };
}

async function ready(run: Run): Promise<void> {
  const exited = run.exit.then(() => {
    throw new Error(run.output());
  });
  const said = (async () => {
    while (!run.output().includes('Limen is ready'))
      await new Promise((next) => setTimeout(next, 50));
  })();
  await Promise.race([said, exited]);
}

function freePort(): Promise<number> {
  return new Promise((resolve) => {
    const probe = createServer().listen(0, '127.0.0.1', () => {
      const { port } = probe.address() as { port: number };
      probe.close(() => resolve(port));
    });
  });
}

it('does not start without a strong secret, and touches nothing', async () => {
  const run = start({ PUBLIC_URL: 'https://limen.example', SESSION_SECRET: 'short' });
  expect(await run.exit).toBe(78);
  expect(run.output()).toContain('SESSION_SECRET');
  expect(run.output()).not.toContain('    at ');
  expect(existsSync(databaseFile(dataDir))).toBe(false);
});

it('starts empty, takes the first administrator by the printed token once, and stops in order', async () => {
  const port = await freePort();
  const publicUrl = `http://localhost:${port}`;
  const run = start({ PORT: String(port), PUBLIC_URL: publicUrl, SESSION_SECRET: SECRET });
  await ready(run);
  await new Promise((next) => setTimeout(next, 100));
  const token = /^ {2}(\S{40,})$/m.exec(run.output())?.[1] ?? '';
  expect(token).not.toBe('');
  expect(run.output()).not.toContain('halvermere');

  const agent = request.agent(`http://127.0.0.1:${port}`);
  const session = await agent.get('/api/session').expect(200);
  expect(session.body).toMatchObject({ user: null, demo: null, needsSetup: true });
  const cookies = session.headers['set-cookie'] as unknown as string[];
  const csrf = /XSRF-TOKEN=([^;]+)/.exec(cookies.join())?.[1] ?? '';
  const setUp = (given: string) =>
    agent.post('/api/setup').set({ Origin: publicUrl, 'X-XSRF-TOKEN': csrf }).send({
      token: given,
      name: 'Ada',
      email: 'ada@site.example',
      password: 'four tall quiet towers',
    });
  await setUp('not-the-token').expect(410);
  const created = await setUp(token).expect(201);
  expect(created.body.user).toMatchObject({ name: 'Ada', roles: ['administrator'] });
  expect(created.body.needsSetup).toBe(false);

  // Signed in now: the token of the visitor is worth nothing any more, the set-up is over.
  const fresh = /XSRF-TOKEN=([^;]+)/.exec(String(created.headers['set-cookie']))?.[1] ?? '';
  const again = await agent
    .post('/api/setup')
    .set({ Origin: publicUrl, 'X-XSRF-TOKEN': fresh })
    .send({ token, name: 'Eve', email: 'eve@site.example', password: 'four tall quiet towers' });
  expect(again.status).toBe(410);

  run.child.kill('SIGTERM');
  expect(await run.exit).toBe(0);
  // The head of the trail was signed at the stop, and the log holds neither token nor password.
  expect(readFileSync(join(dataDir, 'trail-heads.log'), 'utf8').trim().split('\n')).toHaveLength(1);
  expect(run.output()).not.toContain('four tall quiet towers');
  const db = new BetterSqlite(databaseFile(dataDir), { readonly: true });
  expect(db.prepare('select count(*) from people').pluck().get()).toBe(1);
  const dump = JSON.stringify(db.prepare('select * from setup_tokens').all());
  expect(dump).not.toContain(token);
  db.close();
});

it('refuses a database of a newer version with the exit code for configuration', async () => {
  const db = new BetterSqlite(databaseFile(dataDir));
  db.exec('create table applied_migrations (name text primary key, applied_at text not null)');
  db.exec("insert into applied_migrations values ('2999-01-01-0000-from-the-future', '2999')");
  db.close();
  const run = start({ PUBLIC_URL: 'https://limen.example', SESSION_SECRET: SECRET });
  expect(await run.exit).toBe(78);
  expect(run.output()).toContain('2999-01-01-0000-from-the-future');
});
