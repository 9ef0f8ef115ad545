import { randomBytes } from 'node:crypto';

/** An opaque identity: 120 random bits, never reused. */
export function newId(): string {
  return randomBytes(15).toString('base64url');
}
