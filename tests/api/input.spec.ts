import { afterAll, beforeAll, describe, expect, it } from 'vitest';

import { startTestApp, type TestApp } from '../support/test-app';
import type { TestClient } from '../support/test-client';

let app: TestApp;
let lso: TestClient;
beforeAll(async () => {
  app = await startTestApp();
  lso = await app.signIn('lso');
});
afterAll(() => app.close());

const AREA = { code: 'X-1', name: 'Lab', building: 'Main', room: 'X', department: 'Optics' };

describe('bad input', () => {
  it('is answered with every field, what is wrong and what is allowed', async () => {
    const { body } = await lso
      .post('/api/areas', { ...AREA, name: '', wallDistanceM: -1, color: 'red' })
      .expect(400);
    expect(body).toMatchObject({ name: 'invalid-input', status: 400 });
    expect(body.type).toBe('urn:limen:problem:invalid-input');
    expect(body.errors).toEqual([
      { path: 'name', message: 'Enter the name of the area.' },
      {
        path: 'wallDistanceM',
        message: 'The distance to the wall is more than 0 m.',
        allowed: 'more than 0',
      },
      {
        path: 'color',
        message: 'color is not known here. Leave it out, or check its spelling.',
      },
    ]);
  });

  it.each([
    ['broken JSON', '{"code": ', 400],
    ['a list instead of an object', '[]', 400],
    ['a bare text', '"text"', 400],
    ['null', 'null', 400],
    ['a number too large for a number', `{"wallDistanceM": 1e999}`, 400],
    ['nesting without end', `{"note": ${'['.repeat(5000)}${']'.repeat(5000)}}`, 400],
    ['a polluting key', '{"__proto__": {"polluted": true}}', 400],
    ['a constructor key', '{"constructor": {"prototype": {"polluted": true}}}', 400],
  ])('%s is refused', async (_name, text, status) => {
    const answer = await lso.post('/api/areas').type('application/json').send(text);
    expect(answer.status).toBe(status);
    expect(answer.body.name).toBe('invalid-input');
    expect(({} as { polluted?: unknown }).polluted).toBeUndefined();
  });

  it('refuses text that could not be stored and read back the same', async () => {
    for (const name of ['half \uD83D pair', 'nul \0 inside']) {
      const answer = await lso
        .post('/api/areas')
        .type('json')
        .send(JSON.stringify({ ...AREA, name }));
      expect(answer.status).toBe(400);
      expect(answer.body.errors[0].path).toBe('name');
    }
  });

  it('refuses a query parameter given twice or not known', async () => {
    const twice = await lso.get('/api/areas?q=a&q=b').expect(400);
    expect(twice.body.errors[0]).toMatchObject({ path: 'q' });
    const unknown = await lso.get('/api/areas?sort=name').expect(400);
    expect(unknown.body.errors[0].path).toBe('sort');
    await lso.get('/api/settings?x=1').expect(400);
  });

  it('refuses a broken key of a page', async () => {
    for (const after of ['x', 'W10', Buffer.from('["a",{}]').toString('base64url')]) {
      const { body } = await lso.get(`/api/areas?after=${after}`).expect(400);
      expect(body.errors[0].path).toBe('after');
    }
  });

  it('refuses a broken %-code and an id that cannot be one', async () => {
    await lso.get('/api/areas/%E0%A4%A').expect(400);
    await lso.get('/api/areas/not%20an%20id').expect(404);
  });

  it('refuses a body in another character set or coding', async () => {
    const latin = await lso
      .post('/api/areas')
      .set('Content-Type', 'application/json; charset=latin1')
      .send('{}');
    expect(latin.status).toBe(415);
    const coded = await lso
      .post('/api/areas')
      .type('json')
      .set('Content-Encoding', 'zip')
      .send('{}');
    expect(coded.status).toBe(415);
  });

  it('keeps any other text exactly as typed', async () => {
    const name = 'Lábor “µ” — Ω ≤ 3\u202F× 10⁻⁵ 🔬 %2e &lt;b&gt; \u202Eabc';
    const { body } = await lso.post('/api/areas', { ...AREA, code: 'X-2', name }).expect(201);
    expect((await lso.get(`/api/areas/${body.id}`)).body.name).toBe(name);
  });
});

describe('versions', () => {
  it('are asked for, compared and counted', async () => {
    const created = await lso.post('/api/areas', { ...AREA, code: 'V-1' }).expect(201);
    const path = created.headers['location'] as string;
    expect(path).toBe(`/api/areas/${created.body.id}`);
    expect(created.headers['etag']).toBe('"1"');
    const input = { ...AREA, code: 'V-1', name: 'Renamed' };

    const missing = await lso.put(path, input).expect(428);
    expect(missing.body.name).toBe('version-missing');
    const changed = await lso.put(path, input, 1).expect(200);
    expect(changed.headers['etag']).toBe('"2"');
    const stale = await lso.put(path, input, 1).expect(412);
    expect(stale.body).toMatchObject({ name: 'stale-version', currentVersion: 2 });
    for (const header of ['W/"2"', '2', '*', '"2", "3"', '"0"', '"-1"', '"x"']) {
      const answer = await lso.put(path, input).set('If-Match', header);
      expect(answer.status, header).toBe(400);
      expect(answer.body.errors[0].path).toBe('If-Match');
    }
  });

  it('let none of many changes at once overwrite another', async () => {
    const { body } = await lso.post('/api/areas', { ...AREA, code: 'V-2' }).expect(201);
    const path = `/api/areas/${body.id}`;
    let done = 0;
    const editor = async (who: number): Promise<void> => {
      for (let edit = 0; edit < 5; edit += 1) {
        const current = (await lso.get(path)).body;
        const note = `${current.note ?? ''}${who}`;
        const answer = await lso.put(path, { ...AREA, code: 'V-2', note }, current.version);
        expect([200, 412]).toContain(answer.status);
        if (answer.status === 200) done += 1;
      }
    };
    await Promise.all(Array.from({ length: 10 }, (_, who) => editor(who)));
    const final = (await lso.get(path)).body;
    expect(final.version).toBe(1 + done);
    expect(final.note).toHaveLength(done);
  });
});
