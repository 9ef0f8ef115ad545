import { createHmac, timingSafeEqual } from 'node:crypto';

import { CrossSite } from '../http/errors';

export const CSRF_COOKIE = 'XSRF-TOKEN';
export const CSRF_HEADER = 'x-xsrf-token';

/** The token of a session, or of the cookie that stands in for one before signing in. */
export function csrfToken(key: Buffer, binding: string): string {
  return createHmac('sha256', key).update('csrf\n').update(binding).digest('base64url');
}

export function requireCsrfToken(key: Buffer, binding: string, given: string | undefined): void {
  const expected = Buffer.from(csrfToken(key, binding));
  const actual = Buffer.from(given ?? '');
  if (expected.length === actual.length && timingSafeEqual(expected, actual)) return;
  throw new CrossSite(
    `Send the value of the cookie ${CSRF_COOKIE} as the header X-XSRF-TOKEN. Load the page again.`,
  );
}

export interface Origins {
  readonly fetchSite: string | undefined;
  readonly origin: string | undefined;
  /** Origins that are this site. */
  readonly own: readonly string[];
}

/** The browser's own word for where the request comes from: every header present must agree. */
export function requireSameSite({ fetchSite, origin, own }: Origins): void {
  const saysNothing = fetchSite === undefined && origin === undefined;
  const isForeign = fetchSite !== undefined && fetchSite !== 'same-origin';
  if (saysNothing || isForeign || (origin !== undefined && !own.includes(origin))) {
    throw new CrossSite('Changes are taken only from pages of this site.');
  }
}
