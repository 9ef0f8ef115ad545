import { ChangeDetectionStrategy, Component, computed, input, model } from '@angular/core';
import type { Activity } from '@shared/model/evaluations';
import { formatQuantity } from '@shared/model/quantity-format';
import { ACTIVITY_WORDS } from '@shared/text/hazard-words';

import type { Outcome } from '../results/outcome';

export interface SituationItem {
  readonly id: string;
  readonly name: string;
  readonly activity: Activity;
  readonly outcome: Outcome | undefined;
}

/** The situations of an evaluation, each with its reach; one of them is in view. */
@Component({
  selector: 'lm-situation-list',
  template: `
    <ul aria-label="Situations">
      @for (row of rows(); track row.id) {
        <li>
          <button
            type="button"
            [attr.aria-current]="row.id === chosen() ? 'true' : null"
            (click)="chosen.set(row.id)"
          >
            <span>{{ row.name }}</span>
            <span class="lm-figure" [class.wrong]="row.isWrong">{{ row.reach }}</span>
            <small>{{ row.activity }}</small>
          </button>
        </li>
      } @empty {
        <li class="lm-quiet">No situation yet. Add the first.</li>
      }
    </ul>
  `,
  styleUrl: './situation-list.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SituationList {
  readonly items = input.required<readonly SituationItem[]>();
  readonly chosen = model<string>();

  protected readonly rows = computed(() =>
    this.items().map(({ id, name, activity, outcome }) => ({
      id,
      name: name || 'Without a name',
      activity: ACTIVITY_WORDS[activity],
      isWrong: !outcome?.isCurrent,
      reach: reachWords(outcome),
    })),
  );
}

function reachWords(outcome: Outcome | undefined): string {
  if (!outcome?.view || !outcome.isCurrent) return 'check inputs';
  const meters = outcome.view.result.eye.hazardDistanceM;
  return meters === 0 ? 'nowhere' : formatQuantity(meters, 'm', 'up').text;
}
