import BetterSqlite from 'better-sqlite3';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';

import { databaseFile } from '../../server/db/open-database';
import { emailOf, startTestApp, TEST_PASSWORD, type TestApp } from '../support/test-app';
import { TestClient } from '../support/test-client';

let app: TestApp;
beforeAll(async () => {
  app = await startTestApp();
});
afterAll(() => app.close());

describe('signing in', () => {
  it('answers who is signed in, and where they supervise', async () => {
    const client = await app.signIn('laser-supervisor');
    const { body } = await client.get('/api/session').expect(200);
    expect(body.user).toMatchObject({
      name: 'The laser-supervisor',
      roles: ['laser-supervisor'],
      department: 'Optics',
      areaIds: [app.areaIds.own],
    });
    expect(body.needsSetup).toBe(false);
  });

  it('takes the address in any case of letters', async () => {
    const client = await app.visitor();
    const email = emailOf('lso').toUpperCase();
    await client.post('/api/session', { email, password: TEST_PASSWORD }).expect(200);
  });

  it('does not say whether the address or the password was wrong', async () => {
    const client = await app.visitor();
    const wrongPassword = { email: emailOf('lso'), password: 'something else entirely' };
    const wrongName = { email: 'nobody@site.example', password: TEST_PASSWORD };
    const first = await client.post('/api/session', wrongPassword).expect(401);
    const second = await client.post('/api/session', wrongName).expect(401);
    expect(first.body.name).toBe('not-signed-in');
    expect({ ...first.body, requestId: '' }).toEqual({ ...second.body, requestId: '' });
  });

  it('gives a new session id, and the one before is worth nothing', async () => {
    const client = await app.signIn('lso');
    const before = client.cookie('sid');
    await client
      .post('/api/session', { email: emailOf('auditor'), password: TEST_PASSWORD })
      .expect(200);
    expect(client.cookie('sid')).not.toBe(before);
    const stale = new TestClient(app.server);
    await stale.get('/api/areas').set('Cookie', `sid=${before}`).expect(401);
  });

  it('never adopts a session id that the browser brought along (fixation)', async () => {
    const planted = 's%3Aplanted-by-somebody-else.c2lnbmF0dXJl';
    const client = await app.visitor();
    const answer = await client
      .post('/api/session', { email: emailOf('lso'), password: TEST_PASSWORD })
      .set('Cookie', `sid=${planted}; visitor=${client.cookie('visitor')}`)
      .expect(200);
    expect(String(answer.headers['set-cookie'])).not.toContain('planted');
    await new TestClient(app.server).get('/api/areas').set('Cookie', `sid=${planted}`).expect(401);
  });

  it('keeps at most five sessions of one person, the newest', async () => {
    const clients: TestClient[] = [];
    for (let count = 0; count < 6; count += 1) {
      app.clock.advance({ seconds: 1 });
      clients.push(await app.signIn('committee'));
    }
    await clients[0]?.get('/api/areas').expect(401);
    await clients[1]?.get('/api/areas').expect(200);
    await clients[5]?.get('/api/areas').expect(200);
  });
});

