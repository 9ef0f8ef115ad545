import { afterAll, beforeAll, describe, expect, it } from 'vitest';

import { startTestApp, type TestApp } from '../support/test-app';
import type { TestClient } from '../support/test-client';

let app: TestApp;
let operator: TestClient;
beforeAll(async () => {
  app = await startTestApp();
  operator = await app.signIn('operator');
});
afterAll(() => app.close());

/** Case A of the engine contract, section 8. */
const CASE_A = {
  ruleSet: 'ansi-z136.1-2014',
  beams: [
    {
      wavelengthNm: 532,
      emission: { mode: 'cw', powerW: 5 },
      diameterMm: 2.3,
      divergenceMrad: 0.5,
      width: '1/e2',
      profile: 'gaussian',
    },
  ],
  exposure: { eyeS: 0.25 },
};

describe('POST /api/evaluate', () => {
  it('answers what the engine answers, and stores nothing', async () => {
    const before = app.edges.db.totalChanges();
    const { body } = await operator.post('/api/evaluate', CASE_A).expect(200);
    expect(body.eye.hazardDistanceM).toBeCloseTo(1414.3853, 3);
    expect(body.eye.opticalDensity).toBeCloseTo(3.7078965, 6);
    expect(body.steps.length).toBeGreaterThan(5);
    expect(body.cautions.length).toBeGreaterThan(3);
    expect(app.edges.db.totalChanges()).toBe(before);
    const bare = await operator.post('/api/evaluate?bare=1', CASE_A).expect(200);
    expect(bare.body.steps).toBeUndefined();
    expect(bare.body.eye.hazardDistanceM).toBe(body.eye.hazardDistanceM);
  });

  it('answers bad input as a problem with the engine’s field errors', async () => {
    const [beam] = CASE_A.beams;
    const wrong = {
      ...CASE_A,
      beams: [{ ...beam, emission: { mode: 'cw', powerW: -5 } }],
      extra: 1,
    };
    const { body } = await operator.post('/api/evaluate', wrong).expect(400);
    expect(body).toMatchObject({ name: 'invalid-input', status: 400 });
    expect(body.errors).toContainEqual(
      expect.objectContaining({
        path: 'beams[0].emission.powerW',
        message: expect.any(String),
        allowed: expect.any(String),
      }),
    );
    for (const odd of [{}, { ruleSet: null }, { beams: {} }, { ...CASE_A, beams: [] }]) {
      await operator.post('/api/evaluate', odd).expect(400);
    }
    await operator.post('/api/evaluate', []).expect(400);
    await operator.post('/api/evaluate?bare=2', CASE_A).expect(400);
  });

  it('is for signed-in people', async () => {
    const visitor = await app.visitor();
    await visitor.post('/api/evaluate', CASE_A).expect(401);
  });
});
