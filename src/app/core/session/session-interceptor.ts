import {
  HttpEventType,
  type HttpInterceptorFn,
  HttpXsrfTokenExtractor,
} from '@angular/common/http';
import { inject } from '@angular/core';
import { catchError, switchMap, tap, throwError } from 'rxjs';

import { ProblemError } from '../http/problem-error';
import { ASKS_FOR_SESSION } from './session-api';
import { CurrentSession } from './current-session';
import { SessionClock } from './session-clock';
import { SessionRenewal } from './session-renewal';

/** When the session has ended, asks for the password over the page and then sends again. */
export const sessionInterceptor: HttpInterceptorFn = (request, next) => {
  if (request.context.get(ASKS_FOR_SESSION)) return next(request);
  const clock = inject(SessionClock);
  const session = inject(CurrentSession);
  const renewal = inject(SessionRenewal);
  const tokens = inject(HttpXsrfTokenExtractor);
  return next(request).pipe(
    tap((event) => {
      if (event.type === HttpEventType.Response) clock.noteAnswer();
    }),
    catchError((error: unknown) => {
      const hasEnded = error instanceof ProblemError && error.is('not-signed-in');
      // Who has signed out on purpose is not asked again.
      if (!hasEnded || !session.user()) return throwError(() => error);
      return renewal.renew().pipe(
        switchMap(() => {
          // Signing in again changes the token that the first try carried.
          const token = tokens.getToken();
          const again =
            token && request.headers.has('X-XSRF-TOKEN')
              ? request.clone({ setHeaders: { 'X-XSRF-TOKEN': token } })
              : request;
          return next(again);
        }),
      );
    }),
  );
};
