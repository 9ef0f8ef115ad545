import type { ValidatorFn } from '@angular/forms';
import type * as z from 'zod';

import { contractWords } from './contract-words';

/** The rule of a contract's field as a form validator, with the contract's own sentence. */
export function zodValidator(schema: z.ZodType): ValidatorFn {
  return ({ value }) => {
    const isEmpty = value === '' || value === null;
    if (isEmpty && schema.safeParse(undefined).success) return null;
    const result = schema.safeParse(value === null ? undefined : value, { error: contractWords });
    if (result.success) return null;
    return { zod: result.error.issues[0]?.message ?? 'Check this value.' };
  };
}
