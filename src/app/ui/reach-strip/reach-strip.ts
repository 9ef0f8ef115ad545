import {
  booleanAttribute,
  ChangeDetectionStrategy,
  Component,
  computed,
  ElementRef,
  inject,
  input,
} from '@angular/core';
import { type Reach, reachName, type ReachSide } from '@shared/drawing/reach';
import { METRICS, metricsForWidth, withoutAxis } from '@shared/drawing/reach-axis';
import { reachStrip, type Sill } from '@shared/drawing/reach-strip';
import { formatFull } from '@shared/model/quantity-format';

import { Drawing } from '../drawing/drawing';
import { elementWidth } from '../element-width';

const SIDE_WORDS: Readonly<Record<ReachSide, string>> = {
  eye: 'Eye hazard distance',
  skin: 'Skin hazard distance',
  aided: 'Hazard distance with viewing aids',
};

/**
 * How far a laser reaches: three lanes on one logarithmic axis, each ending at its sill. The row is
 * 244 px wide; the other forms take the width of their panel.
 */
@Component({
  selector: 'lm-reach-strip',
  imports: [Drawing],
  templateUrl: './reach-strip.html',
  styleUrl: './reach-strip.scss',
  host: { '[class.faded]': 'faded()', '[class.fluid]': "size() !== 'row'" },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ReachStrip {
  private readonly host = inject<ElementRef<HTMLElement>>(ElementRef);
  private readonly available = elementWidth();

  readonly reach = input.required<Reach>();
  /** What it is the reach of: "L-02". */
  readonly subject = input.required<string>();
  readonly size = input<'row' | 'card' | 'page'>('page');
  /** Left gutter in px, wide enough for a chart's labels; the chart below takes the same. */
  readonly gutter = input<number>();
  /** A chart stands directly below and carries the axis for both. */
  readonly joined = input(false, { transform: booleanAttribute });
  /** In a table, where the numbers stand beside it as text. */
  readonly decorative = input(false, { transform: booleanAttribute });
  /** Each sill can be reached with Tab and the arrows and says its unrounded distance. */
  readonly pointable = input(false, { transform: booleanAttribute });
  /** The sealed state beside today's. */
  readonly faded = input(false, { transform: booleanAttribute });

  protected readonly metrics = computed(() => {
    if (this.size() === 'row') return METRICS.row;
    const width = this.available();
    // Until the panel is measured the strip takes no more than a card.
    if (width === 0) return METRICS.card;
    const fitting = metricsForWidth(width, this.gutter());
    const chosen = this.size() === 'card' && fitting.size === 'page' ? METRICS.card : fitting;
    return this.joined() ? withoutAxis(chosen) : chosen;
  });
  protected readonly drawing = computed(() => reachStrip(this.reach(), this.metrics()));
  protected readonly name = computed(() =>
    this.decorative() ? '' : reachName(this.subject(), this.reach()),
  );
  protected readonly sills = computed(() =>
    [...this.drawing().sills].sort((a, b) => a.distanceM - b.distanceM),
  );

  protected words(sill: Sill): string {
    return `${SIDE_WORDS[sill.side]}, unrounded ${formatFull(sill.distanceM, 'm')}`;
  }

  protected move(event: KeyboardEvent, index: number): void {
    const last = this.sills().length - 1;
    const target = { ArrowRight: index + 1, ArrowLeft: index - 1, Home: 0, End: last }[event.key];
    if (target === undefined) return;
    event.preventDefault();
    const buttons = this.host.nativeElement.querySelectorAll('button');
    buttons[Math.min(Math.max(target, 0), last)]?.focus();
  }
}
