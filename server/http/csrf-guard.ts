import type { Request, RequestHandler, Response } from 'express';

import {
  CSRF_COOKIE,
  CSRF_HEADER,
  csrfToken,
  requireCsrfToken,
  requireSameSite,
} from '../auth/csrf';
import { actorOf } from '../auth/gate';
import { newToken } from '../auth/tokens';
import { type Config, isHttps } from '../config/config';

/** The two layers of SEC-CSRF on requests and responses. */
export interface CsrfGuard {
  /** Sees to it that the page holds the token it will have to send. */
  readonly offerAlways: RequestHandler;
  /** Gives the token of a session, or of the visitor when there is none. */
  offer(req: Request, res: Response, sessionId: string | undefined): void;
  require(req: Request): void;
}

export function createCsrfGuard(config: Config, key: Buffer): CsrfGuard {
  const secure = isHttps(config);
  const visitorCookie = secure ? '__Host-visitor' : 'visitor';
  const common = { secure, sameSite: 'lax', path: '/' } as const;

  const visitorOf = (req: Request): string | undefined => cookieOf(req, visitorCookie);
  const bindingOf = (req: Request): string | undefined =>
    actorOf(req) ? `session ${req.sessionID}` : prefixed(visitorOf(req));

  function offer(req: Request, res: Response, sessionId: string | undefined): void {
    let binding = sessionId === undefined ? prefixed(visitorOf(req)) : `session ${sessionId}`;
    if (binding === undefined) {
      const visitor = newToken();
      res.cookie(visitorCookie, visitor, { ...common, httpOnly: true });
      binding = `visitor ${visitor}`;
    }
    const token = csrfToken(key, binding);
    if (cookieOf(req, CSRF_COOKIE) !== token) res.cookie(CSRF_COOKIE, token, common);
  }

  return {
    offer,
    offerAlways: (req, res, next) => {
      offer(req, res, actorOf(req) ? req.sessionID : undefined);
      next();
    },
    require: (req) => {
      requireSameSite({
        fetchSite: req.get('sec-fetch-site'),
        origin: req.get('origin'),
        own: ownOrigins(config, req),
      });
      requireCsrfToken(key, bindingOf(req) ?? '', req.get(CSRF_HEADER));
    },
  };
}

/** In the demo the product is also reached as 127.0.0.1; in real use only by its public address. */
function ownOrigins(config: Config, req: Request): string[] {
  if (config.production) return [config.publicUrl];
  return [config.publicUrl, `http://${req.get('host') ?? ''}`];
}

function prefixed(visitor: string | undefined): string | undefined {
  return visitor === undefined ? undefined : `visitor ${visitor}`;
}

function cookieOf(req: Request, name: string): string | undefined {
  return (req.get('cookie') ?? '')
    .split(';')
    .map((part) => part.trim())
    .find((part) => part.startsWith(`${name}=`))
    ?.slice(name.length + 1);
}
