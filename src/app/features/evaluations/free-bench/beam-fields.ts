import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { ReactiveFormsModule } from '@angular/forms';

import { Control } from '../../../ui/field/control';
import { Field } from '../../../ui/field/field';
import { QuantityField } from '../../../ui/quantity-field/quantity-field';
import { formSignal } from '../inputs/form-signal';
import type { BeamForm } from './case-form';

/** One beam of a case, as the engine takes it. */
@Component({
  selector: 'lm-beam-fields',
  imports: [Control, Field, QuantityField, ReactiveFormsModule],
  templateUrl: './beam-fields.html',
  styleUrl: '../inputs/inputs.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class BeamFields {
  readonly form = input.required<BeamForm>();
  /** `beams[0].` */
  readonly prefix = input.required<string>();
  readonly problems = input<ReadonlyMap<string, string>>(new Map());

  protected readonly value = formSignal(this.form);
  protected readonly isPulsed = computed(() => this.value().mode !== 'cw');

  protected problem(field: string): string {
    return this.problems().get(this.prefix() + field) ?? '';
  }
}
