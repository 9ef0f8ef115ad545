import { readdirSync } from 'node:fs';
import { join } from 'node:path';

import { afterAll, beforeAll, describe, expect, it } from 'vitest';

import { readLaser, register, signInTeam, type Team } from '../support/evaluation-steps';
import { aLaser } from '../support/laser-builders';
import { asBytes } from '../support/response-body';
import { startTestApp, type TestApp } from '../support/test-app';
import type { TestClient } from '../support/test-client';

let app: TestApp;
let team: Team;
let laserId: string;
beforeAll(async () => {
  app = await startTestApp();
  team = await signInTeam(app);
  laserId = await newLaser();
});
afterAll(() => app.close());

async function newLaser(): Promise<string> {
  return (await register(team.supervisor, aLaser({ areaId: app.areaIds.own }))).id;
}

const PDF = Buffer.from(
  '%PDF-1.7\n1 0 obj<</Type/Catalog>>endobj\ntrailer<</Root 1 0 R>>\n%%EOF\n',
);
const PNG = Buffer.from(
  'iVBORw0KGgoAAAANSUhEUgAAAAEAAAABCAYAAAAfFcSJAAAADUlEQVR42mNk+M9QDwADhgGAWjR9awAAAABJRU5ErkJggg==',
  'base64',
);
const JPEG = Buffer.from('ffd8ffe000104a46494600010100000100010000ffd9', 'hex');
const WEBP = Buffer.concat([
  Buffer.from('RIFF'),
  Buffer.from([26, 0, 0, 0]),
  Buffer.from('WEBPVP8L'),
  Buffer.alloc(18),
]);
const GIF = Buffer.from('GIF89a\x01\x00\x01\x00\x00\x00\x00;', 'latin1');

function attach(
  content: Buffer,
  filename: string,
  {
    kind = 'photo',
    client = team.supervisor,
    contentType,
  }: { kind?: string; client?: TestClient; contentType?: string } = {},
) {
  const options = { filename, ...(contentType ? { contentType } : {}) };
  return client
    .post(`/api/lasers/${laserId}/files`)
    .field('kind', kind)
    .attach('file', content, options);
}

