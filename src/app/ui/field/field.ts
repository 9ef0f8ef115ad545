import {
  booleanAttribute,
  ChangeDetectionStrategy,
  Component,
  computed,
  input,
  signal,
  type Signal,
} from '@angular/core';
import type { ValidationErrors } from '@angular/forms';

import { fieldId } from './field-id';
import { errorText } from './field-state';

/** A label above a box, a hint below it, and the error in its place when there is one. */
@Component({
  selector: 'lm-field',
  template: `
    <label [attr.for]="controlId()">
      {{ label() }}
      @if (optional()) {
        <span class="optional">optional</span>
      }
    </label>
    <ng-content />
    @if (error(); as text) {
      <p class="error" [id]="controlId() + '-note'">{{ text }}</p>
    } @else if (hint()) {
      <p class="hint" [id]="controlId() + '-note'">{{ hint() }}</p>
    }
  `,
  styleUrl: './field.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Field {
  readonly label = input.required<string>();
  /** Path of the value in its form, as problem details name it: `emissions[0].powerW`. */
  readonly path = input.required<string>();
  readonly hint = input('');
  readonly optional = input(false, { transform: booleanAttribute });
  /** An error found outside of the control, shown first. */
  readonly problem = input('');

  private readonly attached = signal<Signal<ValidationErrors | null> | null>(null);

  readonly controlId = computed(() => fieldId(this.path()));
  readonly error = computed(
    () => this.problem() || errorText(this.attached()?.() ?? null, this.label()),
  );
  readonly describedBy = computed(() =>
    this.error() || this.hint() ? `${this.controlId()}-note` : null,
  );

  /** Called by the control inside. */
  attach(errors: Signal<ValidationErrors | null>): void {
    this.attached.set(errors);
  }
}
