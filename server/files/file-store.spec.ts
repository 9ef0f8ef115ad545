import { createHash } from 'node:crypto';
import { mkdtempSync, readdirSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';

import { afterAll, beforeAll, expect, it } from 'vitest';

import { type FileStore, openFileStore } from './file-store';

let folder: string;
let store: FileStore;
beforeAll(() => {
  folder = mkdtempSync(join(tmpdir(), 'limen-files-'));
  store = openFileStore(folder);
});
afterAll(() => rmSync(folder, { recursive: true }));

it('keeps a content by its SHA-256 and gives it back', async () => {
  const bytes = Buffer.from('a data sheet');
  const kept = await store.keepBytes(bytes);
  expect(kept).toEqual({
    sha256: createHash('sha256').update(bytes).digest('hex'),
    sizeBytes: bytes.length,
  });
  expect(await store.read(kept.sha256)).toEqual(bytes);
  const chunks: Buffer[] = [];
  for await (const chunk of store.stream(kept.sha256)) chunks.push(chunk as Buffer);
  expect(Buffer.concat(chunks)).toEqual(bytes);
});

it('keeps the same content once, also when it comes twice at the same time', async () => {
  const file = join(store.uploadFolder, 'upload');
  writeFileSync(file, 'the same');
  const kept = await Promise.all([store.keep(file), store.keepBytes(Buffer.from('the same'))]);
  expect(kept[0]).toEqual(kept[1]);
  rmSync(file);
  expect(readdirSync(store.uploadFolder)).toEqual([]);
  expect(readdirSync(join(folder, kept[0].sha256.slice(0, 2)))).toEqual([kept[0].sha256]);
});

it('takes nothing but a SHA-256 as a name', () => {
  for (const name of ['', '../limen.db', 'A'.repeat(64), 'f'.repeat(63)]) {
    expect(() => store.stream(name)).toThrow(/SHA-256/);
  }
});
