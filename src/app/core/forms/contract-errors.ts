import type { FieldError } from '@shared/model/problem';
import type * as z from 'zod';

/** What a contract's schema finds wrong, in the terms of the server's field errors. */
export function contractErrors(error: z.ZodError): FieldError[] {
  return error.issues.map(({ path, message }) => ({ path: pathText(path), message }));
}

function pathText(path: readonly PropertyKey[]): string {
  return path
    .map((part, index) =>
      typeof part === 'number' ? `[${part}]` : `${index > 0 ? '.' : ''}${String(part)}`,
    )
    .join('');
}
