import { Readable } from 'node:stream';
import { pipeline } from 'node:stream/promises';

import type { Response } from 'express';

/** A file in the answer. Always an attachment that runs nothing, unless `inline` is said. */
export interface Download {
  readonly fileName: string;
  readonly mediaType: string;
  readonly body: Uint8Array | string | Readable | AsyncIterable<string | Uint8Array>;
  readonly inline?: boolean;
}

export async function sendDownload(res: Response, download: Download): Promise<void> {
  const { body, fileName, mediaType } = download;
  const disposition = download.inline ? 'inline' : 'attachment';
  res.setHeader('Content-Type', mediaType);
  res.setHeader('Content-Disposition', `${disposition}; ${fileNameParameters(fileName)}`);
  res.setHeader('Content-Security-Policy', "sandbox; default-src 'none'; frame-ancestors 'none'");
  if (typeof body === 'string' || body instanceof Uint8Array) {
    res.end(body);
    return;
  }
  await pipeline(Readable.from(await begun(body)), res);
}

/** Waits for the first part, so that what fails at once is answered as a problem, not as a torn file. */
async function begun<T>(parts: AsyncIterable<T>): Promise<AsyncIterable<T>> {
  const iterator = parts[Symbol.asyncIterator]();
  const first = await iterator.next();
  const rest: AsyncIterable<T> = { [Symbol.asyncIterator]: () => iterator };
  return (async function* () {
    if (first.done) return;
    yield first.value;
    yield* rest;
  })();
}

/** Both forms of RFC 6266: a plain one without quotes or controls, and the whole name in UTF-8. */
function fileNameParameters(name: string): string {
  const clean = name.replaceAll(/[\p{C}/\\]/gu, '_').slice(0, 150) || 'file';
  const plain = clean.normalize('NFKD').replaceAll(/[^\w.() -]/g, '_');
  const encoded = encodeURIComponent(clean).replaceAll(
    /['()*]/g,
    (char) => `%${char.charCodeAt(0).toString(16).toUpperCase()}`,
  );
  return `filename="${plain}"; filename*=UTF-8''${encoded}`;
}
