import {
  computed,
  DestroyRef,
  Directive,
  inject,
  type OnInit,
  signal,
  type Signal,
} from '@angular/core';
import { NgControl, type ValidationErrors } from '@angular/forms';

import { Field } from './field';
import { shownErrors } from './field-state';

/** On an `input`, `select` or `textarea` inside `lm-field`: our look, its name and its errors. */
@Directive({
  selector: 'input[lmControl], select[lmControl], textarea[lmControl]',
  host: {
    class: 'lm-control',
    '[id]': 'field.controlId()',
    '[attr.aria-describedby]': 'field.describedBy()',
    '[attr.aria-invalid]': "field.error() ? 'true' : null",
  },
})
export class Control implements OnInit {
  private readonly ngControl = inject(NgControl, { optional: true, self: true });
  private readonly destroyRef = inject(DestroyRef);
  private readonly source = signal<Signal<ValidationErrors | null> | null>(null);
  protected readonly field = inject(Field);

  readonly errors = computed(() => this.source()?.() ?? null);

  constructor() {
    this.field.attach(this.errors);
  }

  ngOnInit(): void {
    const control = this.ngControl?.control;
    if (control) this.source.set(shownErrors(control, this.destroyRef));
  }
}
