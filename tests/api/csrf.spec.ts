import { afterAll, beforeAll, describe, expect, it } from 'vitest';

import { MUTATING_ROUTES, somePath, someRoleFor, titleOf } from '../support/route-cases';
import { startTestApp, type TestApp } from '../support/test-app';
import type { TestClient } from '../support/test-client';

let app: TestApp;
const clients = new Map<string, TestClient>();
beforeAll(async () => {
  app = await startTestApp();
});
afterAll(() => app.close());

async function clientFor(role: ReturnType<typeof someRoleFor>): Promise<TestClient> {
  const known = clients.get(role ?? 'visitor');
  if (known) return known;
  const client = await (role ? app.signIn(role) : app.visitor());
  clients.set(role ?? 'visitor', client);
  return client;
}

describe.each(MUTATING_ROUTES.map((route) => [titleOf(route), route] as const))(
  '%s is refused',
  (_title, route) => {
    const own = 'http://localhost:4200';

    async function attempt(headers: Record<string, string>) {
      const client = await clientFor(someRoleFor(route));
      const body = route.multipart ? undefined : {};
      const test = client.bare(route.method, somePath(route)).set(headers).set('If-Match', '"1"');
      return { answer: await (body ? test.send(body) : test), client };
    }

    it('without a token', async () => {
      const { answer } = await attempt({ Origin: own });
      expect(answer.status).toBe(403);
      expect(answer.body.name).toBe('cross-site');
    });

    it('with the token of another session', async () => {
      const stranger = await app.visitor();
      const { answer } = await attempt({
        Origin: own,
        'X-XSRF-TOKEN': stranger.csrfToken ?? '',
      });
      expect(answer.body.name).toBe('cross-site');
    });

    it.each([
      ['a foreign origin', { Origin: 'https://elsewhere.example' }],
      ['no origin at all', {}],
      ['the origin null', { Origin: 'null' }],
      ['a cross-site fetch', { Origin: own, 'Sec-Fetch-Site': 'cross-site' }],
      ['a same-site fetch from another host', { 'Sec-Fetch-Site': 'same-site' }],
      [
        'a foreign origin that claims to be same-origin',
        {
          Origin: 'https://elsewhere.example',
          'Sec-Fetch-Site': 'same-origin',
        },
      ],
    ])('with its token but %s', async (_name, headers: Record<string, string>) => {
      const client = await clientFor(someRoleFor(route));
      const { answer } = await attempt({ ...headers, 'X-XSRF-TOKEN': client.csrfToken ?? '' });
      expect(answer.status).toBe(403);
      expect(answer.body.name).toBe('cross-site');
    });

    it('as an HTML form', async () => {
      const client = await clientFor(someRoleFor(route));
      for (const type of [
        'application/x-www-form-urlencoded',
        'text/plain',
        ...(route.multipart ? [] : ['multipart/form-data; boundary=x']),
      ]) {
        const answer = await client
          .bare(route.method, somePath(route))
          .set({ Origin: own, 'X-XSRF-TOKEN': client.csrfToken ?? '', 'If-Match': '"1"' })
          .set('Content-Type', type)
          .send('a=1');
        expect(answer.status).toBe(415);
      }
    });
  },
);

it('a page that was loaded before signing in can sign in, and then change things', async () => {
  const client = await app.signIn('lso');
  await client.delete('/api/session').expect(204);
});
