import type { ValidatorFn } from '@angular/forms';
import type * as z from 'zod';

/** The rule of a contract's field as a form validator, with the contract's own sentence. */
export function zodValidator(schema: z.ZodType): ValidatorFn {
  return ({ value }) => {
    const result = schema.safeParse(value === '' || value === null ? undefined : value);
    if (result.success) return null;
    return { zod: result.error.issues[0]?.message ?? 'Check this value.' };
  };
}
