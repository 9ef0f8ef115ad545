import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import { ReactiveFormsModule } from '@angular/forms';
import { ruleSetById, type RuleSetId } from '@shared/hazard/rule-sets';
import { GROWTH_WORDS, ON_AXIS_WORDS } from '@shared/text/hazard-words';

import { Control } from '../../../ui/field/control';
import { Field } from '../../../ui/field/field';
import { QuantityField } from '../../../ui/quantity-field/quantity-field';
import { formSignal } from './form-signal';
import { PATH_CHOICES, type SurroundingsForm } from './surroundings';

/** How long, which way and through what: the fields that every case has. */
@Component({
  selector: 'lm-surroundings-fields',
  imports: [Control, Field, QuantityField, ReactiveFormsModule],
  templateUrl: './surroundings-fields.html',
  styleUrl: './inputs.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SurroundingsFields {
  readonly form = input.required<SurroundingsForm>();
  /** Before the path of every field: `scenarios[0].`. */
  readonly prefix = input('');
  readonly ruleSet = input.required<RuleSetId>();
  /** Errors of the engine by path within the situation. */
  readonly problems = input<ReadonlyMap<string, string>>(new Map());
  /** What the product proposes for the eye, in a sentence. */
  readonly proposal = input('');

  readonly proposalTaken = output();

  protected readonly pathChoices = PATH_CHOICES;
  protected readonly value = formSignal(this.form);
  protected readonly kind = computed(() => this.value().path.kind);
  protected readonly aidChoice = computed(() => this.value().aid.choice);
  protected readonly defaults = computed(() => {
    const { growth, onAxis } = ruleSetById(this.ruleSet()).defaultModel;
    return {
      growth: `As the rule set: ${GROWTH_WORDS[growth]}`,
      onAxis: `As the rule set: ${ON_AXIS_WORDS[onAxis]}`,
    };
  });
  protected readonly growths = Object.entries(GROWTH_WORDS);
  protected readonly onAxes = Object.entries(ON_AXIS_WORDS);

  protected problem(field: string): string {
    return this.problems().get(field) ?? '';
  }
}
