import { pino } from 'pino';
import request from 'supertest';
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, expect, it } from 'vitest';

import { openProduct, type Product } from '../../server/start';
import { FakeClock } from '../support/fake-clock';
import { testConfig } from '../support/test-app';

const CANARIES = {
  password: 'canary-password-7f3a',
  cookie: 'canary-cookie-91bc',
  token: 'canary-token-4e2d',
  query: 'canary-query-55aa',
};

let product: Product;
let dataDir: string;
const lines: string[] = [];
beforeAll(async () => {
  dataDir = mkdtempSync(join(tmpdir(), 'limen-log-'));
  const log = pino({ level: 'trace' }, { write: (line: string) => void lines.push(line) });
  product = await openProduct(testConfig(dataDir), { clock: new FakeClock().read, log });
});
afterAll(async () => {
  await product.close();
  rmSync(dataDir, { recursive: true });
});

it('the log has one JSON line for a request and for a refusal, and none of its secrets', async () => {
  await request(product.http)
    .post('/api/session')
    .set({
      Cookie: `sid=${CANARIES.cookie}`,
      Origin: 'http://localhost:4200',
      'X-XSRF-TOKEN': CANARIES.token,
      'X-Forwarded-For': 'forged\r\n{"level":60}'.replace(/[\r\n]/g, ' '),
    })
    .send({ email: 'a@site.example', password: CANARIES.password })
    .expect(403);
  await request(product.http)
    .get(`/api/areas?q=${CANARIES.query}%0A%7B%22level%22%3A60%7D`)
    .expect(401);
  const entries = lines.map((line) => JSON.parse(line) as Record<string, unknown>);
  for (const line of lines) expect(line.trim()).not.toContain('\n');
  for (const canary of Object.values(CANARIES)) expect(lines.join('')).not.toContain(canary);
  const refusals = entries.filter((entry) => entry['msg'] === 'refused');
  expect(refusals.map((entry) => entry['event'])).toEqual(['cross-site', 'not-signed-in']);
  expect(refusals[0]).toMatchObject({ method: 'POST', path: '/api/session' });
  expect(entries.filter((entry) => entry['res'] !== undefined)).toHaveLength(2);
});
