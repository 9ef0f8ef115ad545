import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { Step } from '@shared/hazard/result';
import { symbolParts } from '@shared/drawing/infix';

import { Formula } from '../../../ui/formula/formula';

/** How a result was found, step by step: each can be recomputed by hand. */
@Component({
  selector: 'lm-derivation',
  imports: [Formula],
  templateUrl: './derivation.html',
  styleUrl: './derivation.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Derivation {
  readonly steps = input.required<readonly Step[]>();

  protected readonly rows = computed(() =>
    this.steps().map((step) => ({
      ...step,
      symbolText: symbolParts(step.symbol),
      shown: shownValue(step.value),
    })),
  );
}

/** Five digits to read; all of them on demand. */
function shownValue(value: number): { short: string; full: string } {
  const short = Number(value.toPrecision(5));
  return { short: String(short), full: String(value) };
}
