import { randomBytes } from 'node:crypto';

import type { RequestHandler, Response } from 'express';
import helmet from 'helmet';

import { type Config, isHttps } from '../config/config';

/** For everything that is not a page: nothing may be loaded, nothing may frame it. */
const CLOSED_CSP =
  "default-src 'none'; base-uri 'none'; form-action 'none'; frame-ancestors 'none'";
const HSTS_S = 365 * 24 * 60 * 60;

export function securityHeaders(config: Config): RequestHandler[] {
  return [
    helmet({
      contentSecurityPolicy: false,
      strictTransportSecurity: isHttps(config) && { maxAge: HSTS_S, includeSubDomains: true },
      referrerPolicy: { policy: 'same-origin' },
      xFrameOptions: { action: 'deny' },
    }),
    (_req, res, next) => {
      res.setHeader('Content-Security-Policy', CLOSED_CSP);
      res.setHeader('Permissions-Policy', 'camera=(), geolocation=(), microphone=(), payment=()');
      next();
    },
  ];
}

/** The policy of a page: scripts and styles by this response's nonce only, trusted types on. */
export function allowPage(res: Response): string {
  const nonce = randomBytes(18).toString('base64');
  const policy = [
    "default-src 'none'",
    `script-src 'nonce-${nonce}' 'strict-dynamic'`,
    `style-src 'self' 'nonce-${nonce}'`,
    "img-src 'self' data:",
    "font-src 'self'",
    "connect-src 'self'",
    "manifest-src 'self'",
    "form-action 'self'",
    "base-uri 'none'",
    "frame-ancestors 'none'",
    "object-src 'none'",
    "require-trusted-types-for 'script'",
    'trusted-types angular angular#bundler',
  ];
  res.setHeader('Content-Security-Policy', policy.join('; '));
  return nonce;
}
