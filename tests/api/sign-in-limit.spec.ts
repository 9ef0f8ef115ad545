import { afterEach, beforeEach, expect, it } from 'vitest';

import { emailOf, startTestApp, TEST_PASSWORD, type TestApp } from '../support/test-app';

let app: TestApp;
beforeEach(async () => {
  app = await startTestApp();
});
afterEach(() => app.close());

async function tryToSignIn(email: string, password: string): Promise<number> {
  const client = await app.visitor();
  return (await client.post('/api/session', { email, password })).status;
}

it('ten wrong passwords for one account from one address, then 429 with a time to wait', async () => {
  for (let attempt = 0; attempt < 10; attempt += 1) {
    expect(await tryToSignIn(emailOf('lso'), 'a wrong password')).toBe(401);
  }
  const client = await app.visitor();
  const refused = await client
    .post('/api/session', { email: emailOf('lso'), password: TEST_PASSWORD })
    .expect(429);
  expect(refused.body.name).toBe('too-many');
  expect(Number(refused.headers['retry-after'])).toBe(900);
  // Another account is not locked by it, nor is this one for ever.
  expect(await tryToSignIn(emailOf('auditor'), TEST_PASSWORD)).toBe(200);
  app.clock.advance({ minutes: 16 });
  expect(await tryToSignIn(emailOf('lso'), TEST_PASSWORD)).toBe(200);
});

it('a forwarded address gains nothing where no proxy is trusted', async () => {
  const statuses: number[] = [];
  for (let attempt = 0; attempt < 11; attempt += 1) {
    const client = await app.visitor();
    const answer = await client
      .post('/api/session', { email: emailOf('lso'), password: 'a wrong password' })
      .set('X-Forwarded-For', `10.0.0.${attempt}`);
    statuses.push(answer.status);
  }
  expect(statuses.at(-1)).toBe(429);
});

it('five sign-ins in a row are no attack: a success clears the counter of the account', async () => {
  for (let round = 0; round < 3; round += 1) {
    for (let attempt = 0; attempt < 6; attempt += 1) {
      expect(await tryToSignIn(emailOf('lso'), 'a wrong password')).toBe(401);
    }
    expect(await tryToSignIn(emailOf('lso'), TEST_PASSWORD)).toBe(200);
  }
});
