import { inject, Injectable, signal } from '@angular/core';
import type { Session } from '@shared/model/session';
import { type Observable, Subject, take, tap } from 'rxjs';

import { CurrentSession } from './current-session';

/** The password asked for again, once for all requests that wait for it. */
@Injectable({ providedIn: 'root' })
export class SessionRenewal {
  private readonly session = inject(CurrentSession);
  private readonly asking = signal(false);
  private readonly renewed = new Subject<void>();

  /** True while the overlay is to be shown. */
  readonly isAsking = this.asking.asReadonly();

  /** Emits once the same person has signed in again. */
  renew(): Observable<void> {
    this.asking.set(true);
    return this.renewed.pipe(take(1));
  }

  signIn(password: string): Observable<Session> {
    const email = this.session.user()?.email ?? '';
    return this.session.signIn({ email, password }).pipe(
      tap(() => {
        this.asking.set(false);
        this.renewed.next();
      }),
    );
  }
}
