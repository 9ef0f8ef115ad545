import {
  createPrivateKey,
  createPublicKey,
  generateKeyPairSync,
  type KeyObject,
  sign,
  verify,
} from 'node:crypto';
import {
  appendFileSync,
  closeSync,
  existsSync,
  fsyncSync,
  mkdirSync,
  openSync,
  readFileSync,
  writeFileSync,
} from 'node:fs';
import { dirname, join } from 'node:path';

import * as z from 'zod';

import { canonicalJson } from './row-hash';

const headSchema = z.strictObject({
  sequence: z.int(),
  hash: z.string(),
  at: z.string(),
  signature: z.string(),
});

/** The head of the trail at one moment, signed. */
export type SignedHead = z.infer<typeof headSchema>;

/** Signed heads are also kept outside the database, so that a cut or rewritten trail shows. */
export interface TrailHeads {
  sign(head: Omit<SignedHead, 'signature'>): SignedHead;
  isGenuine(head: SignedHead): boolean;
  /** Adds a line to the file, synced to the disk. */
  append(head: SignedHead): void;
  /** Every line of the file; null for a line that is no head. */
  readAll(): (SignedHead | null)[];
}

export function openTrailHeads(dataDir: string): TrailHeads {
  const keyFile = join(dataDir, 'keys', 'trail-ed25519.pem');
  const headsFile = join(dataDir, 'trail-heads.log');
  if (!existsSync(keyFile)) createKey(keyFile, headsFile);
  const privateKey = createPrivateKey(readFileSync(keyFile));
  const publicKey = createPublicKey(privateKey);
  return {
    sign: (head) => ({
      ...head,
      signature: sign(null, bytesOf(head), privateKey).toString('base64'),
    }),
    isGenuine: ({ signature, ...head }) => isSigned(publicKey, head, signature),
    append: (head) => appendDurably(headsFile, `${JSON.stringify(head)}\n`),
    readAll: () => (existsSync(headsFile) ? readLines(headsFile) : []),
  };
}

function createKey(keyFile: string, headsFile: string): void {
  if (existsSync(headsFile)) {
    throw new Error(
      `The key ${keyFile} is missing although heads were signed with it. Restore it from a backup.`,
    );
  }
  mkdirSync(dirname(keyFile), { recursive: true, mode: 0o700 });
  const { privateKey } = generateKeyPairSync('ed25519');
  writeFileSync(keyFile, privateKey.export({ type: 'pkcs8', format: 'pem' }), { mode: 0o600 });
}

function isSigned(publicKey: KeyObject, head: object, signature: string): boolean {
  return verify(null, bytesOf(head), publicKey, Buffer.from(signature, 'base64'));
}

function bytesOf(head: object): Buffer {
  return Buffer.from(canonicalJson(head));
}

function appendDurably(file: string, line: string): void {
  const handle = openSync(file, 'a', 0o600);
  try {
    appendFileSync(handle, line);
    fsyncSync(handle);
  } finally {
    closeSync(handle);
  }
}

function readLines(file: string): (SignedHead | null)[] {
  const lines = readFileSync(file, 'utf8').split('\n');
  return lines.filter((line) => line !== '').map(parseHead);
}

function parseHead(line: string): SignedHead | null {
  try {
    return headSchema.parse(JSON.parse(line));
  } catch {
    // SyntaxError or ZodError: the line is no head; the verification reports it.
    return null;
  }
}
