import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import { ReactiveFormsModule } from '@angular/forms';
import type { RuleSetId } from '@shared/hazard/rule-sets';
import { ACTIVITIES, type LaserInputs } from '@shared/model/evaluations';
import { formatWavelength } from '@shared/model/quantity-format';
import { emissionSummary, lineOf } from '@shared/model/laser-summary';
import { ACTIVITY_WORDS } from '@shared/text/hazard-words';

import { Control } from '../../../ui/field/control';
import { Field } from '../../../ui/field/field';
import { LineSwatch } from '../../../ui/line-swatch/line-swatch';
import { QuantityField } from '../../../ui/quantity-field/quantity-field';
import type { ScenarioForm } from './evaluation-form';
import { formSignal } from './form-signal';
import { LineFigures } from './line-figures';
import { SurroundingsFields } from './surroundings-fields';

/** What one situation is: which activity, which lines together, how long, which way. */
@Component({
  selector: 'lm-scenario-fields',
  imports: [
    Control,
    Field,
    LineFigures,
    LineSwatch,
    QuantityField,
    ReactiveFormsModule,
    SurroundingsFields,
  ],
  templateUrl: './scenario-fields.html',
  styleUrl: './inputs.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ScenarioFields {
  readonly form = input.required<ScenarioForm>();
  /** `scenarios[0].` */
  readonly prefix = input.required<string>();
  readonly laserInputs = input.required<LaserInputs>();
  readonly ruleSet = input.required<RuleSetId>();
  readonly problems = input<ReadonlyMap<string, string>>(new Map());
  readonly proposal = input('');

  readonly proposalTaken = output();

  protected readonly activities = ACTIVITIES.map((activity) => ({
    activity,
    word: ACTIVITY_WORDS[activity],
  }));
  protected readonly value = formSignal(this.form);
  protected readonly lines = computed(() =>
    this.laserInputs().emissions.map((line) => ({
      line,
      swatch: lineOf(line),
      summary: emissionSummary(line),
      range: line.wavelengthToNm
        ? `from ${formatWavelength(line.wavelengthNm.value).text} to ${formatWavelength(line.wavelengthToNm.value).text}`
        : '',
    })),
  );
  protected readonly sets = computed(() => this.laserInputs().emissionSets);

  protected chooseSet(ids: readonly string[]): void {
    const { lines } = this.form().controls;
    lines.setValue(
      Object.fromEntries(Object.keys(lines.controls).map((id) => [id, ids.includes(id)])),
    );
  }

  protected chooseAll(): void {
    this.chooseSet(this.laserInputs().emissions.map(({ id }) => id));
  }
}
