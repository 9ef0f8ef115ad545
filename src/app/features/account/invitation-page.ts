import { ChangeDetectionStrategy, Component, inject, input, signal } from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import { acceptInvitationSchema } from '@shared/model/people';

import { RecordSave } from '../../core/forms/record-save';
import { WordMark } from '../../core/shell/word-mark';
import { zodValidator } from '../../ui/field/zod-validator';
import { ProblemPanel } from '../../ui/problem-panel/problem-panel';
import { AccountApi } from './account-api';
import { NewPasswordField } from './new-password-field';

/** Where an invited person sets the password of their account. */
@Component({
  selector: 'lm-invitation-page',
  imports: [MatButton, NewPasswordField, ProblemPanel, ReactiveFormsModule, RouterLink, WordMark],
  template: `
    <main>
      <lm-word-mark />
      @if (isDone()) {
        <h1>Your password is set</h1>
        <p>Sign in with your e-mail address and this password.</p>
        <p><a matButton="filled" routerLink="/sign-in">To the sign-in</a></p>
      } @else if (token()) {
        <h1>Set your password</h1>
        <p class="lm-quiet">The link works once, within 60 minutes of its making.</p>
        <form [formGroup]="form" (ngSubmit)="submit()">
          @if (save.problem() || save.errors().length) {
            <lm-problem-panel [problem]="save.problem()" [errors]="save.errors()" />
          }
          <lm-new-password-field path="password" [control]="form.controls.password" />
          <div>
            <button matButton="filled" type="submit" [disabled]="save.busy()">
              {{ save.busy() ? 'Setting…' : 'Set the password' }}
            </button>
          </div>
        </form>
      } @else {
        <h1>This link is not complete</h1>
        <p>Open the whole link that you were given, or ask your administrator for a new one.</p>
      }
    </main>
  `,
  styleUrl: './account-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class InvitationPage {
  private readonly api = inject(AccountApi);

  readonly token = input<string>();

  protected readonly save = new RecordSave<void>();
  protected readonly isDone = signal(false);
  protected readonly form = inject(NonNullableFormBuilder).group({
    password: ['', zodValidator(acceptInvitationSchema.shape.password)],
  });

  protected submit(): void {
    const acceptance = this.save.check(this.form, acceptInvitationSchema, {
      ...this.form.getRawValue(),
      token: this.token(),
    });
    if (!acceptance) return;
    this.save.run(this.form, {
      send: () => this.api.acceptInvitation(acceptance),
      done: () => this.isDone.set(true),
    });
  }
}
