import { type AbstractControl, FormArray, FormGroup } from '@angular/forms';
import type { FieldError } from '@shared/model/problem';

import { errorText } from '../../ui/field/field-state';

/** What the controls of a form find wrong, for the summary above it. */
export function formErrors(control: AbstractControl, path = ''): FieldError[] {
  if (control.valid || control.disabled) return [];
  const own = control.errors
    ? [{ path, message: errorText(control.errors, path || 'the form') }]
    : [];
  if (control instanceof FormGroup) {
    return [
      ...own,
      ...Object.entries(control.controls).flatMap(([name, child]) =>
        formErrors(child as AbstractControl, path ? `${path}.${name}` : name),
      ),
    ];
  }
  if (control instanceof FormArray) {
    return [
      ...own,
      ...control.controls.flatMap((child, index) => formErrors(child, `${path}[${index}]`)),
    ];
  }
  return own;
}
