import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { RouterLink } from '@angular/router';
import type { Laser } from '@shared/model/lasers';
import { siteDate } from '@shared/text/site-time';
import { LASER_STATE_WORDS } from '@shared/workflow/laser-life-cycle';

import { CurrentSession } from '../../../core/session/current-session';
import { Icon } from '../../../ui/icon/icon';
import type { IconName } from '../../../ui/icon/icon-paths';

interface Station {
  readonly icon: IconName;
  readonly name: string;
  readonly state: string;
  readonly detail: string;
  readonly tone: 'fine' | 'waits' | 'broken' | 'stop';
  readonly link: readonly unknown[] | null;
}

/** The chain from the inputs over the evaluation to the use; dashed where a link is broken. */
@Component({
  selector: 'lm-laser-chain',
  imports: [Icon, RouterLink],
  template: `
    <section aria-labelledby="laser-chain">
      <div class="lm-section-head"><h2 id="laser-chain">What hangs on it</h2></div>
      <ol>
        @for (station of stations(); track station.name) {
          <li [class]="station.tone">
            <span class="mark"><lm-icon [name]="station.icon" /></span>
            <div>
              <p class="name">
                @if (station.link; as link) {
                  <a [routerLink]="link">{{ station.name }}</a>
                } @else {
                  {{ station.name }}
                }
              </p>
              <p class="lm-label state">{{ station.state }}</p>
              <p class="lm-label">{{ station.detail }}</p>
            </div>
          </li>
        }
      </ol>
    </section>
  `,
  styleUrl: './laser-chain.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class LaserChain {
  private readonly site = inject(CurrentSession).site;

  readonly laser = input.required<Laser>();

  protected readonly stations = computed(() => [
    this.inputs(this.laser()),
    this.evaluation(this.laser()),
    this.use(this.laser()),
  ]);

  private inputs(laser: Laser): Station {
    const count = laser.emissions.length;
    const isStale = laser.reach?.state === 'stale';
    return {
      icon: isStale ? 'arrows' : 'lasers',
      name: 'Inputs',
      state: isStale ? 'differ from the sealed ones' : `${count} ${count === 1 ? 'line' : 'lines'}`,
      detail: count === 0 ? 'nothing to evaluate yet' : `changed ${this.date(laser.updatedAt)}`,
      tone: isStale ? 'broken' : count === 0 ? 'waits' : 'fine',
      link: null,
    };
  }

  private evaluation({ reach, evaluations }: Laser): Station {
    const icon: IconName = 'evaluations';
    if (!reach) {
      const newest = evaluations[0];
      return {
        icon,
        name: newest ? `Evaluation ${newest.number}` : 'Evaluation',
        state: newest ? 'not signed' : 'none yet',
        detail: 'no distance is known',
        tone: 'waits',
        link: newest ? ['/evaluations', newest.id] : null,
      };
    }
    const signedAt = evaluations.find(({ id }) => id === reach.evaluationId)?.signedAt;
    return {
      icon,
      name: `Evaluation ${reach.evaluationNumber}`,
      state: reach.state === 'stale' ? 'stale' : 'signed and current',
      detail: signedAt ? `signed ${this.date(signedAt)}` : '',
      tone: reach.state === 'stale' ? 'broken' : 'fine',
      link: ['/evaluations', reach.evaluationId],
    };
  }

  private use({ state, stateSince, waiver, reach }: Laser): Station {
    const inUse = state === 'in-use';
    const isCovered = reach?.state === 'approved' || (waiver && !waiver.ended);
    return {
      icon: state === 'blocked' ? 'barred' : 'ringed-dot',
      name: 'Use',
      state: LASER_STATE_WORDS[state].toLowerCase(),
      detail: waiver
        ? `under a waiver until ${this.date(waiver.untilOn)}`
        : `since ${this.date(stateSince)}`,
      tone:
        state === 'blocked' ? 'stop' : inUse && !isCovered ? 'broken' : inUse ? 'fine' : 'waits',
      link: null,
    };
  }

  private date(instant: string): string {
    return siteDate(instant, this.site()?.zone ?? 'UTC');
  }
}
