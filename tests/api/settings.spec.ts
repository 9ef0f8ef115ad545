import { afterAll, beforeAll, expect, it } from 'vitest';

import { startTestApp, type TestApp } from '../support/test-app';

let app: TestApp;
beforeAll(async () => {
  app = await startTestApp();
});
afterAll(() => app.close());

const INPUT = {
  siteName: 'Test site',
  zone: 'Europe/Berlin',
  ruleSet: 'icnirp-2013',
  classScheme: 'iec-60825-1-2014',
  authorMayApprove: false,
  evaluationReviewMonths: 12,
  emergencyPhone: '112',
};

it('settings are there from the start, and the site adopts its own', async () => {
  const lso = await app.signIn('lso');
  const first = await lso.get('/api/settings').expect(200);
  expect(first.body).toMatchObject({ version: 1, ruleSet: 'iec-60825-1-2014' });
  const { body } = await lso.put('/api/settings', INPUT, 1).expect(200);
  expect(body).toMatchObject({ ...INPUT, version: 2 });
  expect((await lso.get('/api/session')).body.site).toEqual({
    name: 'Test site',
    zone: 'Europe/Berlin',
  });
});

it('that the author may approve needs a reason, which is kept in the trail', async () => {
  const lso = await app.signIn('lso');
  const { version } = (await lso.get('/api/settings')).body;
  const bare = await lso.put('/api/settings', { ...INPUT, authorMayApprove: true }, version);
  expect(bare.status).toBe(400);
  expect(bare.body.errors[0].path).toBe('authorMayApproveReason');
  const authorMayApproveReason = 'There is one laser safety officer on this site.';
  await lso
    .put('/api/settings', { ...INPUT, authorMayApprove: true, authorMayApproveReason }, version)
    .expect(200);
  const { body } = await lso.get('/api/audit-trail?recordKind=settings&limit=1').expect(200);
  expect(body.rows[0]).toMatchObject({ action: 'settings.update', reason: authorMayApproveReason });
});

it('settings take a real time zone and a rule set that the engine has', async () => {
  const lso = await app.signIn('lso');
  const { version } = (await lso.get('/api/settings')).body;
  const wrong = { ...INPUT, zone: 'Europe/Atlantis', ruleSet: 'unknown-1999' };
  const { body } = await lso.put('/api/settings', wrong, version).expect(400);
  const paths = body.errors.map((error: { path: string }) => error.path);
  expect(paths).toEqual(['zone', 'ruleSet']);
  expect(body.errors[1].allowed).toContain('icnirp-2013');
});

it('settings are changed by the LSO and the administrator only', async () => {
  for (const person of ['operator', 'auditor', 'deputy-lso', 'laser-supervisor'] as const) {
    const client = await app.signIn(person);
    await client.get('/api/settings').expect(200);
    await client.put('/api/settings', INPUT, 1).expect(403);
  }
});
