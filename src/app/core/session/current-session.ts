import { computed, inject, Injectable, signal } from '@angular/core';
import type { Role } from '@shared/model/people';
import type { Problem } from '@shared/model/problem';
import type { Session, SignIn } from '@shared/model/session';
import { catchError, firstValueFrom, map, type Observable, of, tap } from 'rxjs';

import { asProblem } from '../http/problem-error';
import { SessionApi } from './session-api';

/** Who is signed in, and what the server says about this site. */
@Injectable({ providedIn: 'root' })
export class CurrentSession {
  private readonly api = inject(SessionApi);
  private readonly state = signal<Session | null>(null);
  private readonly failure = signal<Problem | null>(null);

  readonly user = computed(() => this.state()?.user ?? null);
  readonly site = computed(() => this.state()?.site ?? null);
  readonly demoAccounts = computed(() => this.state()?.demo?.accounts ?? null);
  readonly needsSetup = computed(() => this.state()?.needsSetup ?? false);
  /** Seconds without a request after which the session ends. */
  readonly idleTimeoutS = computed(() => this.state()?.idleTimeoutS ?? 0);
  /** Why the session could not be read, while it could not. */
  readonly problem = this.failure.asReadonly();

  /** Reads the session; never fails, so that the page can say what is wrong. */
  load(): Promise<void> {
    return firstValueFrom(
      this.api.read().pipe(
        map((session) => {
          this.state.set(session);
          this.failure.set(null);
        }),
        catchError((error: unknown) => {
          this.failure.set(asProblem(error));
          return of(undefined);
        }),
      ),
    );
  }

  signIn(credentials: SignIn): Observable<Session> {
    return this.api.signIn(credentials).pipe(tap((session) => this.state.set(session)));
  }

  signOut(): Observable<void> {
    return this.api
      .signOut()
      .pipe(tap(() => this.state.update((session) => session && { ...session, user: null })));
  }

  hasRole(...roles: readonly Role[]): boolean {
    return this.user()?.roles.some((role) => roles.includes(role)) ?? false;
  }
}
