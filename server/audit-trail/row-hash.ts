import { createHash } from 'node:crypto';

import canonicalize from 'canonicalize';

import type { AuditTrailTable } from './audit-trail-table';

/** What the first entry is chained to. */
export const GENESIS_HASH = '0'.repeat(64);

/** SHA-256(hash before ‖ RFC 8785 JSON of the row without its hash). */
export function rowHash(previous: string, row: Omit<AuditTrailTable, 'hash'>): string {
  return createHash('sha256').update(previous).update(canonicalJson(row)).digest('hex');
}

/** The one text of a value, RFC 8785: same data, same bytes, same hash. */
export function canonicalJson(value: unknown): string {
  const text = canonicalize(value);
  if (text === undefined) throw new TypeError('Only JSON values have a canonical form.');
  return text;
}

/** SHA-256 of the canonical JSON, in hexadecimal. */
export function sha256OfJson(value: unknown): string {
  return createHash('sha256').update(canonicalJson(value)).digest('hex');
}
