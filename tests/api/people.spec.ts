import BetterSqlite from 'better-sqlite3';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';

import { databaseFile } from '../../server/db/open-database';
import { emailOf, startTestApp, TEST_PASSWORD, type TestApp } from '../support/test-app';
import type { TestClient } from '../support/test-client';

const GOOD_PASSWORD = 'green lamps over water';

let app: TestApp;
let admin: TestClient;
beforeAll(async () => {
  app = await startTestApp();
  admin = await app.signIn('administrator');
});
afterAll(() => app.close());

function input(email: string) {
  return { name: 'Nia Newcomer', email, department: 'Optics', roles: ['operator'], active: true };
}

async function accept(token: string, password = GOOD_PASSWORD) {
  const client = await app.visitor();
  return client.post('/api/invitations/accept', { token, password });
}

describe('people', () => {
  it('are invited, set their password once, and sign in', async () => {
    const email = 'nia@site.example';
    const { body, headers } = await admin.post('/api/people', input(email)).expect(201);
    expect(body.person).toMatchObject({ ...input(email), hasPassword: false, version: 1 });
    expect(headers['location']).toBe(`/api/people/${body.person.id}`);
    expect((await accept(body.invitationToken)).status).toBe(204);
    expect((await accept(body.invitationToken)).status).toBe(410);
    const client = await app.visitor();
    await client.post('/api/session', { email, password: GOOD_PASSWORD }).expect(200);
    const { body: person } = await admin.get(`/api/people/${body.person.id}`).expect(200);
    expect(person.hasPassword).toBe(true);
  });

  it('have 60 minutes for an invitation, and only the newest counts', async () => {
    const { body } = await admin.post('/api/people', input('late@site.example')).expect(201);
    const again = await admin.post(`/api/people/${body.person.id}/invitation`).expect(201);
    expect((await accept(body.invitationToken)).status).toBe(410);
    app.clock.advance({ minutes: 61 });
    expect((await accept(again.body.invitationToken)).status).toBe(410);
    admin = await app.signIn('administrator');
  });

  it('have an invitation of which the database knows only the hash', async () => {
    const { body } = await admin.post('/api/people', input('hash@site.example')).expect(201);
    const db = new BetterSqlite(databaseFile(app.dataDir), { readonly: true });
    const dump = JSON.stringify([
      db.prepare('select * from invitations').all(),
      db.prepare('select * from audit_trail').all(),
    ]);
    db.close();
    expect(dump).not.toContain(body.invitationToken);
  });

  it('have an address of their own', async () => {
    const { body } = await admin
      .post('/api/people', input(emailOf('lso').toUpperCase()))
      .expect(409);
    expect(body.errors[0].path).toBe('email');
  });

  it('keep at least one active administrator', async () => {
    const id = app.personIds.administrator;
    const { body } = await admin.get(`/api/people/${id}`).expect(200);
    const { name, email } = body;
    const roles = ['administrator'];
    await admin.put(`/api/people/${id}`, { name, email, roles, active: false }, 1).expect(409);
    await admin.put(`/api/people/${id}`, { name, email, roles: [], active: true }, 1).expect(409);
  });

  it('are found by name, address, department and role', async () => {
    expect((await admin.get('/api/people?q=nia')).body.total).toBe(3);
    expect((await admin.get('/api/people?q=chemistry')).body.total).toBe(1);
    const { body } = await admin.get('/api/people?role=laser-supervisor').expect(200);
    expect(body.total).toBe(3);
  });

  it('never show a password or its hash, to nobody', async () => {
    const { text } = await admin.get('/api/people?limit=200').expect(200);
    expect(text).not.toMatch(/argon2|password_hash|passwordHash/);
  });

  it('are not changed by those who only read them', async () => {
    const lso = await app.signIn('lso');
    await lso.get(`/api/people/${app.personIds.operator}`).expect(200);
    await lso.post('/api/people', input('x@site.example')).expect(403);
  });
});

describe('a password', () => {
  it.each([
    ['too short', 'short words', 400],
    ['of 12 letters', 'vxkqzjwbphmd', 204],
    ['of 128 characters', `${'quiet mirror 7 '.repeat(9)}`.slice(0, 128), 204],
    ['of 129 characters', 'x7 '.repeat(43), 400],
    ['of emoji and umlauts', '🦊🌲 über größe ñandú', 204],
    ['with a space in front', ' leading space kept', 204],
    ['that is one letter', 'aaaaaaaaaaaaaaaa', 400],
    ['that is a word everybody takes', 'password1234', 400],
    ['that is the name of the product', 'LimenLimenLimen1', 400],
  ])('%s is judged by length and guessability only', async (_name, password, status) => {
    const { body } = await admin.post(`/api/people/${app.personIds.personnel}/invitation`);
    const answer = await accept(body.invitationToken, password);
    expect(answer.status).toBe(status);
    if (status === 400) expect(answer.body.errors[0].path).toBe('password');
    else {
      const credentials = { email: emailOf('personnel'), password };
      await (await app.visitor()).post('/api/session', credentials).expect(200);
    }
  });

  it('is changed with the present one, which ends all other sessions', async () => {
    const here = await app.signIn('second-lso');
    const elsewhere = await app.signIn('second-lso');
    const change = (currentPassword: string, newPassword = GOOD_PASSWORD) =>
      here.put('/api/session/password', { currentPassword, newPassword });
    const wrong = await change('not the present one').expect(400);
    expect(wrong.body.errors[0].path).toBe('currentPassword');
    const own = await change(TEST_PASSWORD, 'second-lso second-lso').expect(400);
    expect(own.body.errors[0].path).toBe('newPassword');
    await change(TEST_PASSWORD).expect(204);
    await here.get('/api/areas').expect(200);
    await elsewhere.get('/api/areas').expect(401);
    const credentials = { email: emailOf('second-lso'), password: GOOD_PASSWORD };
    await (await app.visitor()).post('/api/session', credentials).expect(200);
  });

  it('is stored as argon2id of at least 19 MiB and two passes, and renewed when weaker', async () => {
    const id = app.personIds.auditor;
    const stored = (): string =>
      app.edges.db
        .prepareRead<{ password_hash: string }>(
          'select password_hash from credentials where person_id = ?',
        )
        .get(id)?.password_hash ?? '';
    expect(stored()).toMatch(/^\$argon2id\$v=19\$m=19456,t=2,p=1\$/);
    const { hash } = await import('@node-rs/argon2');
    const weak = await hash(TEST_PASSWORD, { memoryCost: 8192, timeCost: 1, parallelism: 1 });
    await app.edges.db.write
      .updateTable('credentials')
      .set({ password_hash: weak })
      .where('person_id', '=', id)
      .execute();
    await app.signIn('auditor');
    expect(stored()).toMatch(/^\$argon2id\$v=19\$m=19456,t=2,p=1\$/);
    await app.signIn('auditor');
  });
});
