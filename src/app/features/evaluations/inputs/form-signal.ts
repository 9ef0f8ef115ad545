import type { Signal } from '@angular/core';
import { toObservable, toSignal } from '@angular/core/rxjs-interop';
import { computed } from '@angular/core';
import type { AbstractControl } from '@angular/forms';
import { map, merge, of, switchMap } from 'rxjs';

/** The raw value of a form as a signal, read anew on every keystroke. Needs an injection context. */
export function formSignal<F extends AbstractControl>(
  form: Signal<F>,
): Signal<ReturnType<F['getRawValue']>> {
  const changes = toSignal(
    toObservable(form).pipe(
      switchMap((one) => merge(of(0), one.events)),
      map((_, index) => index),
    ),
  );
  return computed(
    () => {
      changes();
      return form().getRawValue() as ReturnType<F['getRawValue']>;
    },
    { equal: () => false },
  );
}
