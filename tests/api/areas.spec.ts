import { afterAll, beforeAll, describe, expect, it } from 'vitest';

import { startTestApp, type TestApp } from '../support/test-app';
import type { TestClient } from '../support/test-client';

let app: TestApp;
let lso: TestClient;
let supervisor: TestClient;
beforeAll(async () => {
  app = await startTestApp();
  lso = await app.signIn('lso');
  supervisor = await app.signIn('laser-supervisor');
});
afterAll(() => app.close());

const INPUT = { code: 'B-1', name: 'Lab', building: 'Main', room: '1', department: 'Optics' };

describe('areas', () => {
  it('are recorded with everything that was said, and nothing else', async () => {
    const input = {
      ...INPUT,
      supervisorId: app.personIds['laser-supervisor'],
      alternateId: app.personIds.colleague,
      wallDistanceM: 8.4,
      phone: '555-0122',
      note: 'Curtain 2',
    };
    const { body } = await lso.post('/api/areas', input).expect(201);
    expect(body).toMatchObject({
      ...input,
      version: 1,
      supervisor: { id: input.supervisorId, name: 'The laser-supervisor' },
      alternate: { id: input.alternateId, name: 'The colleague' },
      laserCount: 0,
      mayEdit: true,
    });
    const { body: read } = await lso.get(`/api/areas/${body.id}`).expect(200);
    expect(read).toEqual(body);
  });

  it('have a code of their own, in any case of letters', async () => {
    const { body } = await lso.post('/api/areas', { ...INPUT, code: 't-1' }).expect(409);
    expect(body.errors).toEqual([
      { path: 'code', message: 'The code T-1 is taken by the area "Lab T-1".' },
    ]);
  });

  it('name people who exist, and two different ones', async () => {
    const unknown = await lso
      .post('/api/areas', { ...INPUT, code: 'B-9', supervisorId: 'nobody' })
      .expect(400);
    expect(unknown.body.errors[0].path).toBe('supervisorId');
    const { lso: id } = app.personIds;
    const same = await lso
      .post('/api/areas', { ...INPUT, code: 'B-9', supervisorId: id, alternateId: id })
      .expect(400);
    expect(same.body.errors[0].path).toBe('alternateId');
  });

  it('are seen by a supervisor within the department only; others are not there', async () => {
    const { body } = await supervisor.get('/api/areas').expect(200);
    const codes = body.rows.map((area: { code: string }) => area.code);
    expect(codes).toContain('T-1');
    expect(codes).toContain('T-2');
    expect(codes).not.toContain('T-3');
    expect(body.total).toBe(body.rows.length);
    await supervisor.get(`/api/areas/${app.areaIds.far}`).expect(404);
    await supervisor.put(`/api/areas/${app.areaIds.far}`, INPUT, 1).expect(404);
  });

  it('are changed by their own supervisor, not by a colleague who only sees them', async () => {
    const near = await supervisor.get(`/api/areas/${app.areaIds.near}`).expect(200);
    expect(near.body.mayEdit).toBe(false);
    const refused = await supervisor.put(`/api/areas/${app.areaIds.near}`, INPUT, 1).expect(403);
    expect(refused.body.name).toBe('not-allowed');
    const change = {
      ...INPUT,
      code: 'T-1',
      supervisorId: app.personIds['laser-supervisor'],
      wallDistanceM: 12,
    };
    const { body } = await supervisor.put(`/api/areas/${app.areaIds.own}`, change, 1).expect(200);
    expect(body).toMatchObject({ version: 2, wallDistanceM: 12, mayEdit: true });
  });

  it('are paged by key: every area once, whatever is added meanwhile', async () => {
    for (let count = 0; count < 25; count += 1) {
      await lso.post('/api/areas', { ...INPUT, code: `P-${count}` }).expect(201);
    }
    const seen: string[] = [];
    let after: string | null = '';
    while (after !== null) {
      const query: string = after === '' ? '' : `&after=${after}`;
      const { body } = await lso.get(`/api/areas?limit=7&q=P-${query}`).expect(200);
      seen.push(...body.rows.map((area: { code: string }) => area.code));
      if (seen.length === 7) await lso.post('/api/areas', { ...INPUT, code: 'P-00' }).expect(201);
      after = body.next;
    }
    expect(seen).toHaveLength(25);
    expect(new Set(seen).size).toBe(25);
    const sorted = [...seen].sort((a, b) => (a.toLowerCase() < b.toLowerCase() ? -1 : 1));
    expect(seen).toEqual(sorted);
  });

  it('are searched by words, in which % and _ are only letters', async () => {
    expect((await lso.get('/api/areas?q=lab%20t-2')).body.total).toBe(1);
    expect((await lso.get(`/api/areas?q=${encodeURIComponent('%')}`)).body.total).toBe(0);
    expect((await lso.get('/api/areas?q=_')).body.total).toBe(0);
    expect((await lso.get(`/api/areas?q=${encodeURIComponent(`' or 1=1 --`)}`)).body.total).toBe(0);
    expect((await lso.get('/api/areas?department=Chemistry')).body.total).toBe(1);
  });

  it('go out as CSV, in which no text is a formula and numbers stay numbers', async () => {
    await lso
      .post('/api/areas', { ...INPUT, code: '=1+1', name: '@cmd', wallDistanceM: 3.2 })
      .expect(201);
    const { text, headers } = await lso.get('/api/areas.csv?q=cmd').expect(200);
    expect(headers['content-disposition']).toContain('attachment; filename="areas.csv"');
    expect(headers['content-security-policy']).toContain('sandbox');
    const [header, row] = text.split('\r\n');
    expect(header).toContain('code,name,building,room,department');
    expect(row).toContain(`'=1+1,'@cmd,Main,1,Optics,,,3.2`);
  });
});
