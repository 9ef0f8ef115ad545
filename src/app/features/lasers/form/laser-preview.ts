import { ChangeDetectionStrategy, Component, computed, input, linkedSignal } from '@angular/core';
import { ruleSetById, type RuleSetId } from '@shared/hazard/rule-sets';

import { CautionLine } from '../../../ui/caution-line/caution-line';
import { Quantity } from '../../../ui/quantity/quantity';
import { ReachStrip } from '../../../ui/reach-strip/reach-strip';
import type { LaserFormValue } from './laser-form-value';
import { type Preview, previewOf } from './preview-of';

/** How far the laser would reach by what is typed so far; not an evaluation. */
@Component({
  selector: 'lm-laser-preview',
  imports: [CautionLine, Quantity, ReachStrip],
  templateUrl: './laser-preview.html',
  styleUrl: './laser-preview.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class LaserPreview {
  readonly value = input.required<LaserFormValue>();
  readonly ruleSet = input.required<RuleSetId | undefined>();
  readonly wallDistanceM = input<number>();
  readonly subject = input('this laser');

  private readonly now = computed<Preview | undefined>(() => {
    const ruleSet = this.ruleSet();
    return ruleSet && previewOf(this.value(), ruleSet, this.wallDistanceM());
  });
  /** The last reach that could be computed stays while a field is half typed. */
  protected readonly reach = linkedSignal<Preview | undefined, Preview['reach']>({
    source: this.now,
    computation: (now, before) => (now?.isEmpty ? undefined : (now?.reach ?? before?.value)),
  });
  protected readonly isOld = computed(() => this.reach() !== undefined && !this.now()?.reach);
  protected readonly notes = computed(() => this.now()?.notes ?? []);
  protected readonly strip = computed(() => this.reach() ?? 'unknown');
  protected readonly edition = computed(() => {
    const ruleSet = this.ruleSet();
    return ruleSet ? ruleSetById(ruleSet).edition : '';
  });
}
