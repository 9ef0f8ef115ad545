import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { METRICS } from '@shared/drawing/reach-axis';
import { laneSample, wallSample } from '@shared/drawing/reach-strip';

import { Drawing } from '../drawing/drawing';

/** What the three patterns and the double line mean. */
@Component({
  selector: 'lm-reach-legend',
  imports: [Drawing],
  template: `
    <span><lm-drawing [drawing]="skin" />Skin</span>
    <span><lm-drawing [drawing]="eye" />Eye</span>
    <span><lm-drawing [drawing]="aided" />{{ aidName() }}</span>
    <span><lm-drawing [drawing]="wall" />wall</span>
  `,
  styles: `
    :host {
      display: flex;
      flex-wrap: wrap;
      gap: 4px 18px;
      font: var(--lm-label);
      color: var(--lm-ink2);
    }
    span {
      display: inline-flex;
      align-items: center;
      gap: 7px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ReachLegend {
  readonly aidName = input('Aided');

  protected readonly skin = laneSample('skin', METRICS.row);
  protected readonly eye = laneSample('eye', METRICS.row);
  protected readonly aided = laneSample('aided', METRICS.row);
  protected readonly wall = wallSample();
}
