import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { ruleSetById } from '@shared/hazard/rule-sets';
import type { Laser } from '@shared/model/lasers';
import { formatFull } from '@shared/model/quantity-format';

import { Quantity } from '../../../ui/quantity/quantity';
import { ReachLegend } from '../../../ui/reach-strip/reach-legend';
import { ReachStrip } from '../../../ui/reach-strip/reach-strip';
import { reachDistances } from '../reach-distances';
import { LaserStaleReach } from './laser-stale-reach';

/** How far the laser reaches by its sealed evaluation; what got worse when that is stale. */
@Component({
  selector: 'lm-laser-reach',
  imports: [LaserStaleReach, Quantity, ReachLegend, ReachStrip],
  templateUrl: './laser-reach.html',
  styleUrl: './laser-reach.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class LaserReach {
  readonly laser = input.required<Laser>();

  protected readonly strip = computed(() =>
    reachDistances(this.laser().reach, this.laser().wallDistanceM),
  );
  protected readonly grounds = computed(() => {
    const { reach } = this.laser();
    if (!reach) return '';
    const { edition } = ruleSetById(reach.ruleSet);
    return `${reach.scenario}: eye ${formatFull(reach.eyeS, 's')}, skin ${formatFull(reach.skinS, 's')}, by ${edition}`;
  });
}