describe('attaching files', () => {
  it.each([
    ['sheet.pdf', PDF, 'application/pdf'],
    ['photo.png', PNG, 'image/png'],
    ['photo.JPG', JPEG, 'image/jpeg'],
    ['photo.webp', WEBP, 'image/webp'],
  ])(
    'takes %s, and gives it back as an attachment that runs nothing',
    async (name, content, type) => {
      const { body } = await attach(content, name).expect(201);
      expect(body).toMatchObject({ name, mediaType: type, sizeBytes: content.length });
      const path = `/api/lasers/${laserId}/files/${body.id}`;
      const got = await team.supervisor.get(path).buffer(true).parse(asBytes).expect(200);
      expect(Buffer.compare(got.body as Buffer, content)).toBe(0);
      expect(got.headers).toMatchObject({
        'content-type': type,
        'x-content-type-options': 'nosniff',
        'content-disposition': expect.stringMatching(/^attachment;/),
        'content-security-policy': expect.stringMatching(/^sandbox;/),
      });
      await team.supervisor.delete(path).expect(204);
      await team.supervisor.get(path).expect(404);
    },
  );

  const svg = Buffer.from(
    '<svg xmlns="http://www.w3.org/2000/svg"><script>alert(1)</script></svg>',
  );
  const html = Buffer.from('<!doctype html><script>alert(1)</script>');
  const zip = Buffer.from('504b0304140000000800', 'hex');
  const eicar = Buffer.from(
    'X5O!P%@AP[4\\PZX54(P^)7CC)7}$EICAR-' + 'STANDARD-ANTIVIRUS-TEST-FILE!$H+H*',
  );
  it.each([
    ['an SVG', svg, 'picture.svg'],
    ['an SVG named PNG', svg, 'picture.png'],
    ['HTML', html, 'page.html'],
    ['HTML named PDF', html, 'page.pdf'],
    ['a GIF', GIF, 'move.gif'],
    [
      'a GIF with script, named JPEG',
      Buffer.concat([GIF, Buffer.from('/*<script>*/')]),
      'move.jpg',
    ],
    ['a zip', zip, 'sheet.pdf'],
    ['an executable', Buffer.from('4d5a9000', 'hex'), 'run.exe'],
    ['an executable named PNG', Buffer.from('7f454c46020101', 'hex'), 'run.png'],
    ['the anti-virus test text', eicar, 'test.pdf'],
    ['plain text', Buffer.from('just words'), 'words.txt'],
    ['a table', Buffer.from('a,b\n1,2\n'), 'table.csv'],
    ['nothing', Buffer.alloc(0), 'empty.pdf'],
    ['noise', Buffer.from([0, 1, 2, 3, 255, 254]), 'noise.png'],
    ['a PDF named PNG', PDF, 'sheet.png'],
    ['a PNG named PDF', PNG, 'photo.pdf'],
    ['a PNG without ending', PNG, 'photo'],
    ['a PNG with two endings, the last wrong', PNG, 'photo.png.exe'],
    ['a PNG with a hidden ending', PNG, 'photo.png\u202egnp.exe'],
  ])('refuses %s', async (_, content, name) => {
    const { body, status } = await attach(content, name);
    expect(status, JSON.stringify(body)).toBe(400);
    expect(body.errors[0].path).toBe('file');
  });

  it('a PDF that is a page as well is only ever given back as an attachment in a sandbox', async () => {
    const polyglot = Buffer.concat([PDF, Buffer.from('<script>alert(1)</script>')]);
    const { body } = await attach(polyglot, 'both.pdf', { contentType: 'text/html' }).expect(201);
    const got = await team.supervisor.get(`/api/lasers/${laserId}/files/${body.id}`).expect(200);
    expect(got.headers['content-type']).toBe('application/pdf');
    expect(got.headers['content-security-policy']).toMatch(/sandbox/);
    await team.supervisor.delete(`/api/lasers/${laserId}/files/${body.id}`).expect(204);
  });

  it.each([
    ['../../etc/passwd.png', 'passwd.png'],
    ['..\\..\\windows\\win.png', 'win.png'],
    [`${'long'.repeat(100)}.png`, /^long.*\.png$/],
    ['b\u202eild.png', 'bild.png'],
    ['Größe µ 100%.png', 'Größe µ 100%.png'],
  ])('stores %s under a name of its own and shows a safe one', async (given, shown) => {
    const { body } = await attach(PNG, given).expect(201);
    if (typeof shown === 'string') expect(body.name).toBe(shown);
    else expect(body.name).toMatch(shown);
    expect(body.name.length).toBeLessThanOrEqual(120);
    await team.supervisor.delete(`/api/lasers/${laserId}/files/${body.id}`).expect(204);
  });

  it('refuses what is larger than 20 MB', async () => {
    const { status } = await attach(
      Buffer.concat([PNG, Buffer.alloc(20 * 1024 * 1024)]),
      'big.png',
    );
    expect(status).toBe(413);
  });

  it('refuses two files, other fields and unknown kinds', async () => {
    const path = `/api/lasers/${laserId}/files`;
    const post = () => team.supervisor.post(path);
    await post()
      .field('kind', 'photo')
      .attach('file', PNG, 'a.png')
      .attach('file', PNG, 'b.png')
      .expect(400);
    await post().field('kind', 'photo').attach('other', PNG, 'a.png').expect(400);
    await post().field('kind', 'selfie').attach('file', PNG, 'a.png').expect(400);
    await post()
      .field('kind', 'photo')
      .field('admin', '1')
      .attach('file', PNG, 'a.png')
      .expect(400);
    await post().field('kind', 'photo').expect(400);
    await post().send({ kind: 'photo' }).expect(415);
  });

  it('leaves no temporary file behind', () => {
    expect(readdirSync(join(app.dataDir, 'files', 'uploads'))).toEqual([]);
  });

  it('takes ten files a laser, from those who may, with an audit entry each', async () => {
    laserId = await newLaser();
    for (let index = 0; index < 10; index += 1) await attach(PNG, `photo-${index}.png`).expect(201);
    const { body } = await attach(PNG, 'eleventh.png').expect(409);
    expect(body.detail).toMatch(/at most 10/);
    expect((await readLaser(team.supervisor, laserId)).files).toHaveLength(10);
    await attach(PNG, 'photo.png', { client: await app.signIn('operator') }).expect(403);
    await attach(PNG, 'photo.png', { client: await app.signIn('outsider') }).expect(404);
    const path = '/api/audit-trail?recordKind=laser-file&limit=100';
    const trail = await team.lso.get(path).expect(200);
    expect(trail.body.rows[0]).toMatchObject({ action: 'laser.attach-file' });
  });
});
