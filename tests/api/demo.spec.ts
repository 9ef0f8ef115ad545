import type { EvaluationRow } from '@shared/model/evaluations';
import type { LaserPage } from '@shared/model/lasers';
import { diffractionLimitMrad } from '@shared/model/emission-beam';
import type { Emission } from '@shared/model/lasers';
import { mkdtempSync, rmSync } from 'node:fs';
import { createServer, type Server } from 'node:http';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { pino } from 'pino';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';

import { DEMO_LASERS, DOUBLED_LINE } from '../../server/demo/demo-lasers';
import { seedDemo } from '../../server/demo/seed-demo';
import { DEMO_PASSWORD, demoEmail } from '../../server/config/demo-accounts';
import { openProduct, type Product } from '../../server/start';
import { FakeClock } from '../support/fake-clock';
import { testConfig } from '../support/test-app';
import { TestClient } from '../support/test-client';

let dataDir: string;
let product: Product;
let server: Server;
let lso: TestClient;
const clock = new FakeClock('2026-12-01T10:00:00.000Z');

beforeAll(async () => {
  dataDir = mkdtempSync(join(tmpdir(), 'limen-demo-'));
  const config = testConfig(dataDir);
  product = await openProduct(config, { clock: clock.read, log: pino({ level: 'silent' }) });
  await seedDemo(product.edges);
  server = createServer(product.http);
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
  lso = await signIn('Ilse Brandmoor');
});
afterAll(async () => {
  await new Promise((resolve) => server.close(resolve));
  await product.close();
  rmSync(dataDir, { recursive: true });
});

async function signIn(name: string): Promise<TestClient> {
  const client = new TestClient(server);
  await client.get('/api/session').expect(200);
  const credentials = { email: demoEmail(name), password: DEMO_PASSWORD };
  await client.post('/api/session', credentials).expect(200);
  return client;
}

async function register(query = ''): Promise<LaserPage> {
  return (await lso.get(`/api/lasers?limit=200&sort=tag${query}`).expect(200)).body;
}

async function evaluations(): Promise<EvaluationRow[]> {
  return (await lso.get('/api/evaluations?limit=200').expect(200)).body.rows;
}

function count(words: readonly string[]): Record<string, number> {
  const counts: Record<string, number> = {};
  for (const word of words) counts[word] = (counts[word] ?? 0) + 1;
  return counts;
}

