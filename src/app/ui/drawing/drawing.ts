import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { Color, Drawing as Shapes } from '@shared/drawing/shapes';

/** Shapes as SVG, in the colors of the theme. */
@Component({
  selector: 'lm-drawing',
  templateUrl: './drawing.html',
  styleUrl: './drawing.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Drawing {
  readonly drawing = input.required<Shapes>();
  /** The accessible name; without one the drawing is hidden from screen readers. */
  readonly name = input('');

  protected readonly viewBox = computed(
    () => `0 0 ${this.drawing().width} ${this.drawing().height}`,
  );

  protected color(color: Color | undefined): string {
    if (!color) return 'none';
    return color.startsWith('#') ? color : `var(--lm-${color})`;
  }
}
