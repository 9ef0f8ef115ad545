import { DestroyRef, inject, signal } from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import type { Evaluation, EvaluationInput } from '@shared/model/evaluations';
import type { Problem } from '@shared/model/problem';
import {
  catchError,
  concatMap,
  debounceTime,
  EMPTY,
  filter,
  map,
  merge,
  type Observable,
  of,
  shareReplay,
  Subject,
  tap,
  throwError,
} from 'rxjs';

import { asProblem, ProblemError } from '../../../core/http/problem-error';
import { EvaluationsApi } from '../evaluations-api';

/** Quiet time after a keystroke before a draft is saved. */
const SAVE_AFTER_MS = 900;

export type SaveState = 'saved' | 'unsaved' | 'saving' | 'conflict' | 'failed';

/**
 * Saves a draft by itself, one request at a time, each naming the version it changes. A version of
 * somebody else stops it until the person has chosen. Needs an injection context.
 */
export class DraftSaver {
  private readonly api = inject(EvaluationsApi);
  private readonly destroyRef = inject(DestroyRef);
  private readonly edits = new Subject<void>();
  private readonly now = new Subject<void>();
  private latest: EvaluationInput;
  private savedText: string;
  /** One request at a time: a second one would name a version that is no longer there. */
  private running: Observable<Evaluation> | null = null;

  readonly state = signal<SaveState>('saved');
  readonly problem = signal<Problem | null>(null);
  /** What somebody else stored meanwhile. */
  readonly theirs = signal<Evaluation | null>(null);
  /** The evaluation as the server last answered it, with what was sent. */
  readonly saved = signal<{ evaluation: Evaluation; input: EvaluationInput } | null>(null);

  constructor(private base: Evaluation) {
    this.latest = base.input;
    this.savedText = JSON.stringify(base.input);
    merge(this.edits.pipe(debounceTime(SAVE_AFTER_MS)), this.now)
      .pipe(
        filter(() => this.state() !== 'conflict'),
        concatMap(() => this.save().pipe(catchError(() => EMPTY))),
        takeUntilDestroyed(),
      )
      .subscribe();
  }

  /** Takes a newer input; what is equal to the stored one is not sent. */
  take(input: EvaluationInput): void {
    this.latest = input;
    if (this.isStored() || this.state() === 'conflict') return;
    this.state.set('unsaved');
    this.edits.next();
  }

  /** Saves at once what is not yet saved. Emits the stored evaluation, or fails with the problem. */
  flush(): Observable<Evaluation> {
    return this.save().pipe(takeUntilDestroyed(this.destroyRef));
  }

  retry(): void {
    this.now.next();
  }

  /** The person's own version goes over what somebody else stored. */
  keepMine(): void {
    const theirs = this.theirs();
    if (!theirs) return;
    this.base = theirs;
    this.savedText = JSON.stringify(theirs.input);
    this.theirs.set(null);
    this.state.set('unsaved');
    this.now.next();
  }

  private isStored(): boolean {
    return JSON.stringify(this.latest) === this.savedText;
  }

  private save(): Observable<Evaluation> {
    if (this.running) return this.running.pipe(concatMap(() => this.save()));
    if (this.isStored()) return of(this.base);
    const input = this.latest;
    this.state.set('saving');
    this.problem.set(null);
    this.running = this.api.update(this.base.id, this.base.version, input).pipe(
      tap((evaluation) => this.keep(evaluation, input)),
      catchError((error: unknown) => this.explain(error)),
      shareReplay(1),
    );
    return this.running;
  }

  private keep(evaluation: Evaluation, input: EvaluationInput): void {
    this.running = null;
    this.base = evaluation;
    this.savedText = JSON.stringify(input);
    this.state.set(this.isStored() ? 'saved' : 'unsaved');
    this.saved.set({ evaluation, input });
  }

  private explain(error: unknown): Observable<never> {
    this.running = null;
    if (!(error instanceof ProblemError) || !error.is('stale-version')) return this.fail(error);
    return this.api.read(this.base.id).pipe(
      map((theirs) => {
        this.theirs.set(theirs);
        this.state.set('conflict');
        throw error;
      }),
      catchError((again: unknown) =>
        again === error ? throwError(() => error) : this.fail(again),
      ),
    );
  }

  private fail(error: unknown): Observable<never> {
    this.state.set('failed');
    this.problem.set(asProblem(error));
    return throwError(() => error);
  }
}