describe('the demo institute', () => {
  it('has 42 lasers in the states of its table', async () => {
    const { rows, counts } = await register();
    expect(rows).toHaveLength(42);
    expect(counts.all).toBe(42);
    expect(count(rows.map(({ state }) => state))).toEqual({
      'in-use': 24,
      blocked: 4,
      'under-evaluation': 3,
      received: 2,
      stored: 2,
      'service-open': 2,
      evaluated: 1,
      'change-open': 1,
      registered: 1,
      commissioning: 1,
      'on-loan': 1,
    });
    for (const state of [
      'requested',
      'approved-to-buy',
      'rejected',
      'withdrawn',
      'disposed',
      'transferred',
    ]) {
      expect((await register(`&state=${state}`)).total, state).toBeGreaterThan(0);
    }
  });

  it('has its evaluations in the states of its table', async () => {
    const rows = await evaluations();
    const of = (tag: string) =>
      rows
        .filter(({ laser }) => laser.tag === tag)
        .map(({ number, state }) => `${number} ${state}`)
        .sort();
    expect(of('L-03')).toEqual(['1 stale']);
    expect(of('L-12')).toEqual(['1 stale']);
    expect(of('L-15')).toEqual(['1 stale']);
    expect(of('L-19')).toEqual(['1 withdrawn', '2 approved']);
    expect(of('L-20')).toEqual([]);
    expect(of('L-22')).toEqual(['1 in-check']);
    expect(of('L-24')).toEqual(['1 superseded', '2 approved']);
    expect(of('L-35')).toEqual(['1 checked']);
    expect(of('L-36')).toEqual(['1 draft']);
    const waiting = ['received', 'registered', 'under-evaluation'];
    for (const { tag, state, reach } of (await register()).rows) {
      if (waiting.includes(state)) continue;
      const stale = ['L-03', 'L-12', 'L-15'].includes(tag);
      expect(reach?.state, tag).toBe(stale ? 'stale' : 'approved');
    }
    const lidar = rows.find(({ laser }) => laser.tag === 'L-41');
    expect(lidar).toMatchObject({ reviewOn: '2026-12-12', ruleSet: 'ansi-z136.1-2014' });
  });

  it('no laser is in use without an evaluation and a dated waiver', async () => {
    for (const { id, tag, state } of (await register()).rows) {
      if (state !== 'in-use') continue;
      const { body } = await lso.get(`/api/lasers/${id}`).expect(200);
      expect(body.waiver, tag).toMatchObject({ ended: false });
      expect(body.waiver.missing.length, tag).toBeGreaterThan(3);
      expect(body.reach, tag).toBeDefined();
    }
  });

  it('every signature verifies, says that nobody was there, and is not the author’s where it may not be', async () => {
    let signatures = 0;
    for (const { id } of await evaluations()) {
      const { body } = await lso.get(`/api/evaluations/${id}`).expect(200);
      for (const signature of body.signatures) {
        signatures += 1;
        expect(signature).toMatchObject({ verified: true, proof: 'demo, no proof of presence' });
        if (signature.meaning !== 'prepared') expect(signature.signerId).not.toBe(body.author.id);
      }
      for (const result of body.results) expect(result.result.errors, id).toBeUndefined();
    }
    expect(signatures).toBeGreaterThan(100);
  });

  it('shows what got worse by the doubling crystal of L-03', async () => {
    const row = (await evaluations()).find(({ laser }) => laser.tag === 'L-03');
    const { body } = await lso.get(`/api/evaluations/${row?.id}`).expect(200);
    expect(body.inputsChanged).toEqual([
      { field: '400 nm', sealed: 'not on record', today: 'added' },
    ]);
    expect(body.whatChanged[0]).toMatchObject({ direction: 'new' });
    const halved = (await evaluations()).find(({ laser }) => laser.tag === 'L-12');
    const less = (await lso.get(`/api/evaluations/${halved?.id}`).expect(200)).body;
    expect(less.whatChanged.map((change: { direction: string }) => change.direction)).toContain(
      'better',
    );
  });

  it('tells each of its people what waits for them', async () => {
    const kinds = async (client: TestClient) =>
      (await client.get('/api/today').expect(200)).body.items.map(
        (item: { kind: string; title: string }) => `${item.kind} ${item.title.split(',')[0]}`,
      ) as string[];
    expect(await kinds(lso)).toEqual(
      expect.arrayContaining([
        'check L-22',
        'sign L-35',
        'laser-check L-20',
        'blocked L-03',
        'waiver-ends L-23',
        'review-due L-41',
      ]),
    );
    expect(await kinds(await signIn('Kofi Asantewell'))).toContain('check L-22');
    const supervisor = await kinds(await signIn('Aiko Tanabeshi'));
    expect(supervisor).toContain('stale L-03');
    expect(supervisor.every((one) => !one.startsWith('check') && !one.startsWith('sign'))).toBe(
      true,
    );
    expect(await kinds(await signIn('Hanae Morishiba'))).toEqual([]);
    expect(await kinds(await signIn('Noor Hadiqani'))).toEqual([]);
  });

  it('has an intact audit trail whose instants never go back', async () => {
    const { body } = await lso.get('/api/audit-trail/verification').expect(200);
    expect(body).toMatchObject({ intact: true, firstBad: null });
    const later = product.edges.db
      .prepareRead<{ at: string }>(
        `select at from audit_trail where record_kind in ('laser', 'evaluation') order by sequence`,
      )
      .all()
      .map(({ at }) => at);
    expect(later).toEqual([...later].sort());
    expect(later.at(-1)! <= clock.read().toISOString()).toBe(true);
  });
});

describe('the beams of the demo', () => {
  const lines: (readonly [string, Emission])[] = [
    ...DEMO_LASERS.flatMap(({ tag, lines: own }) => own.map((line) => [tag, line] as const)),
    ['L-03', DOUBLED_LINE],
  ];

  it.each(lines.map(([tag, line]) => [`${tag} ${line.wavelengthNm.value} nm`, line] as const))(
    '%s does not stand below the diffraction limit',
    (_, line) => {
      // The longest wavelength of a range has the largest limit.
      const longestNm = line.wavelengthToNm?.value ?? line.wavelengthNm.value;
      const axes = [
        [line.diameterMm, line.divergenceMrad],
        [line.diameterYMm ?? line.diameterMm, line.divergenceYMrad ?? line.divergenceMrad],
      ] as const;
      for (const [diameter, divergence] of axes) {
        if (!diameter || !divergence) continue;
        const limit = diffractionLimitMrad(longestNm, diameter.value);
        expect(divergence.value).toBeGreaterThanOrEqual(limit);
      }
    },
  );
});
