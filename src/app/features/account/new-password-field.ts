import { ChangeDetectionStrategy, Component, input, signal } from '@angular/core';
import { type FormControl, ReactiveFormsModule } from '@angular/forms';

import { Control } from '../../ui/field/control';
import { Field } from '../../ui/field/field';

/** A new password, which the person can read while choosing it. */
@Component({
  selector: 'lm-new-password-field',
  imports: [Control, Field, ReactiveFormsModule],
  template: `
    <lm-field [label]="label()" [path]="path()" hint="12 characters or more; a sentence is good">
      <input
        lmControl
        autocomplete="new-password"
        [type]="isShown() ? 'text' : 'password'"
        [formControl]="control()"
      />
    </lm-field>
    <label class="lm-choice">
      <input type="checkbox" [checked]="isShown()" (change)="isShown.set(!isShown())" />
      Show the password
    </label>
  `,
  styles: `
    :host {
      display: grid;
      gap: 4px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class NewPasswordField {
  readonly label = input('New password');
  readonly path = input.required<string>();
  readonly control = input.required<FormControl<string>>();

  protected readonly isShown = signal(false);
}
