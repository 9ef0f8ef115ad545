import { readdirSync } from 'node:fs';
import { connect } from 'node:net';
import { join } from 'node:path';

import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest';

import { ROUTES } from '../../server/app';
import { startTestApp, type TestApp } from '../support/test-app';
import type { TestClient } from '../support/test-client';

const PATH = '/api/lasers/nothing-here/files';
const PDF = Buffer.from('%PDF-1.7\n1 0 obj <<>> endobj\ntrailer <<>>\n%%EOF\n');
const PNG = Buffer.from(
  'iVBORw0KGgoAAAANSUhEUgAAAAEAAAABCAYAAAAfFcSJAAAADUlEQVR42mNk+M9QDwADhgGAWjR9awAAAABJRU5ErkJggg==',
  'base64',
);

let app: TestApp;
let lso: TestClient;
beforeAll(async () => {
  app = await startTestApp();
  lso = await app.signIn('lso');
});
afterEach(() => {
  // Whatever happened, nothing waits in the upload folder.
  expect(readdirSync(join(app.dataDir, 'files', 'uploads'))).toEqual([]);
});
afterAll(() => app.close());

function send(content: Buffer, name: string) {
  return lso.post(PATH).field('kind', 'data-sheet').attach('file', content, name);
}

describe('an upload', () => {
  it('of a kind that is taken reaches the record (which is not there)', async () => {
    for (const [content, name] of [
      [PDF, 'sheet.pdf'],
      [PNG, 'photo.PNG'],
    ] as const) {
      const { body } = await send(content, name).expect(404);
      expect(body.name).toBe('not-found');
    }
  });

  it.each([
    ['an HTML page', Buffer.from('<html><script>1</script></html>'), 'page.html'],
    ['an HTML page that says it is a PDF', Buffer.from('<html></html>'), 'sheet.pdf'],
    ['an SVG', Buffer.from('<svg xmlns="http://www.w3.org/2000/svg" onload="x()"/>'), 'a.svg'],
    ['an SVG that says it is a PNG', Buffer.from('<?xml version="1.0"?><svg/>'), 'a.png'],
    ['a GIF', Buffer.from('GIF89a=1;alert(1)//'), 'a.gif'],
    ['a PDF that says it is a photo', PDF, 'a.png'],
    ['a PNG that says it is a PDF', PNG, 'a.pdf'],
    ['a program', Buffer.from('7f454c4602010100', 'hex'), 'a.pdf'],
    ['a zip', Buffer.from('504b0304140000000800', 'hex'), 'a.pdf'],
    ['nothing', Buffer.alloc(0), 'a.pdf'],
    ['two extensions', PDF, 'a.pdf.exe'],
    ['no extension', PDF, 'pdf'],
  ])('of %s is refused', async (_name, content, name) => {
    const { body } = await send(content, name).expect(400);
    expect(body.errors[0]).toMatchObject({ path: 'file' });
    expect(body.errors[0].allowed).toContain('PDF');
  });

  it('that is too large is a 413', async () => {
    const large = Buffer.concat([PDF, Buffer.alloc(21 * 1024 * 1024, 32)]);
    const { body } = await send(large, 'large.pdf').expect(413);
    expect(body.name).toBe('too-large');
  });

  it.each([
    ['no file', () => lso.post(PATH).field('kind', 'photo')],
    ['two files', () => send(PDF, 'a.pdf').attach('file', PDF, 'b.pdf')],
    ['a file under another name', () => lso.post(PATH).attach('other', PDF, 'a.pdf')],
    [
      'a thousand fields',
      () =>
        Array.from({ length: 1000 }, (_, index) => `f${index}`).reduce(
          (test, name) => test.field(name, 'x'),
          send(PDF, 'a.pdf'),
        ),
    ],
    ['a field without end', () => send(PDF, 'a.pdf').field('note', 'x'.repeat(50_000))],
    ['an unknown field', () => send(PDF, 'a.pdf').field('owner', 'me')],
    ['a nested field', () => send(PDF, 'a.pdf').field('note[a][b]', 'x')],
    ['a polluting field', () => send(PDF, 'a.pdf').field('__proto__[x]', 'x')],
  ])('with %s is refused', async (_name, request) => {
    const answer = await request();
    expect(answer.status).toBe(400);
    expect(answer.body.name).toBe('invalid-input');
  });

  it.each([
    '../../../../etc/passwd.pdf',
    '..\\..\\a.pdf',
    'a\u0000.pdf',
    `${'x'.repeat(300)}.pdf`,
    '\u202Efdp.exe.pdf',
    'µ “name” ; filename=b.pdf',
  ])('may be named %j without harm', async (name) => {
    const answer = await send(PDF, name);
    expect([400, 404]).toContain(answer.status);
  });

  it('that is cut off leaves nothing behind', async () => {
    const { port } = app.server.address() as { port: number };
    const head = [
      `POST ${PATH} HTTP/1.1`,
      'Host: localhost:4200',
      'Origin: http://localhost:4200',
      `X-XSRF-TOKEN: ${lso.csrfToken}`,
      `Cookie: sid=${lso.cookie('sid')}`,
      'Content-Type: multipart/form-data; boundary=limit',
      'Content-Length: 100000',
      '',
      '--limit',
      'Content-Disposition: form-data; name="file"; filename="a.pdf"',
      '',
      '%PDF-1.7 and then the cable is pulled',
    ].join('\r\n');
    for (let count = 0; count < 20; count += 1) {
      const socket = connect(port, '127.0.0.1');
      await new Promise<void>((sent) => socket.write(head, () => sent()));
      await new Promise((next) => setTimeout(next, 5));
      socket.destroy();
    }
    const uploads = join(app.dataDir, 'files', 'uploads');
    while (readdirSync(uploads).length > 0) await new Promise((next) => setTimeout(next, 10));
    await lso.get('/api/areas').expect(200);
  });
});

it('every route that takes a file says how large and of which kind it may be', () => {
  for (const { multipart } of ROUTES.filter((route) => route.multipart)) {
    expect(multipart?.maxBytes).toBeLessThanOrEqual(20 * 1024 * 1024);
    expect(multipart?.kinds.length).toBeGreaterThan(0);
  }
});
