import { type DestroyRef, signal } from '@angular/core';
import type { AbstractControl, ValidationErrors } from '@angular/forms';
import type { Subscription } from 'rxjs';

/** The sentence for a control's first error. Our validators carry their own sentence. */
export function errorText(errors: ValidationErrors | null, label: string): string {
  if (!errors) return '';
  const [name, detail] = Object.entries(errors)[0] ?? [];
  if (typeof detail === 'string') return detail;
  const what = label.charAt(0).toLowerCase() + label.slice(1);
  if (name === 'required') return `Enter the ${what}.`;
  if (name === 'min') return `At least ${(detail as { min: number }).min}.`;
  if (name === 'max') return `At most ${(detail as { max: number }).max}.`;
  if (name === 'maxlength') {
    return `At most ${(detail as { requiredLength: number }).requiredLength} characters.`;
  }
  return `Check the ${what}.`;
}

/** A control's errors as a signal: null until the person has left the field. */
export class ShownErrors {
  private readonly state = signal<ValidationErrors | null>(null);
  private control: AbstractControl | null = null;
  private subscription: Subscription | undefined;

  readonly errors = this.state.asReadonly();

  constructor(destroyRef: DestroyRef) {
    destroyRef.onDestroy(() => this.subscription?.unsubscribe());
  }

  /** Called at each check: a list that re-orders its rows gives a field another control. */
  follow(control: AbstractControl | null): void {
    if (control === this.control) return;
    this.control = control;
    this.subscription?.unsubscribe();
    this.subscription = control?.events.subscribe(() => this.read());
    this.read();
  }

  private read(): void {
    const { control } = this;
    this.state.set(control?.touched && control.invalid ? control.errors : null);
  }
}
