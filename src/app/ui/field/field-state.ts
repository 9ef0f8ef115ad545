import { DestroyRef, type Signal, signal } from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import type { AbstractControl, ValidationErrors } from '@angular/forms';

/** The sentence for a control's first error. Our validators carry their own sentence. */
export function errorText(errors: ValidationErrors | null, label: string): string {
  if (!errors) return '';
  const [name, detail] = Object.entries(errors)[0] ?? [];
  if (typeof detail === 'string') return detail;
  const what = label.charAt(0).toLowerCase() + label.slice(1);
  if (name === 'required') return `Enter ${what}.`;
  if (name === 'min') return `At least ${(detail as { min: number }).min}.`;
  if (name === 'max') return `At most ${(detail as { max: number }).max}.`;
  if (name === 'maxlength') {
    return `At most ${(detail as { requiredLength: number }).requiredLength} characters.`;
  }
  return `Check ${what}.`;
}

/** A control's errors as a signal: null until the person has left the field. */
export function shownErrors(
  control: AbstractControl,
  destroyRef: DestroyRef,
): Signal<ValidationErrors | null> {
  const read = () => (control.touched && control.invalid ? control.errors : null);
  const errors = signal(read());
  control.events.pipe(takeUntilDestroyed(destroyRef)).subscribe(() => errors.set(read()));
  return errors.asReadonly();
}
