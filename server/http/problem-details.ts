import { type Problem, type ProblemName, PROBLEMS } from '@shared/model/problem';
import type { ErrorRequestHandler } from 'express';
import type { Logger } from 'pino';

import { actorOf } from '../auth/gate';
import { ApiError, InvalidInput, TooLarge, Unavailable, UnsupportedMedia } from './errors';

/** Refusals that may be somebody trying what is not theirs. */
const WATCHED: ReadonlySet<ProblemName> = new Set([
  'not-signed-in',
  'not-allowed',
  'cross-site',
  'proof-failed',
  'too-many',
]);

/** Answers everything thrown as RFC 9457 problem details; what nobody expected is logged once. */
export function problemDetails(log: Logger): ErrorRequestHandler {
  // Express knows an error handler by its four parameters.
  return (error: unknown, req, res, _next) => {
    const requestId = String(req.id);
    const known = asApiError(error);
    if (!known) log.error({ err: error, requestId }, 'request failed');
    else if (WATCHED.has(known.problem)) {
      const { ip, method, path } = req;
      const actorId = actorOf(req)?.id;
      log.warn({ event: known.problem, requestId, ip, method, path, actorId }, 'refused');
    }
    if (res.headersSent) {
      res.destroy();
      return;
    }
    for (const [name, value] of Object.entries(known?.extras.headers ?? {})) {
      res.setHeader(name, value);
    }
    const problem = problemOf(known, requestId);
    res.removeHeader('Content-Disposition');
    res.status(problem.status).type('application/problem+json').send(JSON.stringify(problem));
  };
}

function problemOf(error: ApiError | undefined, requestId: string): Problem {
  const name = error?.problem ?? 'internal';
  const { status, title } = PROBLEMS[name];
  const { errors, reasons, currentVersion } = error?.extras ?? {};
  return {
    type: `urn:limen:problem:${name}`,
    title,
    status,
    name,
    detail: error?.message ?? `The failure was logged under the number ${requestId}.`,
    requestId,
    ...(errors ? { errors: [...errors] } : {}),
    ...(reasons ? { reasons: [...reasons] } : {}),
    ...(currentVersion === undefined ? {} : { currentVersion }),
  };
}

/** Refusals of the libraries in front of us, in our words. */
function asApiError(error: unknown): ApiError | undefined {
  if (error instanceof ApiError) return error;
  if (!(error instanceof Error)) return undefined;
  const { type, code } = error as { type?: unknown; code?: unknown };
  if (typeof type === 'string' && type in BODY_ERRORS) return BODY_ERRORS[type]?.();
  if (error instanceof URIError) return badAddress();
  if (typeof code !== 'string') return undefined;
  if (code.startsWith('SQLITE_FULL') || code.startsWith('SQLITE_IOERR') || code === 'ENOSPC') {
    return new Unavailable('The disk of the server is full. Nothing was stored.');
  }
  if (code.startsWith('SQLITE_BUSY')) return new Unavailable('The database is busy. Try again.');
  return undefined;
}

/** By the `type` that the body parser gives its errors. */
const BODY_ERRORS: Readonly<Record<string, () => ApiError>> = {
  'entity.parse.failed': () => badBody('The body is not JSON.'),
  'entity.too.large': () => new TooLarge('The body is too large for this address.'),
  'encoding.unsupported': () => new UnsupportedMedia('Send the body as gzip, deflate or plain.'),
  'charset.unsupported': () => new UnsupportedMedia('Send the body in UTF-8.'),
  'request.aborted': () => badBody('The body ended before it was complete.'),
  'request.size.invalid': () => badBody('The body is not as long as Content-Length says.'),
  'stream.encoding.set': () => badBody('The body cannot be read.'),
  'entity.verify.failed': () => badBody('The body cannot be read.'),
};

function badBody(message: string): ApiError {
  return new InvalidInput([{ path: '', message, allowed: 'one JSON object in UTF-8' }]);
}

function badAddress(): ApiError {
  return new InvalidInput([{ path: '', message: 'The address has a broken %-code.' }]);
}
