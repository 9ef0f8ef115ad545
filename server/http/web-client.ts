import { readFile } from 'node:fs/promises';
import { existsSync, readFileSync } from 'node:fs';
import { extname, join } from 'node:path';
import { promisify } from 'node:util';
import { brotliCompress, constants, gzip } from 'node:zlib';

import express, { type Express, type RequestHandler } from 'express';

import { MethodNotAllowed, NotFound } from './errors';
import { allowPage } from './security-headers';

const A_YEAR_S = 365 * 24 * 60 * 60;
/** The build puts a hash into the names of what may be kept for ever: `main-ABCD1234.js`. */
const HASHED_NAME = /-[A-Z0-9]{8}\.(js|css|woff2)$/;
const TEXT_EXTENSIONS = new Set(['.js', '.css', '.svg', '.json', '.webmanifest', '.txt']);
const NONCE_PLACEHOLDER = /__CSP_NONCE__/g;

/** Serves the built client: its files, and its page for every address that is a screen. */
export function serveWebClient(app: Express, folder: string): void {
  // The page only ever goes out with its nonce and its policy.
  const home = page(join(folder, 'index.html'));
  app.all('/index.html', home);
  app.use(compressed(folder));
  app.use(
    express.static(folder, {
      index: false,
      redirect: false,
      setHeaders: (res, path) => res.setHeader('Cache-Control', cacheControl(path)),
    }),
  );
  app.all('/{*path}', home);
}

function page(indexFile: string): RequestHandler {
  const html = existsSync(indexFile) ? withNonces(readFileSync(indexFile, 'utf8')) : undefined;
  return (req, res) => {
    if (req.path.includes('.') && req.path !== '/index.html') throw new NotFound('file');
    if (req.method !== 'GET' && req.method !== 'HEAD') {
      throw new MethodNotAllowed(req.method, ['GET', 'HEAD']);
    }
    if (html === undefined) throw new NotFound('built client; run the build first');
    const nonce = allowPage(res);
    res.setHeader('Cache-Control', 'no-store');
    res.type('html').send(html.replaceAll(NONCE_PLACEHOLDER, nonce));
  };
}

/** Marks every script, style and link of the built page that the build left without a nonce. */
function withNonces(html: string): string {
  return html.replaceAll(/<(script|style|link)\b(?![^>]*\bnonce=)/g, '<$1 nonce="__CSP_NONCE__"');
}

function cacheControl(path: string): string {
  return HASHED_NAME.test(path) ? `public, max-age=${A_YEAR_S}, immutable` : 'no-cache';
}

/** Texts of the build compressed once, at their first request, and kept in memory. */
function compressed(folder: string): RequestHandler {
  const kept = new Map<string, Promise<Buffer | undefined>>();
  return (req, res, next) => {
    const encoding = req.acceptsEncodings('br', 'gzip');
    const isText = TEXT_EXTENSIONS.has(extname(req.path)) && !req.path.includes('..');
    if (
      req.method !== 'GET' ||
      !isText ||
      !HASHED_NAME.test(req.path) ||
      !encoding ||
      encoding === 'identity'
    ) {
      next();
      return;
    }
    const key = `${encoding} ${req.path}`;
    const body = kept.get(key) ?? compressFile(join(folder, req.path), encoding);
    kept.set(key, body);
    body.then((bytes) => {
      if (!bytes) {
        kept.delete(key);
        next();
        return;
      }
      res.type(extname(req.path));
      res.setHeader('Content-Encoding', encoding);
      res.setHeader('Vary', 'Accept-Encoding');
      res.setHeader('Cache-Control', cacheControl(req.path));
      res.end(bytes);
    }, next);
  };
}

async function compressFile(path: string, encoding: string): Promise<Buffer | undefined> {
  if (!existsSync(path)) return undefined;
  const bytes = await readFile(path);
  if (encoding === 'gzip') return promisify(gzip)(bytes);
  return promisify(brotliCompress)(bytes, {
    params: { [constants.BROTLI_PARAM_QUALITY]: 9 },
  });
}
