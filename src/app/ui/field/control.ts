import { type AfterContentChecked, DestroyRef, Directive, inject } from '@angular/core';
import { NgControl } from '@angular/forms';

import { Field } from './field';
import { ShownErrors } from './field-state';

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
export class Control implements AfterContentChecked {
  private readonly ngControl = inject(NgControl, { optional: true, self: true });
  private readonly shown = new ShownErrors(inject(DestroyRef));
  protected readonly field = inject(Field);

  constructor() {
    this.field.attach(this.shown.errors);
  }

  // Not in ngOnInit: the form directive may set its control after that.
  ngAfterContentChecked(): void {
    this.shown.follow(this.ngControl?.control ?? null);
  }
}
