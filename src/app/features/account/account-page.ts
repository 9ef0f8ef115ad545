import { ChangeDetectionStrategy, Component, computed, inject, signal } from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { ROLE_WORDS } from '@shared/model/people';
import { changePasswordSchema } from '@shared/model/session';

import { RecordSave } from '../../core/forms/record-save';
import { CurrentSession } from '../../core/session/current-session';
import { Control } from '../../ui/field/control';
import { Field } from '../../ui/field/field';
import { zodValidator } from '../../ui/field/zod-validator';
import { ProblemPanel } from '../../ui/problem-panel/problem-panel';
import { AccountApi } from './account-api';
import { NewPasswordField } from './new-password-field';

const { shape } = changePasswordSchema;

/** One's own account: who one is here, and the password. */
@Component({
  selector: 'lm-account-page',
  imports: [Control, Field, MatButton, NewPasswordField, ProblemPanel, ReactiveFormsModule],
  templateUrl: './account-page.html',
  styles: `
    :host,
    form {
      display: grid;
      gap: 18px;
    }

    :host {
      max-inline-size: 520px;
    }

    .actions {
      display: flex;
      align-items: center;
      gap: 16px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class AccountPage {
  private readonly api = inject(AccountApi);

  protected readonly user = inject(CurrentSession).user;
  protected readonly roles = computed(() =>
    (this.user()?.roles ?? []).map((role) => ROLE_WORDS[role]).join(', '),
  );
  protected readonly save = new RecordSave<void>();
  protected readonly said = signal('');
  protected readonly form = inject(NonNullableFormBuilder).group({
    currentPassword: ['', zodValidator(shape.currentPassword)],
    newPassword: ['', zodValidator(shape.newPassword)],
  });

  protected submit(): void {
    this.said.set('');
    const change = this.save.check(this.form, changePasswordSchema, this.form.getRawValue());
    if (!change) return;
    this.save.run(this.form, {
      send: () => this.api.changePassword(change),
      done: () => {
        this.form.reset();
        this.said.set('The password is changed. Other sessions of yours have ended.');
      },
    });
  }
}
