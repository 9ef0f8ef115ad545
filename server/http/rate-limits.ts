import type { Request, RequestHandler, Response } from 'express';
import { ipKeyGenerator, rateLimit } from 'express-rate-limit';

import { actorOf } from '../auth/gate';
import type { Config } from '../config/config';
import { TooMany } from './errors';
import type { LimitName } from './route';

/** Most requests of one person, or of one address while nobody is signed in. */
export const RATE_LIMITS: Readonly<Record<LimitName | 'api', { most: number; inS: number }>> = {
  api: { most: 600, inS: 60 },
  calculation: { most: 300, inS: 60 },
  search: { most: 120, inS: 60 },
  export: { most: 10, inS: 60 },
  upload: { most: 60, inS: 3600 },
};

export type RateLimiters = Readonly<Record<LimitName | 'api', RequestHandler>>;

export function createRateLimiters(config: Config): RateLimiters {
  const entries = Object.entries(RATE_LIMITS).map(([name, { most, inS }]) => [
    name,
    rateLimit({
      windowMs: inS * 1000,
      limit: Math.ceil(most * config.rateLimitFactor),
      standardHeaders: 'draft-8',
      legacyHeaders: false,
      identifier: name,
      keyGenerator: (req) => actorOf(req)?.id ?? ipKeyGenerator(req.ip ?? ''),
      handler: (_req, _res, next) => {
        next(new TooMany(`At most ${most} such requests in ${inS} s. Wait a little.`, inS));
      },
    }),
  ]);
  return Object.fromEntries(entries) as RateLimiters;
}

/** Runs a limiter as a step of the pipeline. */
export function limited(limiter: RequestHandler, req: Request, res: Response): Promise<void> {
  return new Promise((resolve, reject) => {
    void limiter(req, res, (error?: unknown) => {
      if (error) reject(error as Error);
      else resolve();
    });
  });
}
