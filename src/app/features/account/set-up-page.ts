import { ChangeDetectionStrategy, Component, inject, input, type OnInit } from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { Router, RouterLink } from '@angular/router';
import { type Session, setupSchema } from '@shared/model/session';

import { RecordSave } from '../../core/forms/record-save';
import { CurrentSession } from '../../core/session/current-session';
import { WordMark } from '../../core/shell/word-mark';
import { Control } from '../../ui/field/control';
import { Field } from '../../ui/field/field';
import { zodValidator } from '../../ui/field/zod-validator';
import { ProblemPanel } from '../../ui/problem-panel/problem-panel';
import { AccountApi } from './account-api';
import { NewPasswordField } from './new-password-field';

const { shape } = setupSchema;

/** The first administrator of a new site. */
@Component({
  selector: 'lm-set-up-page',
  imports: [
    Control,
    Field,
    MatButton,
    NewPasswordField,
    ProblemPanel,
    ReactiveFormsModule,
    RouterLink,
    WordMark,
  ],
  templateUrl: './set-up-page.html',
  styleUrl: './account-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SetUpPage implements OnInit {
  private readonly api = inject(AccountApi);
  private readonly router = inject(Router);
  private readonly session = inject(CurrentSession);
  private readonly fb = inject(NonNullableFormBuilder);

  /** May come with the address that the server printed. */
  readonly token = input<string>();

  protected readonly needsSetup = this.session.needsSetup;
  protected readonly save = new RecordSave<Session>();
  protected readonly form = this.fb.group({
    token: ['', zodValidator(shape.token)],
    name: ['', zodValidator(shape.name)],
    email: ['', zodValidator(shape.email)],
    password: ['', zodValidator(shape.password)],
  });

  ngOnInit(): void {
    this.form.patchValue({ token: this.token() ?? '' });
  }

  protected submit(): void {
    const setup = this.save.check(this.form, setupSchema, this.form.getRawValue());
    if (!setup) return;
    this.save.run(this.form, {
      send: () => this.api.setUp(setup),
      done: () => void this.session.load().then(() => this.router.navigateByUrl('/settings')),
    });
  }
}
