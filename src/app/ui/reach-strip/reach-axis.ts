import { ChangeDetectionStrategy, Component } from '@angular/core';
import { METRICS, widthOf } from '@shared/drawing/reach-axis';
import type { Drawing as Shapes, Shape } from '@shared/drawing/shapes';

import { Drawing } from '../drawing/drawing';

const { left, decade } = METRICS.row;

/** In a table head: the numbers of the axis that all rows below share. */
const AXIS: Shapes = {
  width: widthOf(METRICS.row),
  height: 16,
  shapes: ['0.1', '1 m', '10', '100', '1 km', '10', '100'].map((text, index): Shape => ({
    kind: 'text',
    x: left + index * decade,
    y: 12,
    size: 11.5,
    anchor: 'middle',
    parts: [{ text: text.replace(' ', '\u202f'), fill: 'ink2' }],
  })),
};

@Component({
  selector: 'lm-reach-axis',
  imports: [Drawing],
  template: '<lm-drawing [drawing]="axis" name="Distance from 0.1 meters to 100 kilometers" />',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ReachAxis {
  protected readonly axis = AXIS;
}
