import type { Test } from 'supertest';

/** How supertest reads the body of an answer; its types know browsers only. */
type Parser = Parameters<Test['parse']>[0];

/** The bytes as they came, for `.buffer(true).parse(asBytes)`. */
export const asBytes = ((
  answer: NodeJS.ReadableStream,
  done: (error: Error | null, body: Buffer) => void,
) => {
  const parts: Buffer[] = [];
  answer.on('data', (part: Buffer) => parts.push(part));
  answer.on('end', () => done(null, Buffer.concat(parts)));
}) as unknown as Parser;
