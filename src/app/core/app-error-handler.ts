import { type ErrorHandler, inject, Injectable, signal } from '@angular/core';
import type { Problem } from '@shared/model/problem';

import { asProblem } from './http/problem-error';

/** The last failure nobody handled, shown by the shell as a line above the page. */
@Injectable({ providedIn: 'root' })
export class UnhandledProblem {
  private readonly latest = signal<Problem | null>(null);

  readonly problem = this.latest.asReadonly();

  show(problem: Problem): void {
    this.latest.set(problem);
  }

  dismiss(): void {
    this.latest.set(null);
  }
}

/** Says on the page that something failed; the console keeps the stack. */
@Injectable()
export class AppErrorHandler implements ErrorHandler {
  private readonly unhandled = inject(UnhandledProblem);

  handleError(error: unknown): void {
    console.error(error);
    this.unhandled.show(asProblem(error));
  }
}
