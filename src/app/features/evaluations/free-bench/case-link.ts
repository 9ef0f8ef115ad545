import type { HazardCase } from '@shared/hazard/case';

/** A case as text for an address: its JSON in base64url. Numbers keep every bit. */
export function encodeCase(hazardCase: HazardCase): string {
  const bytes = new TextEncoder().encode(JSON.stringify(hazardCase));
  const binary = Array.from(bytes, (byte) => String.fromCharCode(byte)).join('');
  return btoa(binary).replace(/\+/g, '-').replace(/\//g, '_').replace(/=+$/, '');
}

/** What an address holds; undefined when it is not a case's text. The engine checks the rest. */
export function decodeCase(encoded: string): unknown {
  try {
    const binary = atob(encoded.replace(/-/g, '+').replace(/_/g, '/'));
    const bytes = Uint8Array.from(binary, (character) => character.charCodeAt(0));
    return JSON.parse(new TextDecoder('utf-8', { fatal: true }).decode(bytes));
  } catch {
    // DOMException, TypeError or SyntaxError: not base64, not UTF-8, not JSON.
    return undefined;
  }
}
