import { createHash, randomBytes } from 'node:crypto';
import { createReadStream, mkdirSync } from 'node:fs';
import { access, mkdir, open, readFile, rename, rm } from 'node:fs/promises';
import { dirname, join } from 'node:path';
import type { Readable } from 'node:stream';

export interface StoredFile {
  readonly sha256: string;
  readonly sizeBytes: number;
}

/** Contents by their SHA-256, outside the web root; names and kinds are in the database. */
export interface FileStore {
  /** Folder for uploads that are not stored yet. */
  readonly uploadFolder: string;
  /** Keeps the content of a file on this disk; the same content is kept once. */
  keep(file: string): Promise<StoredFile>;
  keepBytes(bytes: Uint8Array): Promise<StoredFile>;
  read(sha256: string): Promise<Buffer>;
  stream(sha256: string): Readable;
}

export function openFileStore(folder: string): FileStore {
  const uploadFolder = join(folder, 'uploads');
  mkdirSync(uploadFolder, { recursive: true });
  const pathOf = (sha256: string): string => {
    if (!/^[0-9a-f]{64}$/.test(sha256)) throw new Error('A stored file is named by its SHA-256.');
    return join(folder, sha256.slice(0, 2), sha256);
  };

  async function keepBytes(bytes: Uint8Array): Promise<StoredFile> {
    const sha256 = createHash('sha256').update(bytes).digest('hex');
    const target = pathOf(sha256);
    if (!(await exists(target))) await writeDurably(uploadFolder, target, bytes);
    return { sha256, sizeBytes: bytes.byteLength };
  }

  return {
    uploadFolder,
    keep: async (file) => keepBytes(await readFile(file)),
    keepBytes,
    read: (sha256) => readFile(pathOf(sha256)),
    stream: (sha256) => createReadStream(pathOf(sha256)),
  };
}

/** Whole or not at all: a temporary name, synced, then renamed. */
async function writeDurably(folder: string, target: string, bytes: Uint8Array): Promise<void> {
  await mkdir(dirname(target), { recursive: true });
  const temporary = join(folder, randomBytes(12).toString('hex'));
  const handle = await open(temporary, 'wx', 0o600);
  try {
    await handle.writeFile(bytes);
    await handle.sync();
  } finally {
    await handle.close();
  }
  // Another upload of the same content may have won; the content is the same.
  await rename(temporary, target);
  await rm(temporary, { force: true });
}

function exists(path: string): Promise<boolean> {
  return access(path).then(
    () => true,
    () => false,
  );
}
