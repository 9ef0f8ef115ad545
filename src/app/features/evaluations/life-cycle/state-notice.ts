import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { RouterLink } from '@angular/router';
import type { Evaluation } from '@shared/model/evaluations';

import { SiteDatePipe } from '../../../core/time/site-date-pipe';

/** Said loudly: that a signed evaluation no longer holds, or why a draft came back. */
@Component({
  selector: 'lm-state-notice',
  imports: [RouterLink, SiteDatePipe],
  template: `
    @switch (evaluation().state) {
      @case ('stale') {
        <div class="notice stale">
          <h2>Outdated. Do not rely on this evaluation</h2>
          @for (reason of evaluation().staleReasons; track $index) {
            <p>{{ reason }}</p>
          }
        </div>
      }
      @case ('withdrawn') {
        <div class="notice stop">
          <h2>Withdrawn as wrong. Do not use these results</h2>
          @for (signature of evaluation().signatures; track signature.id) {
            @if (signature.meaning === 'withdrawn') {
              <p>
                {{ signature.signerName }}, {{ signature.at | siteDate }}: {{ signature.comment }}
              </p>
            }
          }
        </div>
      }
      @case ('superseded') {
        <div class="notice stale">
          <h2>Superseded by a newer evaluation</h2>
          @if (evaluation().supersededById; as id) {
            <p><a [routerLink]="['/evaluations', id]">Open the evaluation that counts</a></p>
          }
        </div>
      }
      @case ('discarded') {
        <div class="notice stale">
          <h2>Discarded. It never counted</h2>
        </div>
      }
      @case ('draft') {
        @if (evaluation().returnComment; as comment) {
          <div class="notice stale">
            <h2>Returned to the author</h2>
            <p>{{ comment }}</p>
          </div>
        }
      }
    }
  `,
  styles: `
    .notice {
      display: grid;
      gap: 4px;
      padding: 14px 18px;
      border-inline-start: 4px solid;
    }

    .stale {
      border-color: var(--lm-stale);
      background: var(--lm-stale-ground);
    }

    .stop {
      border-color: var(--lm-stop);
      background: var(--lm-stop-ground);
    }

    p {
      overflow-wrap: anywhere;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class StateNotice {
  readonly evaluation = input.required<Evaluation>();
}
