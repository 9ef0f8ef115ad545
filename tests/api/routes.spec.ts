import { ROLES } from '@shared/model/people';
import { isPublic, PERMISSIONS, scopeOf } from '@shared/permissions/permissions';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';

import { ROUTES } from '../../server/app';
import { somePath, titleOf } from '../support/route-cases';
import { startTestApp, type TestApp, type TestPerson } from '../support/test-app';
import type { TestClient } from '../support/test-client';

let app: TestApp;
beforeAll(async () => {
  app = await startTestApp();
});
afterAll(() => app.close());

/** Every route that needs no sign-in; a new one is a decision, made here. */
const PUBLIC_ROUTES = [
  'GET /healthz',
  'GET /readyz',
  'GET /api/healthz',
  'GET /api/readyz',
  'GET /api/session',
  'POST /api/session',
  'DELETE /api/session',
  'POST /api/setup',
  'POST /api/invitations/accept',
  'GET /api/openapi.json',
  'GET /api/docs',
];

describe('the list of routes', () => {
  it('names a permission for every route, and a route once only', () => {
    for (const route of ROUTES) expect(Object.keys(PERMISSIONS)).toContain(route.action);
    expect(new Set(ROUTES.map(titleOf)).size).toBe(ROUTES.length);
  });

  it('has exactly the known public routes', () => {
    const open = ROUTES.filter((route) => isPublic(route.action)).map(titleOf);
    expect(open.sort()).toEqual([...PUBLIC_ROUTES].sort());
  });

  it('is all that the router serves: nothing is mounted beside it', () => {
    interface Layer {
      route?: { path: string; methods: Record<string, boolean> };
    }
    const { stack } = app.product.http.router as unknown as { stack: Layer[] };
    const mounted = stack.flatMap(({ route }) =>
      route
        ? Object.keys(route.methods).map((method) => `${method.toUpperCase()} ${route.path}`)
        : [],
    );
    // `app.all` mounts the refusals: 405 per path, 404 for the rest of /api, and the page.
    const served = mounted.filter((title) => !/^(_ALL|ACL|BIND|CHECKOUT|CONNECT)/.test(title));
    const declared = new Set(ROUTES.map(titleOf));
    const paths = new Set<string>([
      ...ROUTES.map((route) => route.path),
      '/api{/*path}',
      '/index.html',
      '/{*path}',
    ]);
    for (const title of served) {
      const path = title.slice(title.indexOf(' ') + 1);
      expect(declared.has(title) || paths.has(path), title).toBe(true);
    }
    for (const title of declared) expect(served).toContain(title);
  });

  it('equals the paths of the OpenAPI description, both ways', async () => {
    const client = await app.visitor();
    const { body } = await client.get('/api/openapi.json').expect(200);
    expect(body.openapi).toBe('3.1.0');
    const described = Object.entries<object>(body.paths).flatMap(([path, operations]) =>
      Object.keys(operations).map((method) => `${method.toUpperCase()} ${path}`),
    );
    const declared = ROUTES.map((route) => titleOf(route).replaceAll(/:(\w+)/g, '{$1}'));
    expect(described.sort()).toEqual(declared.sort());
  });

  it('is described with a schema for every body and answer', async () => {
    const { body } = await (await app.visitor()).get('/api/openapi.json').expect(200);
    for (const route of ROUTES) {
      const path = route.path.replaceAll(/:(\w+)/g, '{$1}');
      const operation = body.paths[path][route.method];
      expect(operation.summary.length, titleOf(route)).toBeGreaterThan(5);
      if (route.input.body) expect(operation.requestBody.content, titleOf(route)).toBeDefined();
      if (route.output.kind !== 'nothing') {
        expect(operation.responses[String(route.status)].content, titleOf(route)).toBeDefined();
      }
      const parameters = (operation.parameters ?? []) as { in: string; name: string }[];
      const names = parameters.filter((it) => it.in === 'path').map((it) => it.name);
      expect(names).toEqual([...route.path.matchAll(/:(\w+)/g)].map((match) => match[1]));
    }
  });
});

describe('what is not there', () => {
  it('is a 404 problem under /api, for every method', async () => {
    const client = await app.visitor();
    for (const verb of ['get', 'post', 'put', 'delete', 'patch'] as const) {
      const answer = await client.bare(verb, '/api/no-such-thing').expect(404);
      expect(answer.type).toBe('application/problem+json');
      expect(answer.body).toMatchObject({ status: 404, name: 'not-found' });
    }
  });

  it('is a 405 with Allow where the path takes other methods', async () => {
    const client = await app.visitor();
    const answer = await client.bare('patch', '/api/areas').expect(405);
    expect(answer.headers['allow']).toBe('GET, POST, HEAD');
    expect(answer.body.name).toBe('method-not-allowed');
  });

  it.each([
    '/.git/config',
    '/.env',
    '/package.json',
    '/server/main.ts',
    '/data/limen.db',
    '/limen.db',
    '/..%2f..%2fetc%2fpasswd',
    '/%2e%2e/%2e%2e/etc/passwd',
    '/api/../package.json',
    '/index.html~',
    '/.well-known/security.txt',
  ])('gives the probe %s no file', async (path) => {
    const answer = await (await app.visitor()).get(path);
    // An address that is normalized to one without a dot may be a screen: then it is the page.
    if (answer.status === 200) expect(answer.text).toContain('<lm-root');
    else expect(answer.status).toBe(404);
  });
});

describe('permissions', () => {
  const guarded = ROUTES.filter((route) => !isPublic(route.action));

  it.each(guarded.map((route) => [titleOf(route), route] as const))(
    '%s asks for a sign-in',
    async (_title, route) => {
      const client = await app.visitor();
      const answer = await client.bare(route.method, somePath(route));
      expect(answer.status).toBe(401);
      expect(answer.body.name).toBe('not-signed-in');
    },
  );

  it.each(ROLES)(
    'a person who is only %s is refused what the table does not grant',
    async (role) => {
      const client: TestClient = await app.signIn(role satisfies TestPerson);
      for (const route of guarded) {
        const answer = await client.bare(route.method, somePath(route));
        const granted = scopeOf(route.action, [role]) !== undefined;
        expect(answer.body.name === 'not-allowed', titleOf(route)).toBe(!granted);
        if (!granted) expect(answer.status).toBe(403);
      }
    },
  );
});