describe('the end of a session', () => {
  it('comes after 30 minutes without a request', async () => {
    const client = await app.signIn('auditor');
    app.clock.advance({ minutes: 29 });
    await client.get('/api/areas').expect(200);
    app.clock.advance({ minutes: 29 });
    await client.get('/api/areas').expect(200);
    app.clock.advance({ minutes: 31 });
    await client.get('/api/areas').expect(401);
  });

  it('comes after 12 hours in any case', async () => {
    const client = await app.signIn('auditor');
    for (let minutes = 0; minutes < 12 * 60; minutes += 20) {
      await client.get('/api/areas').expect(200);
      app.clock.advance({ minutes: 20 });
    }
    app.clock.advance({ minutes: 1 });
    await client.get('/api/areas').expect(401);
  });

  it('comes with signing out, on the server', async () => {
    const client = await app.signIn('auditor');
    const sid = client.cookie('sid');
    await client.delete('/api/session').expect(204);
    await new TestClient(app.server).get('/api/areas').set('Cookie', `sid=${sid}`).expect(401);
    expect((await client.get('/api/session')).body.user).toBeNull();
    // The page may go on: its token is that of a visitor now.
    await client
      .post('/api/session', { email: emailOf('auditor'), password: TEST_PASSWORD })
      .expect(200);
  });

  it('comes at once when the account is switched off or its roles change', async () => {
    const admin = await app.signIn('administrator');
    const id = app.personIds.purchasing;
    const client = await app.signIn('purchasing');
    const { body: person } = await admin.get(`/api/people/${id}`).expect(200);
    const input = {
      name: person.name,
      email: person.email,
      roles: person.roles,
      active: true,
    };
    await admin.put(`/api/people/${id}`, { ...input, roles: ['operator'] }, 1).expect(200);
    await client.get('/api/areas').expect(401);
    const again = await app.signIn('purchasing');
    await admin.put(`/api/people/${id}`, { ...input, active: false }, 2).expect(200);
    await again.get('/api/areas').expect(401);
    const credentials = { email: emailOf('purchasing'), password: TEST_PASSWORD };
    await (await app.visitor()).post('/api/session', credentials).expect(401);
  });
});

describe('cookies', () => {
  it('are httpOnly and same-site; the token alone can be read by the page', async () => {
    const client = await app.visitor();
    const answer = await client
      .post('/api/session', { email: emailOf('lso'), password: TEST_PASSWORD })
      .expect(200);
    const cookies = answer.headers['set-cookie'] as unknown as string[];
    const sid = cookies.find((cookie) => cookie.startsWith('sid='));
    expect(sid).toMatch(/; HttpOnly/);
    expect(cookies.every((cookie) => cookie.includes('SameSite=Lax'))).toBe(true);
    expect(cookies.every((cookie) => cookie.includes('Path=/'))).toBe(true);
    expect(cookies.find((cookie) => cookie.startsWith('XSRF-TOKEN='))).not.toMatch(/HttpOnly/);
  });

  it('have the __Host- prefix and Secure behind https, and none go over http', async () => {
    const secure = await startTestApp({
      publicUrl: 'https://limen.site.example',
      trustedProxies: ['loopback'],
    });
    try {
      const client = new TestClient(secure.server);
      const first = await client.get('/api/session').set('X-Forwarded-Proto', 'https');
      const firstCookies = first.headers['set-cookie'] as unknown as string[];
      const jar = firstCookies.map((cookie) => cookie.split(';')[0] ?? '');
      const token = jar.find((cookie) => cookie.startsWith('XSRF-TOKEN='))?.split('=')[1] ?? '';
      const signIn = () =>
        client
          .bare('post', '/api/session')
          .set('Cookie', jar)
          .set('Origin', 'https://limen.site.example')
          .set('X-XSRF-TOKEN', token)
          .send({ email: emailOf('lso'), password: TEST_PASSWORD });
      const https = await signIn().set('X-Forwarded-Proto', 'https').expect(200);
      const cookies = https.headers['set-cookie'] as unknown as string[];
      const sid = cookies.find((cookie) => cookie.startsWith('__Host-sid='));
      expect(sid).toMatch(/; Secure/);
      expect(sid).toMatch(/; HttpOnly/);
      expect(cookies.every((cookie) => cookie.includes('Secure'))).toBe(true);
      expect(https.headers['strict-transport-security']).toBe(
        'max-age=31536000; includeSubDomains',
      );
      const plain = await signIn().expect(200);
      expect(String(plain.headers['set-cookie'])).not.toContain('__Host-sid');
    } finally {
      await secure.close();
    }
  });

  it('cannot be rebuilt from a copy of the database', async () => {
    const client = await app.signIn('lso');
    const sid =
      decodeURIComponent(client.cookie('sid') ?? '')
        .slice(2)
        .split('.')[0] ?? '';
    expect(sid.length).toBeGreaterThanOrEqual(43);
    const db = new BetterSqlite(databaseFile(app.dataDir), { readonly: true });
    const dump = JSON.stringify(db.prepare('select * from sessions').all());
    db.close();
    expect(dump).not.toContain(sid);
  });
});
