import { computed, inject, Injectable, signal } from '@angular/core';
import { takeUntilDestroyed, toObservable } from '@angular/core/rxjs-interop';
import { combineLatest, EMPTY, map, switchMap, timer } from 'rxjs';

import { CurrentSession } from './current-session';

/** How long before its end a session says so. */
const WARNING_S = 120;

/** Knows when the session will end for want of requests, and says so in time to stay. */
@Injectable({ providedIn: 'root' })
export class SessionClock {
  private readonly session = inject(CurrentSession);
  private readonly answers = signal(0);
  private readonly ending = signal(false);

  /** True from two minutes before the end on. */
  readonly isEnding = this.ending.asReadonly();

  private readonly waitMs = computed(() => {
    if (!this.session.user()) return null;
    const idleS = this.session.idleTimeoutS();
    return 1000 * Math.max(idleS - WARNING_S, idleS / 2);
  });

  constructor() {
    combineLatest([toObservable(this.answers), toObservable(this.waitMs)])
      .pipe(
        switchMap(([, waitMs]) => {
          this.ending.set(false);
          return waitMs === null ? EMPTY : timer(waitMs).pipe(map(() => true));
        }),
        takeUntilDestroyed(),
      )
      .subscribe((ends) => this.ending.set(ends));
  }

  /** Every answer of the server begins the idle time anew. */
  noteAnswer(): void {
    this.answers.update((count) => count + 1);
  }

  /** Stays signed in: any request does. */
  extend(): void {
    void this.session.load().then(() => this.noteAnswer());
  }
}
