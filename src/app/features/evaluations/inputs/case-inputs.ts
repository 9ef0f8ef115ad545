import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { HazardCase } from '@shared/hazard/case';
import { ruleSetById } from '@shared/hazard/rule-sets';
import { formatFull } from '@shared/model/quantity-format';
import {
  aidName,
  exposureWords,
  GROWTH_WORDS,
  ON_AXIS_WORDS,
  pathWords,
} from '@shared/text/hazard-words';

/** How long, which way and through what a case was evaluated, to read. */
@Component({
  selector: 'lm-case-inputs',
  template: `
    <dl>
      @for (row of rows(); track row[0]) {
        <div>
          <dt>{{ row[0] }}</dt>
          <dd>{{ row[1] }}</dd>
        </div>
      }
    </dl>
  `,
  styles: `
    dl > div {
      display: grid;
      grid-template-columns: 104px minmax(0, 1fr);
      gap: 2px 10px;
      padding-block: 5px;
      border-block-end: 1px solid var(--lm-hair);
    }

    dt {
      font: var(--lm-label);
      color: var(--lm-ink2);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CaseInputs {
  readonly case = input.required<HazardCase>();
  readonly reason = input('');

  protected readonly rows = computed(() => {
    const { path, aid, air, at, model, ruleSet } = this.case();
    const { growth, onAxis } = model ?? ruleSetById(ruleSet).defaultModel;
    return [
      ['Exposure', exposureWords(this.case())],
      ...(this.reason() ? [['Because', this.reason()]] : []),
      ['Path', pathWords(path)],
      ['Optical aid', aid ? `${aidName(aid)}, transmission ${aid.transmission}` : 'none'],
      ['Model', `${GROWTH_WORDS[growth]}, ${ON_AXIS_WORDS[onAxis]}`],
      ...(air ? [['Air', `attenuation ${air.attenuationPerKm}\u202f1/km`]] : []),
      ...(at ? [['Also at', formatFull(at.distanceM, 'm')]] : []),
    ];
  });
}
