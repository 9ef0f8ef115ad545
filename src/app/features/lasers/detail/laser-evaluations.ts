import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { RouterLink } from '@angular/router';
import type { Laser } from '@shared/model/lasers';

import { InstantPipe } from '../../../core/time/instant-pipe';
import { type ChipState, StateChip } from '../../../ui/state-chip/state-chip';

/** Every evaluation of the laser, newest first. */
@Component({
  selector: 'lm-laser-evaluations',
  imports: [InstantPipe, RouterLink, StateChip],
  template: `
    <section aria-labelledby="laser-evaluations">
      <div class="lm-section-head"><h2 id="laser-evaluations">Evaluations</h2></div>
      <ul>
        @for (evaluation of evaluations(); track evaluation.id) {
          <li>
            <a [routerLink]="['/evaluations', evaluation.id]">Evaluation {{ evaluation.number }}</a>
            <lm-state-chip [state]="chipOf(evaluation.state)" />
            <span class="lm-label">
              {{ evaluation.signedAt ? 'signed ' + (evaluation.signedAt | lmInstant: 'date') : '' }}
            </span>
          </li>
        } @empty {
          <li class="lm-quiet">None yet: how far this laser reaches is not known.</li>
        }
      </ul>
    </section>
  `,
  styles: `
    li {
      display: flex;
      flex-wrap: wrap;
      align-items: center;
      gap: 6px 16px;
      min-block-size: var(--lm-row);
      border-block-end: 1px solid var(--lm-hair);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class LaserEvaluations {
  readonly evaluations = input.required<Laser['evaluations']>();

  protected chipOf(state: string): ChipState {
    return state as ChipState;
  }
}
