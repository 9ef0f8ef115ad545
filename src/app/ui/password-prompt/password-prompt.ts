import {
  booleanAttribute,
  ChangeDetectionStrategy,
  Component,
  computed,
  input,
  output,
  signal,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import type { Problem } from '@shared/model/problem';

import { Icon } from '../icon/icon';

/** The sentence one signs, and the password that shows that one is here. */
@Component({
  selector: 'lm-password-prompt',
  imports: [Icon, MatButton],
  templateUrl: './password-prompt.html',
  styleUrl: './password-prompt.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PasswordPrompt {
  readonly statement = input.required<string>();
  /** The words on the button: "Sign and seal". */
  readonly action = input.required<string>();
  /** The words on it while the server works: "Signing…". */
  readonly working = input('Signing…');
  readonly busy = input(false, { transform: booleanAttribute });
  readonly problem = input<Problem | null>(null);
  /** What keeps this person from signing now; the button is off and the reasons stand there. */
  readonly reasons = input<readonly string[]>([]);

  readonly signed = output<string>();

  protected readonly missing = signal(false);
  protected readonly error = computed(() => {
    if (this.missing()) return 'Enter your password, to show you are here.';
    const problem = this.problem();
    return problem ? (problem.detail ?? problem.title) : '';
  });

  protected sign(event: Event, password: HTMLInputElement): void {
    event.preventDefault();
    this.missing.set(password.value === '');
    if (this.missing()) {
      password.focus();
      return;
    }
    if (!this.busy()) this.signed.emit(password.value);
  }
}
