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
import {
  type ControlValueAccessor,
  NG_VALIDATORS,
  NG_VALUE_ACCESSOR,
  NgControl,
  type ValidationErrors,
  type Validator,
} from '@angular/forms';
import { parseQuantity, type QuantityReading, type ReadQuantity } from '@shared/model/quantity';
import { formatHeld, formatInput } from '@shared/model/quantity-format';
import { KINDS, type QuantityKind } from '@shared/model/quantity-units';

import { fieldId } from '../field/field-id';
import { errorText, ShownErrors } from '../field/field-state';

/** What the field holds: the number in the unit of the contract, and the text as typed. */
export interface TypedQuantity {
  readonly value: number;
  readonly text?: string | undefined;
}

/**
 * A number with its unit in one box, as people write it. Shows how it was read, and asks where it
 * can be read in two ways. The value is null while the text cannot be read.
 */
@Component({
  selector: 'lm-quantity-field',
  templateUrl: './quantity-field.html',
  styleUrl: './quantity-field.scss',
  providers: [
    { provide: NG_VALUE_ACCESSOR, useExisting: forwardRef(() => QuantityField), multi: true },
    { provide: NG_VALIDATORS, useExisting: forwardRef(() => QuantityField), multi: true },
  ],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class QuantityField implements ControlValueAccessor, Validator, AfterContentChecked {
  private readonly injector = inject(Injector);
  private readonly shown = new ShownErrors(inject(DestroyRef));

  readonly label = input.required<string>();
  readonly path = input.required<string>();
  readonly kind = input.required<QuantityKind>();
  /** The unit that a number typed alone takes; the kind's own when left out. */
  readonly unit = input<string>();
  readonly hint = input('');
  readonly optional = input(false, { transform: booleanAttribute });
  /** An error found outside of the control, shown first. */
  readonly problem = input('');
  /** In a table: the label is for screen readers only, the column head shows it. */
  readonly inTable = input(false, { transform: booleanAttribute });

  protected readonly text = signal('');
  protected readonly disabled = signal(false);
  private readonly taken = signal<ReadQuantity | null>(null);

  protected readonly controlId = computed(() => fieldId(this.path()));
  protected readonly bareUnit = computed(() => this.unit() ?? KINDS[this.kind()].unit);
  protected readonly allowed = computed(() => KINDS[this.kind()].allowed);
  protected readonly reading = computed<QuantityReading | null>(() => {
    if (this.taken()) return this.taken();
    return this.text().trim() === '' ? null : parseQuantity(this.text(), this.kind(), this.unit());
  });
  /** The unit stands in the box until the person writes one. */
  protected readonly shownUnit = computed(() => {
    const text = this.text().trim();
    return text === '' || /\d[.,]?$/.test(text) ? this.bareUnit() : '';
  });
  protected readonly question = computed(() => {
    const reading = this.reading();
    return reading?.ok === 'ask' ? reading : null;
  });
  protected readonly error = computed(() => {
    if (this.problem()) return this.problem();
    const errors = this.shown.errors();
    if (!errors || this.question()) return '';
    const own = errors['quantity'] as string | undefined;
    if (own) return own;
    if (errors['required']) return emptyMessage(this.kind());
    return errorText(errors, this.label());
  });
  /** The value in the unit of its contract, where that is not what was typed. */
  protected readonly echo = computed(() => {
    const reading = this.reading();
    if (reading?.ok !== true) return '';
    const held = formatHeld(reading.value, KINDS[this.kind()].unit);
    const typed = reading.text.replace(/\s+/g, '');
    return held.replace(/\s+/g, '') === typed ? '' : held;
  });
  protected readonly hasNote = computed(
    () =>
      this.error() !== '' || this.echo() !== '' || this.hint() !== '' || this.question() !== null,
  );

  private notifyChange: (value: TypedQuantity | null) => void = () => undefined;
  protected notifyTouched: () => void = () => undefined;

  ngAfterContentChecked(): void {
    // Asked for late: the form directive needs this accessor before it exists itself.
    this.shown.follow(
      this.injector.get(NgControl, null, { self: true, optional: true })?.control ?? null,
    );
  }

  writeValue(quantity: TypedQuantity | null): void {
    this.taken.set(null);
    if (!quantity) {
      // A value that cannot be read comes back as null: the text stays.
      if (this.reading() === null || this.reading()?.ok === true) this.text.set('');
      return;
    }
    this.text.set(quantity.text || formatInput(quantity.value, KINDS[this.kind()].unit));
    const reading = this.reading();
    if (reading?.ok !== 'ask') return;
    // Asked and answered before: the stored number says how the text was meant.
    const meant = reading.options.find((option) => option.reading.value === quantity.value);
    this.taken.set(meant?.reading ?? null);
  }

  registerOnChange(notify: (value: TypedQuantity | null) => void): void {
    this.notifyChange = notify;
  }

  registerOnTouched(notify: () => void): void {
    this.notifyTouched = notify;
  }

  setDisabledState(disabled: boolean): void {
    this.disabled.set(disabled);
  }

  validate(): ValidationErrors | null {
    const reading = this.reading();
    if (reading === null || reading.ok === true) return null;
    return { quantity: reading.ok === 'ask' ? reading.question : reading.message };
  }

  protected edit(text: string): void {
    this.taken.set(null);
    this.text.set(text);
    const reading = this.reading();
    this.notifyChange(reading?.ok === true ? { value: reading.value, text: reading.text } : null);
  }

  /** Takes one of the readings that were asked about. */
  protected choose(reading: ReadQuantity): void {
    this.text.set(reading.text);
    this.taken.set(reading);
    this.notifyChange({ value: reading.value, text: reading.text });
  }
}

function emptyMessage(kind: QuantityKind): string {
  const reading = parseQuantity('', kind);
  return reading.ok === false ? reading.message : '';
}
