import type { FieldError } from '@shared/model/problem';

import { pathText } from './field-errors';

const MAX_DEPTH = 40;

/**
 * Texts that cannot be stored and read back the same: half characters and NUL. Also refuses what is
 * nested too deep to be ours.
 */
export function unstorableTexts(value: unknown, path: readonly PropertyKey[] = []): FieldError[] {
  if (typeof value === 'string') return isStorable(value) ? [] : [unstorable(path)];
  if (typeof value !== 'object' || value === null) return [];
  if (path.length >= MAX_DEPTH) {
    return [{ path: pathText(path), message: `Nested deeper than ${MAX_DEPTH} levels.` }];
  }
  if (Array.isArray(value)) {
    return value.flatMap((item, index) => unstorableTexts(item, [...path, index]));
  }
  return Object.entries(value).flatMap(([key, item]) =>
    isStorable(key) ? unstorableTexts(item, [...path, key]) : [unstorable(path)],
  );
}

function isStorable(text: string): boolean {
  return !/[\0\p{Surrogate}]/u.test(text);
}

function unstorable(path: readonly PropertyKey[]): FieldError {
  return {
    path: pathText(path),
    message: 'This text holds a character that cannot be stored.',
    allowed: 'whole Unicode characters, no NUL',
  };
}
