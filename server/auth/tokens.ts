import { createHash, randomBytes } from 'node:crypto';

/** 256 random bits for a link or a cookie. */
export function newToken(): string {
  return randomBytes(32).toString('base64url');
}

/** Tokens are stored by their hash only. */
export function tokenHash(token: string): string {
  return createHash('sha256').update(token).digest('hex');
}
