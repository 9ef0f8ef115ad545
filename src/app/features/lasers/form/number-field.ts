import {
  type AfterContentChecked,
  booleanAttribute,
  ChangeDetectionStrategy,
  Component,
  computed,
  DestroyRef,
  forwardRef,
  inject,
  Injector,
  input,
  signal,
} from '@angular/core';
import { type ControlValueAccessor, NG_VALUE_ACCESSOR, NgControl } from '@angular/forms';

import { Field } from '../../../ui/field/field';
import { errorText, ShownErrors } from '../../../ui/field/field-state';
import type { TypedQuantity } from '../../../ui/quantity-field/quantity-field';

/** A number without unit that is held like a quantity: a numerical aperture, a count. */
@Component({
  selector: 'lm-number-field',
  imports: [Field],
  template: `
    <lm-field
      #field
      [label]="label()"
      [path]="path()"
      [hint]="hint()"
      [optional]="optional()"
      [problem]="problem()"
    >
      <input
        #box
        class="lm-control"
        type="number"
        inputmode="decimal"
        step="any"
        min="0"
        [id]="field.controlId()"
        [attr.aria-describedby]="field.describedBy()"
        [attr.aria-invalid]="problem() ? 'true' : null"
        [value]="text()"
        (input)="edit(box.value)"
        (blur)="notifyTouched()"
      />
    </lm-field>
  `,
  providers: [
    { provide: NG_VALUE_ACCESSOR, useExisting: forwardRef(() => NumberField), multi: true },
  ],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class NumberField implements ControlValueAccessor, AfterContentChecked {
  private readonly injector = inject(Injector);
  private readonly shown = new ShownErrors(inject(DestroyRef));

  readonly label = input.required<string>();
  readonly path = input.required<string>();
  readonly hint = input('');
  readonly optional = input(false, { transform: booleanAttribute });

  protected readonly text = signal('');
  protected readonly problem = computed(() => errorText(this.shown.errors(), this.label()));

  private notifyChange: (value: TypedQuantity | null) => void = () => undefined;
  protected notifyTouched: () => void = () => undefined;

  // Not in the constructor: the form directive needs this accessor first.
  ngAfterContentChecked(): void {
    const ngControl = this.injector.get(NgControl, null, { self: true, optional: true });
    this.shown.follow(ngControl?.control ?? null);
  }

  writeValue(quantity: TypedQuantity | null): void {
    this.text.set(quantity ? String(quantity.value) : '');
  }

  registerOnChange(notify: (value: TypedQuantity | null) => void): void {
    this.notifyChange = notify;
  }

  registerOnTouched(notify: () => void): void {
    this.notifyTouched = notify;
  }

  protected edit(text: string): void {
    this.text.set(text);
    const value = Number(text);
    const isNumber = text.trim() !== '' && Number.isFinite(value);
    this.notifyChange(isNumber ? { value, text } : null);
  }
}
