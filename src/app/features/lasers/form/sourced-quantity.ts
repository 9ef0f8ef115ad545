import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { toObservable, toSignal } from '@angular/core/rxjs-interop';
import { ReactiveFormsModule } from '@angular/forms';
import { PROVENANCES } from '@shared/model/common';
import { PROVENANCE_WORDS } from '@shared/text/provenance-words';
import { startWith, switchMap } from 'rxjs';

import { QuantityField } from '../../../ui/quantity-field/quantity-field';
import type { QuantitySpec } from './emission-fields';
import type { QuantityForm } from './laser-form';
import { NumberField } from './number-field';

/** A number with its unit, and where it came from. */
@Component({
  selector: 'lm-sourced-quantity',
  imports: [NumberField, QuantityField, ReactiveFormsModule],
  templateUrl: './sourced-quantity.html',
  styleUrl: './sourced-quantity.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SourcedQuantity {
  readonly spec = input.required<QuantitySpec>();
  readonly form = input.required<QuantityForm>();
  /** Of the line: `emissions[0]`. */
  readonly linePath = input.required<string>();

  protected readonly path = computed(() => `${this.linePath()}.${this.spec().name}.value`);
  protected readonly sources = PROVENANCES.map((source) => ({
    source,
    words: PROVENANCE_WORDS[source],
  }));
  private readonly value = toSignal(
    toObservable(this.form).pipe(
      switchMap((form) => form.valueChanges.pipe(startWith(form.getRawValue()))),
    ),
  );
  /** Source and uncertainty are asked for once there is a number. */
  protected readonly hasNumber = computed(() => Boolean(this.value()?.value));
  protected readonly isMeasured = computed(() => this.value()?.source === 'measured');
}
