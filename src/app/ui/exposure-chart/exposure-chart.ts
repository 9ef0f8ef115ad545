import { ChangeDetectionStrategy, Component, computed, input, signal } from '@angular/core';
import {
  type ChartPoint,
  chartScale,
  chartTable,
  exposureAt,
  exposureChart,
  type ExposureChartModel,
  yOf,
} from '@shared/drawing/exposure-chart';
import {
  AXIS_DECADES,
  AXIS_FROM_M,
  AXIS_TO_M,
  distanceAt,
  METRICS,
  metricsForWidth,
  xOf,
} from '@shared/drawing/reach-axis';
import { formatQuantity, spokenUnit } from '@shared/model/quantity-format';

import { Drawing } from '../drawing/drawing';
import { elementWidth } from '../element-width';
import { Quantity } from '../quantity/quantity';

/** Steps of the arrow keys: twenty to a decade. */
const KEY_STEP = 10 ** 0.05;

/**
 * Exposure against distance on logarithmic axes. Below a reach strip of the same width and gutter
 * its thresholds stand under the sills. A value is read with the pointer or the arrow keys.
 */
@Component({
  selector: 'lm-exposure-chart',
  imports: [Drawing, Quantity],
  templateUrl: './exposure-chart.html',
  styleUrl: './exposure-chart.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ExposureChart {
  private readonly available = elementWidth();

  readonly model = input.required<ExposureChartModel>();
  readonly gutter = input<number>();

  protected readonly asTable = signal(false);
  /** Where the person reads; null until then. */
  protected readonly distanceM = signal<number | null>(null);

  protected readonly metrics = computed(() =>
    this.available() === 0 ? METRICS.card : metricsForWidth(this.available(), this.gutter()),
  );
  protected readonly drawing = computed(() => exposureChart(this.model(), this.metrics()));
  protected readonly rows = computed(() => chartTable(this.model()));
  protected readonly plot = computed(() => {
    const { left, decade } = this.metrics();
    const { top, bottom } = chartScale(this.model(), this.metrics());
    return { left, width: AXIS_DECADES * decade, top, height: bottom - top };
  });
  protected readonly reading = computed<ChartPoint | null>(() => {
    const distanceM = this.distanceM();
    return distanceM === null ? null : { distanceM, value: exposureAt(this.model(), distanceM) };
  });
  protected readonly mark = computed(() => {
    const reading = this.reading();
    if (!reading) return null;
    const scale = chartScale(this.model(), this.metrics());
    const { left } = this.metrics();
    const y = Math.min(Math.max(yOf(reading.value, scale), scale.top), scale.bottom);
    return { x: xOf(reading.distanceM, this.metrics()) - left, y: y - scale.top };
  });
  protected readonly valueText = computed(() => {
    const reading = this.reading();
    if (!reading) return 'Not read yet';
    const distance = formatQuantity(reading.distanceM, 'm', 'nearest');
    const value = formatQuantity(reading.value, this.model().unit, 'up');
    const at = `${distance.number} ${spokenUnit(distance.unit)}`;
    return `${value.number} ${spokenUnit(value.unit)} at ${at}`;
  });
  /** Position on the axis in decades, for the slider. */
  protected readonly position = computed(() =>
    Math.log10((this.distanceM() ?? AXIS_FROM_M) / AXIS_FROM_M),
  );
  protected readonly decades = AXIS_DECADES;

  protected readAt(event: PointerEvent): void {
    const { left } = (event.currentTarget as HTMLElement).getBoundingClientRect();
    this.distanceM.set(distanceAt(this.metrics().left + event.clientX - left, this.metrics()));
  }

  protected readByKey(event: KeyboardEvent): void {
    const now = this.distanceM() ?? 1;
    const next = {
      ArrowRight: now * KEY_STEP,
      ArrowUp: now * KEY_STEP,
      ArrowLeft: now / KEY_STEP,
      ArrowDown: now / KEY_STEP,
      PageUp: now * 10,
      PageDown: now / 10,
      Home: AXIS_FROM_M,
      End: AXIS_TO_M,
    }[event.key];
    if (next === undefined) return;
    event.preventDefault();
    this.distanceM.set(Math.min(Math.max(next, AXIS_FROM_M), AXIS_TO_M));
  }

  protected beginReading(): void {
    if (this.distanceM() === null) this.distanceM.set(1);
  }
}
