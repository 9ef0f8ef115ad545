import { afterAll, beforeAll, describe, expect, it } from 'vitest';

import { ROUTES } from '../../server/app';
import { somePath, titleOf } from '../support/route-cases';
import { startTestApp, type TestApp } from '../support/test-app';
import type { TestClient } from '../support/test-client';

type Answer = Awaited<ReturnType<TestClient['get']>>;

let app: TestApp;
let lso: TestClient;
beforeAll(async () => {
  app = await startTestApp({ publicUrl: 'http://localhost:4200' });
  lso = await app.signIn('lso');
});
afterAll(() => app.close());

function expectSafe(answer: Answer): void {
  const { headers } = answer;
  expect(headers['x-content-type-options']).toBe('nosniff');
  expect(headers['x-frame-options']).toBe('DENY');
  expect(headers['referrer-policy']).toBe('same-origin');
  expect(headers['content-security-policy']).toContain("default-src 'none'");
  expect(headers['content-security-policy']).toContain("frame-ancestors 'none'");
  expect(headers['content-security-policy']).not.toContain('unsafe');
  expect(headers['access-control-allow-origin']).toBeUndefined();
  expect(headers['x-powered-by']).toBeUndefined();
  if (answer.text) expect(headers['content-type']).toBeDefined();
}

describe('headers', () => {
  it.each(ROUTES.map((route) => [titleOf(route), route] as const))(
    'are safe on %s, answered or refused',
    async (_title, route) => {
      const visitor = await app.visitor();
      for (const client of [lso, visitor]) {
        const answer = await client
          .bare(route.method, somePath(route))
          .set('Origin', 'https://evil.example');
        expectSafe(answer);
        if (route.path.startsWith('/api/'))
          expect(answer.headers['cache-control']).toBe('no-store');
        if (answer.status >= 400) expect(answer.type).toBe('application/problem+json');
      }
    },
  );

  it.each([
    ['404', (client: TestClient) => client.get('/api/nothing')],
    ['405', (client: TestClient) => client.bare('patch', '/api/areas')],
    ['400', (client: TestClient) => client.get('/api/areas?limit=0')],
    ['413', (client: TestClient) => client.post('/api/areas', { name: 'x'.repeat(200_000) })],
    ['415', (client: TestClient) => client.post('/api/areas').type('text/plain').send('x')],
  ])('are safe on a %s', async (status, ask) => {
    const answer = await ask(lso);
    expect(String(answer.status)).toBe(status);
    expectSafe(answer);
    expect(answer.type).toBe('application/problem+json');
  });

  it('are safe on a failure of ours, which tells nothing of the inside', async () => {
    const broken = await startTestApp();
    const client = await broken.signIn('lso');
    await broken.edges.db.write.schema.dropTable('settings').execute();
    const answer = await client.get('/api/settings').expect(500);
    expectSafe(answer);
    expect(answer.body).toMatchObject({ name: 'internal', status: 500 });
    expect(JSON.stringify(answer.body)).not.toMatch(/sql|table|settings|node_modules|\.ts/i);
    expect(answer.body.detail).toContain(answer.body.requestId);
    await broken.close();
  });

  it('refuses TRACE', async () => {
    const { port } = app.server.address() as { port: number };
    const { request } = await import('node:http');
    const status = await new Promise<number>((resolve) => {
      request({ port, method: 'TRACE', path: '/api/areas' }, (res) =>
        resolve(res.statusCode ?? 0),
      ).end();
    });
    expect(status).toBe(405);
  });
});
