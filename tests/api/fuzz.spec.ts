import { problemSchema } from '@shared/model/problem';
import fc, { type Arbitrary } from 'fast-check';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';

import { ROUTES } from '../../server/app';
import type { Route } from '../../server/http/route';
import { someRoleFor, titleOf } from '../support/route-cases';
import { inputFor } from '../support/schema-arbitrary';
import { startTestApp, type TestApp } from '../support/test-app';
import type { TestClient } from '../support/test-client';

/** Over 2,000 requests in all; a failing one is printed with its seed, shrunk. */
const RUNS_PER_ROUTE = Math.ceil(2000 / ROUTES.length);

let app: TestApp;
const ids: string[] = ['nothing-here', 'settings', '%00', "'--", '..%2f..', 'x'.repeat(300)];
beforeAll(async () => {
  app = await startTestApp();
  ids.push(...Object.values(app.areaIds), ...Object.values(app.personIds));
});
afterAll(() => app.close());

async function clientFor(route: Route): Promise<TestClient> {
  const role = someRoleFor(route);
  // The attempts that were counted by earlier routes are long ago.
  app.clock.advance({ minutes: 16 });
  if (route.action === 'person.update') return app.signIn('administrator');
  return role ? app.signIn(role) : app.visitor();
}

function pathFor(route: Route): Arbitrary<string> {
  const parts = route.path.split('/');
  const filled = parts.map((part) =>
    part.startsWith(':') ? fc.constantFrom(...ids) : fc.constant(part),
  );
  return fc.tuple(...filled).map((segments) => segments.join('/'));
}

function queryFor(route: Route): Arbitrary<string> {
  const values = route.input.query ? inputFor(route.input.query) : fc.constant({});
  return values.map((value) => {
    if (typeof value !== 'object' || value === null) return '?x';
    const pairs = Object.entries(value).map(
      ([key, it]) =>
        `${escape(key)}=${escape(typeof it === 'object' ? JSON.stringify(it) : String(it))}`,
    );
    return pairs.length > 0 ? `?${pairs.join('&')}` : '';
  });
}

function escape(text: string): string {
  return encodeURIComponent(text.replaceAll(/\p{Surrogate}/gu, '\uFFFD'));
}

async function send(
  client: TestClient,
  route: Route,
  { path, body, file }: { path: string; body: unknown; file: Uint8Array },
) {
  if (route.method === 'get') return client.get(path);
  if (route.multipart) {
    return client[route.method](path, undefined, 1).attach('file', Buffer.from(file), 'a.pdf');
  }
  const request = client[route.method](path).set('If-Match', '"1"');
  return request.type('application/json').send(JSON.stringify(body) ?? '');
}

describe.each(ROUTES.map((route) => [titleOf(route), route] as const))('%s', (_title, route) => {
  it('answers whatever comes with success or a problem, never with a failure', async () => {
    const client = await clientFor(route);
    const body = route.input.body ? inputFor(route.input.body) : fc.constant({});
    await fc.assert(
      fc.asyncProperty(
        pathFor(route),
        queryFor(route),
        body,
        fc.uint8Array({ maxLength: 200 }),
        async (path, query, content, file) => {
          const answer = await send(client, route, { path: path + query, body: content, file });
          expect(answer.status, JSON.stringify(answer.body)).toBeLessThan(500);
          if (answer.status < 400) return;
          expect(answer.type).toBe('application/problem+json');
          expect(problemSchema.parse(answer.body).status).toBe(answer.status);
        },
      ),
      { numRuns: RUNS_PER_ROUTE },
    );
  });
});

it('after all this the trail is intact and the sign-in still works', async () => {
  app.clock.advance({ minutes: 16 });
  const lso = await app.signIn('lso');
  const { body } = await lso.get('/api/audit-trail/verification').expect(200);
  expect(body.intact).toBe(true);
});
