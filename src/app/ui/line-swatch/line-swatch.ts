import {
  booleanAttribute,
  ChangeDetectionStrategy,
  Component,
  computed,
  input,
} from '@angular/core';
import { lineSwatch, linesText, spokenLine, type SwatchLine } from '@shared/drawing/line-swatch';

import { Drawing } from '../drawing/drawing';

/** A wavelength as a small chip, with its number always beside it. */
@Component({
  selector: 'lm-line-swatch',
  imports: [Drawing],
  template: `
    <span class="chips" [class.touching]="together()">
      @for (chip of chips(); track $index) {
        <lm-drawing [drawing]="chip" />
      }
    </span>
    <span class="number" [attr.title]="note()"
      >{{ number() }}<span class="lm-unit">{{ unit() }}</span></span
    >
    <span class="lm-unseen">{{ spoken() }}</span>
  `,
  styles: `
    :host {
      display: inline-flex;
      flex-wrap: wrap;
      align-items: center;
      gap: 2px 7px;
    }
    .chips {
      display: inline-flex;
      gap: 2px;
    }
    .touching {
      gap: 0;
    }
    .number {
      white-space: nowrap;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class LineSwatch {
  readonly lines = input.required<readonly SwatchLine[]>();
  /** One set that is on at once: the chips touch and the number is a range. */
  readonly together = input(false, { transform: booleanAttribute });
  readonly height = input<12 | 16 | 24 | 40>(16);

  private readonly shown = computed(() => {
    const lines = this.lines();
    return lines.length > 6 ? lines.slice(0, 3) : lines;
  });

  protected readonly chips = computed(() =>
    this.shown().map((line) =>
      lineSwatch(line, this.height(), this.together() ? 0.75 * this.height() : undefined),
    ),
  );
  private readonly text = computed(() => linesText(this.lines(), this.together()));
  /** The unit is in a lighter tone, unless several units stand in the text. */
  protected readonly unit = computed(() => /\u202f[nµ]m$/.exec(this.text())?.[0] ?? '');
  protected readonly number = computed(() =>
    this.text().slice(0, this.text().length - this.unit().length),
  );
  protected readonly spoken = computed(() => this.shown().map(spokenLine).join('; '));
  protected readonly note = computed(() =>
    this.lines().some(({ wavelengthNm: nm }) => nm >= 700 && nm <= 780)
      ? 'may be seen as faint deep red'
      : null,
  );
}
