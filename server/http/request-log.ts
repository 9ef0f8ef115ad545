import { randomUUID } from 'node:crypto';

import type { RequestHandler } from 'express';
import type { Logger } from 'pino';
import { pinoHttp } from 'pino-http';

/** One line per request: no bodies, no cookies, no tokens. */
export function requestLog(log: Logger): RequestHandler {
  return pinoHttp({
    logger: log,
    genReqId: () => randomUUID(),
    customLogLevel: (_req, res) => (res.statusCode >= 500 ? 'error' : 'info'),
    serializers: {
      req: (req: { id: string; method: string; url: string; remoteAddress: string }) => ({
        id: req.id,
        method: req.method,
        // A query may hold what somebody searched for; a path never does.
        path: req.url.split('?')[0],
        ip: req.remoteAddress,
      }),
      res: (res: { statusCode: number }) => ({ status: res.statusCode }),
      err: () => undefined,
    },
  });
}
