import { DestroyRef, inject, signal } from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import { type AbstractControl, FormArray, FormGroup } from '@angular/forms';
import type { FieldError, Problem } from '@shared/model/problem';
import { catchError, EMPTY, finalize, map, type Observable } from 'rxjs';
import type * as z from 'zod';

import { contractWords } from '../../ui/field/contract-words';
import { setServerErrors } from '../../ui/field/server-errors';
import { asProblem, ProblemError } from '../http/problem-error';
import { contractErrors } from './contract-errors';
import { filled } from './filled';
import { formErrors } from './form-errors';

interface SaveSteps<Stored> {
  readonly send: () => Observable<Stored>;
  /** Reads the record again when somebody else saved it meanwhile. */
  readonly reread?: () => Observable<Stored>;
  readonly done: (stored: Stored) => void;
}

/**
 * The course of saving one record: errors of the contract and of the server land on the form's
 * fields, a version of somebody else is read and shown beside what was typed. Needs an injection
 * context.
 */
export class RecordSave<Stored> {
  private readonly destroyRef = inject(DestroyRef);

  readonly busy = signal(false);
  readonly problem = signal<Problem | null>(null);
  /** Found before sending. */
  readonly errors = signal<readonly FieldError[]>([]);
  /** What somebody else stored meanwhile. */
  readonly stored = signal<Stored | null>(null);

  /** The form's value as the contract wants it; undefined when it does not fit, and why is shown. */
  check<T>(
    form: AbstractControl,
    schema: z.ZodType<T>,
    value: unknown = form.value,
  ): T | undefined {
    forgetServerErrors(form);
    form.markAllAsTouched();
    this.problem.set(null);
    this.errors.set([]);
    const parsed = schema.safeParse(filled(value) ?? {}, { error: contractWords });
    const found = [
      ...formErrors(form),
      ...(parsed.success ? [] : contractErrors(parsed.error)),
    ].map(({ path, message }) => ({ path: controlPath(form, path), message }));
    const errors = found.filter(
      ({ path }, index) => found.findIndex((other) => other.path === path) === index,
    );
    if (errors.length === 0) return parsed.data;
    setServerErrors(form, errors);
    this.errors.set(errors);
    return undefined;
  }

  run(form: AbstractControl, steps: SaveSteps<Stored>): void {
    if (this.busy()) return;
    this.busy.set(true);
    this.problem.set(null);
    this.errors.set([]);
    this.stored.set(null);
    steps
      .send()
      .pipe(
        map(steps.done),
        catchError((error: unknown) => this.explain(form, error, steps.reread)),
        finalize(() => this.busy.set(false)),
        takeUntilDestroyed(this.destroyRef),
      )
      .subscribe();
  }

  private explain(
    form: AbstractControl,
    error: unknown,
    reread: (() => Observable<Stored>) | undefined,
  ): Observable<void> {
    if (reread && error instanceof ProblemError && error.is('stale-version')) {
      return reread().pipe(
        map((stored) => this.stored.set(stored)),
        catchError((again: unknown) => this.explain(form, again, undefined)),
      );
    }
    const problem = asProblem(error);
    const errors = problem.errors?.map((one) => ({ ...one, path: controlPath(form, one.path) }));
    setServerErrors(form, errors ?? []);
    this.problem.set(errors ? { ...problem, errors } : problem);
    return EMPTY;
  }
}

/** Errors put on controls from outside are found again, or not, by the next check. */
function forgetServerErrors(control: AbstractControl): void {
  if (control instanceof FormGroup || control instanceof FormArray) {
    Object.values(control.controls as Record<string, AbstractControl>).forEach(forgetServerErrors);
  }
  if (control.hasError('server')) control.updateValueAndValidity();
}

/** A group that holds a number and its source shows its errors at the number. */
function controlPath(form: AbstractControl, path: string): string {
  const control = form.get(path.replace(/\[(\d+)\]/g, '.$1'));
  return control instanceof FormGroup && control.get('value') ? `${path}.value` : path;
}
