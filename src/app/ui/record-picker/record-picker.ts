import {
  type AfterContentChecked,
  booleanAttribute,
  ChangeDetectionStrategy,
  Component,
  computed,
  DestroyRef,
  inject,
  input,
  signal,
} from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import { type AbstractControl, type ControlValueAccessor, NgControl } from '@angular/forms';
import { MatAutocomplete, MatAutocompleteTrigger, MatOption } from '@angular/material/autocomplete';
import { catchError, debounceTime, of, Subject, switchMap } from 'rxjs';

import { Field } from '../field/field';
import { errorText, ShownErrors } from '../field/field-state';
import { Icon } from '../icon/icon';
import type { FindRecords, RecordOption } from './record-option';

/** Picks one record by typing a part of its name; the form holds the record's id. */
@Component({
  selector: 'lm-record-picker',
  imports: [Field, Icon, MatAutocomplete, MatAutocompleteTrigger, MatOption],
  templateUrl: './record-picker.html',
  styleUrl: './record-picker.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RecordPicker implements ControlValueAccessor, AfterContentChecked {
  private readonly ngControl = inject(NgControl, { self: true });
  private readonly shown = new ShownErrors(inject(DestroyRef));

  readonly label = input.required<string>();
  readonly path = input.required<string>();
  /** What is picked, in a sentence: "an area". */
  readonly what = input.required<string>();
  readonly find = input.required<FindRecords>();
  /** The record that the form begins with, so that its name can be shown. */
  readonly chosen = input<RecordOption | null>(null);
  readonly hint = input('');
  readonly optional = input(false, { transform: booleanAttribute });

  protected readonly id = signal('');
  protected readonly text = signal<string | null>(null);
  protected readonly options = signal<readonly RecordOption[]>([]);
  protected readonly isDisabled = signal(false);
  private readonly picked = signal<RecordOption | null>(null);
  private readonly typed = new Subject<string>();
  private report: (id: string) => void = () => undefined;
  private reportTouched: () => void = () => undefined;

  protected readonly record = computed(
    () => [this.picked(), this.chosen()].find((option) => option?.id === this.id()) ?? null,
  );
  protected readonly shownText = computed(() => this.text() ?? this.record()?.name ?? this.id());
  protected readonly problem = computed(() => errorText(this.shown.errors(), this.label()));

  constructor() {
    this.ngControl.valueAccessor = this;
    this.typed
      .pipe(
        debounceTime(150),
        switchMap((text) => this.find()(text).pipe(catchError(() => of([])))),
        takeUntilDestroyed(),
      )
      .subscribe((options) => this.options.set(options));
  }

  ngAfterContentChecked(): void {
    const { control } = this.ngControl;
    if (control && !control.hasValidator(this.isPicked)) control.addValidators(this.isPicked);
    this.shown.follow(control);
  }

  writeValue(id: string | null): void {
    this.id.set(id ?? '');
    this.text.set(null);
  }

  registerOnChange(report: (id: string) => void): void {
    this.report = report;
  }

  registerOnTouched(report: () => void): void {
    this.reportTouched = report;
  }

  setDisabledState(isDisabled: boolean): void {
    this.isDisabled.set(isDisabled);
  }

  protected look(): void {
    this.typed.next(this.text() ?? '');
  }

  protected type(text: string): void {
    this.text.set(text);
    this.id.set('');
    this.report('');
    this.typed.next(text);
  }

  protected pick(option: RecordOption): void {
    this.picked.set(option);
    this.id.set(option.id);
    this.text.set(null);
    this.report(option.id);
  }

  protected clear(field: HTMLInputElement): void {
    this.type('');
    field.focus();
  }

  protected leave(): void {
    this.reportTouched();
  }

  private readonly isPicked = (_control: AbstractControl) =>
    this.text() ? { unpicked: `Choose ${this.what()} from the list, or empty the field.` } : null;

  protected readonly nameOf = (option: RecordOption | string | null): string =>
    typeof option === 'string' ? option : (option?.name ?? '');
}
