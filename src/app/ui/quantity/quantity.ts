import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import {
  formatFull,
  formatOpticalDensity,
  formatQuantity,
  type Rounding,
  spokenUnit,
} from '@shared/model/quantity-format';

/** A number with its unit, rounded to the safe side; unrounded under the pointer or with Tab. */
@Component({
  selector: 'lm-quantity',
  template: `
    @if (formatted(); as shown) {
      <span
        class="value"
        [attr.tabindex]="exact() ? 0 : null"
        [attr.role]="exact() ? 'button' : null"
        [attr.aria-label]="exact() ? spoken() : null"
      >
        <span class="number">{{ shown.number }}</span><span class="unit"
          >{{ shown.gap }}{{ shown.unit }}</span
        >
        @if (exact()) {
          <span class="exact" aria-hidden="true">{{ full() }}</span>
        }
      </span>
    } @else {
      <span class="nothing">{{ nothing() }}</span>
    }
  `,
  styleUrl: './quantity.scss',
  host: { '[class]': 'size()' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Quantity {
  /** In `unit`; null when there is none. */
  readonly value = input.required<number | null | undefined>();
  /** Without prefix: m, W, J, s, W/m² … or as it is: nm, mm, mrad, %. Empty for a bare number. */
  readonly unit = input('');
  /** `down` for limits, `up` for distances and optical densities; `exact` for inputs. */
  readonly round = input.required<Rounding | 'exact' | 'density'>();
  readonly size = input<'text' | 'figure' | 'hero'>('text');
  /** The word in place of a missing number. */
  readonly nothing = input('–');

  protected readonly formatted = computed(() => {
    const value = this.value();
    if (value === null || value === undefined || Number.isNaN(value)) return null;
    const shown = this.shown(value);
    return { ...shown, gap: shown.unit === '' || shown.unit === '°' ? '' : '\u202f' };
  });
  protected readonly full = computed(() => {
    const value = this.value();
    return value === null || value === undefined ? '' : formatFull(value, this.unit());
  });
  /** Whether there is more to see than what is shown. */
  protected readonly exact = computed(() => {
    const shown = this.formatted();
    return shown !== null && this.round() !== 'exact' && this.full() !== shown.text;
  });
  protected readonly spoken = computed(() => {
    const shown = this.formatted();
    if (!shown) return '';
    return `${shown.number} ${spokenUnit(shown.unit)}, unrounded ${this.full()}`.replace(' ,', ',');
  });

  private shown(value: number) {
    const round = this.round();
    if (round === 'density') {
      const number = formatOpticalDensity(value);
      return { number, unit: '', text: number };
    }
    if (round === 'exact') {
      const text = formatFull(value, this.unit());
      const at = text.lastIndexOf('\u202f');
      return at === -1 || this.unit() === ''
        ? { number: text, unit: '', text }
        : { number: text.slice(0, at), unit: text.slice(at + 1), text };
    }
    return formatQuantity(value, this.unit(), round);
  }
}
