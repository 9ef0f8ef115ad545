import { HttpErrorResponse, type HttpInterceptorFn } from '@angular/common/http';
import { problemSchema } from '@shared/model/problem';
import { catchError, throwError } from 'rxjs';

import { problemError, ProblemError } from './problem-error';

/** Turns every failed response into a `ProblemError`. */
export const problemInterceptor: HttpInterceptorFn = (request, next) =>
  next(request).pipe(catchError((error: unknown) => throwError(() => toProblemError(error))));

function toProblemError(error: unknown): unknown {
  if (!(error instanceof HttpErrorResponse)) return error;
  if (error.status === 0) {
    return problemError(
      'unavailable',
      'The server cannot be reached. Nothing is lost here; try again in a moment.',
    );
  }
  const parsed = problemSchema.safeParse(bodyOf(error));
  if (parsed.success) return new ProblemError(parsed.data);
  return problemError('internal', `The server answered ${error.status} without saying why.`);
}

/** A response asked for as blob or text carries its problem details as text. */
function bodyOf(error: HttpErrorResponse): unknown {
  if (typeof error.error !== 'string') return error.error;
  try {
    return JSON.parse(error.error);
  } catch {
    // SyntaxError: a proxy's page, not ours.
    return null;
  }
}
