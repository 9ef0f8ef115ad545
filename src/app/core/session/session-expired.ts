import {
  afterNextRender,
  ChangeDetectionStrategy,
  Component,
  type ElementRef,
  inject,
  signal,
  viewChild,
} from '@angular/core';
import { MatButton } from '@angular/material/button';

import { asProblem } from '../http/problem-error';
import { CurrentSession } from './current-session';
import { SessionRenewal } from './session-renewal';

/** Over the page, which stays as it is: the password again, because the session has ended. */
@Component({
  selector: 'lm-session-expired',
  imports: [MatButton],
  templateUrl: './session-expired.html',
  styleUrl: './session-expired.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SessionExpired {
  private readonly renewal = inject(SessionRenewal);
  private readonly dialog = viewChild.required<ElementRef<HTMLDialogElement>>('dialog');

  protected readonly user = inject(CurrentSession).user;
  protected readonly failure = signal('');
  protected readonly busy = signal(false);

  constructor() {
    afterNextRender(() => this.dialog().nativeElement.showModal());
  }

  protected signIn(event: Event, password: string): void {
    event.preventDefault();
    if (this.busy()) return;
    this.busy.set(true);
    this.failure.set('');
    this.renewal.signIn(password).subscribe({
      next: () => this.dialog().nativeElement.close(),
      error: (error: unknown) => {
        this.busy.set(false);
        const problem = asProblem(error);
        this.failure.set(problem.detail ?? problem.title);
      },
    });
  }

  protected startOver(): void {
    location.assign('/sign-in');
  }
}
