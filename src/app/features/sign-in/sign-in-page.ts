import { ChangeDetectionStrategy, Component, inject, input, signal } from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { Router } from '@angular/router';
import type { Problem } from '@shared/model/problem';
import { type SignIn, signInSchema } from '@shared/model/session';

import { asProblem } from '../../core/http/problem-error';
import { CurrentSession } from '../../core/session/current-session';
import { WordMark } from '../../core/shell/word-mark';
import { Control } from '../../ui/field/control';
import { Field } from '../../ui/field/field';
import { zodValidator } from '../../ui/field/zod-validator';
import { Icon } from '../../ui/icon/icon';
import { ReachStrip } from '../../ui/reach-strip/reach-strip';
import { EXAMPLE_REACH, EXAMPLE_WORDS } from './sign-in-example';

/** The way in, with an e-mail address and a password, or with a demo account. */
@Component({
  selector: 'lm-sign-in-page',
  imports: [Control, Field, Icon, MatButton, ReachStrip, ReactiveFormsModule, WordMark],
  templateUrl: './sign-in-page.html',
  styleUrl: './sign-in-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SignInPage {
  private readonly router = inject(Router);
  private readonly session = inject(CurrentSession);

  /** Where the person wanted to go; a path on this site. */
  readonly next = input<string>();

  protected readonly exampleReach = EXAMPLE_REACH;
  protected readonly exampleWords = EXAMPLE_WORDS;
  protected readonly site = this.session.site;
  protected readonly demoAccounts = this.session.demoAccounts;
  protected readonly offline = this.session.problem;
  protected readonly problem = signal<Problem | null>(null);
  protected readonly busy = signal(false);
  protected readonly passwordShown = signal(false);
  protected readonly form = inject(NonNullableFormBuilder).group({
    email: ['', zodValidator(signInSchema.shape.email)],
    password: ['', zodValidator(signInSchema.shape.password)],
  });

  protected signIn(): void {
    this.form.markAllAsTouched();
    if (this.form.invalid || this.busy()) return;
    this.send(this.form.getRawValue());
  }

  protected signInAs(account: SignIn): void {
    this.form.setValue({ email: account.email, password: account.password });
    this.signIn();
  }

  protected retry(): void {
    void this.session.load();
  }

  private send(credentials: SignIn): void {
    this.busy.set(true);
    this.problem.set(null);
    this.session.signIn(credentials).subscribe({
      next: () => void this.router.navigateByUrl(localPath(this.next())),
      error: (error: unknown) => {
        this.busy.set(false);
        this.problem.set(asProblem(error));
      },
    });
  }
}

/** Only paths of this site: never another origin, whatever the address says. */
export function localPath(next: string | undefined): string {
  return next && /^\/(?![/\\])/.test(next) && !next.startsWith('/sign-in') ? next : '/today';
}
