import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';

import express from 'express';
import { pino } from 'pino';
import request from 'supertest';
import { afterAll, beforeAll, expect, it } from 'vitest';

import { problemDetails } from './problem-details';
import { serveWebClient } from './web-client';

const folder = mkdtempSync(join(tmpdir(), 'limen-web-'));
const app = express();
const SCRIPT = `console.log('${'x'.repeat(5000)}');`;

beforeAll(() => {
  mkdirSync(join(folder, 'fonts'));
  writeFileSync(
    join(folder, 'index.html'),
    '<html><head><script nonce="__CSP_NONCE__">1</script><link rel="modulepreload" href="/main-ABCDEFGH.js">' +
      '<style>a{}</style></head><body><lm-root ngCspNonce="__CSP_NONCE__"></lm-root>' +
      '<script src="/main-ABCDEFGH.js" type="module"></script></body></html>',
  );
  writeFileSync(join(folder, 'main-ABCDEFGH.js'), SCRIPT);
  writeFileSync(join(folder, 'fonts', 'a.woff2'), 'font');
  serveWebClient(app, folder);
  app.use(problemDetails(pino({ level: 'silent' })));
});
afterAll(() => rmSync(folder, { recursive: true }));

it('serves the page for every screen, with one fresh nonce on everything that may run', async () => {
  const nonces = new Set<string>();
  for (const path of ['/', '/lasers/abc', '/index.html', '/sign-in?next=%2Flasers']) {
    const { text, headers } = await request(app).get(path).expect(200);
    const nonce = /script-src 'nonce-([^']+)' 'strict-dynamic'/.exec(
      headers['content-security-policy'] ?? '',
    )?.[1];
    expect(nonce).toBeDefined();
    nonces.add(nonce ?? '');
    const marked = [...text.matchAll(/<(?:script|style|link)\b[^>]*>/g)];
    expect(marked).toHaveLength(4);
    for (const [tag] of marked) expect(tag).toContain(`nonce="${nonce}"`);
    expect(text).toContain(`ngCspNonce="${nonce}"`);
    expect(text).not.toContain('__CSP_NONCE__');
    expect(headers['cache-control']).toBe('no-store');
  }
  expect(nonces.size).toBe(4);
});

it('allows the page nothing inline, nothing foreign, and only the trusted types it needs', async () => {
  const { headers } = await request(app).get('/');
  const policy = headers['content-security-policy'] ?? '';
  for (const part of [
    "default-src 'none'",
    "base-uri 'none'",
    "frame-ancestors 'none'",
    "object-src 'none'",
    "require-trusted-types-for 'script'",
    'trusted-types angular angular#bundler',
  ]) {
    expect(policy).toContain(part);
  }
  expect(policy).not.toMatch(/unsafe|https?:|\*/);
});

it('keeps hashed files for ever, compressed; others are asked for again', async () => {
  const script = await request(app)
    .get('/main-ABCDEFGH.js')
    .set('Accept-Encoding', 'br')
    .expect(200);
  expect(script.headers['content-encoding']).toBe('br');
  expect(script.headers['cache-control']).toBe('public, max-age=31536000, immutable');
  expect(script.headers['content-type']).toContain('javascript');
  const zipped = await request(app)
    .get('/main-ABCDEFGH.js')
    .set('Accept-Encoding', 'gzip')
    .expect(200);
  expect(zipped.text).toBe(SCRIPT);
  const plain = await request(app)
    .get('/main-ABCDEFGH.js')
    .set('Accept-Encoding', 'identity')
    .expect(200);
  expect(plain.headers['content-encoding']).toBeUndefined();
  const font = await request(app).get('/fonts/a.woff2').expect(200);
  expect(font.headers['cache-control']).toBe('no-cache');
});

it('answers a missing file with 404 and another method with 405', async () => {
  await request(app).get('/gone-ABCDEFGH.js').set('Accept-Encoding', 'br').expect(404);
  await request(app).post('/lasers').expect(405);
});
