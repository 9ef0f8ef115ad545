import type { AbstractControl } from '@angular/forms';
import type { FieldError } from '@shared/model/problem';

/**
 * Puts the server's field errors on the controls with the same path. They stay until the person
 * changes the field. Returns those that no control takes.
 */
export function setServerErrors(
  form: AbstractControl,
  errors: readonly FieldError[],
): readonly FieldError[] {
  return errors.filter(({ path, message, allowed }) => {
    const control = form.get(path.replace(/\[(\d+)\]/g, '.$1').replace(/^\./, ''));
    if (!control) return true;
    control.setErrors({ server: allowed ? `${message} Allowed: ${allowed}` : message });
    control.markAsTouched();
    return false;
  });
}
