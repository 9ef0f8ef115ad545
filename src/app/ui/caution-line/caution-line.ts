import { ChangeDetectionStrategy, Component, input } from '@angular/core';

import { Icon } from '../icon/icon';

/** The last line of every screen with a result: rule set, assumptions, and who decides. */
@Component({
  selector: 'lm-caution-line',
  imports: [Icon],
  template: `
    <lm-icon name="info" />
    <p>
      @if (ruleSet()) {
        Results: {{ ruleSet() }}.
      }
      <ng-content />
      An aid for trained people: local law and permit terms come first, and your laser safety
      officer decides and signs. Good as the inputs: label values are declared, not measured.
    </p>
  `,
  styles: `
    :host {
      display: flex;
      gap: 12px;
      padding-block-start: 12px;
      border-block-start: 1px solid var(--lm-rule);
      font: var(--lm-label);
      color: var(--lm-ink2);
      --lm-icon-size: 18px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CautionLine {
  /** Title of the rule set with its edition. */
  readonly ruleSet = input('');
}
