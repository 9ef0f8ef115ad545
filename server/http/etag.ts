import { InvalidInput, StaleVersion, VersionMissing } from './errors';

/** The version in `If-Match: "3"`. */
export function parseIfMatch(header: string | undefined): number {
  if (header === undefined) throw new VersionMissing();
  const match = /^"([1-9]\d{0,14})"$/.exec(header.trim());
  if (match) return Number(match[1]);
  throw new InvalidInput([
    {
      path: 'If-Match',
      message: 'If-Match must hold the version you read, in quotes, for example "3".',
      allowed: 'one version in quotes',
    },
  ]);
}

/** Refuses a change of a version that is no longer the stored one. */
export function requireVersion(stored: { readonly version: number }, given: number): void {
  if (stored.version !== given) throw new StaleVersion(stored.version);
}
