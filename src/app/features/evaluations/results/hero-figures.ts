import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import {
  governingLine,
  haveOneLimit,
  limitFigure,
  type LineView,
  type ResultView,
} from '@shared/model/result-view';
import { formatQuantity, formatWavelength } from '@shared/model/quantity-format';
import {
  distanceOrigin,
  durationWords,
  MECHANISM_WORDS,
  RULE_WORDS,
} from '@shared/text/hazard-words';

import { Quantity } from '../../../ui/quantity/quantity';

/** The figures that decide: how far, how little, how dark, each with its side and duration. */
@Component({
  selector: 'lm-hero-figures',
  imports: [Quantity],
  templateUrl: './hero-figures.html',
  styleUrl: './hero-figures.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class HeroFigures {
  readonly view = input.required<ResultView>();
  /** The sealed figures, beside those of today. */
  readonly sealed = input<ResultView | null>(null);

  protected readonly eye = computed(() => this.view().result.eye);
  protected readonly skin = computed(() => this.view().result.skin);
  protected readonly origin = computed(() => distanceOrigin(this.view().case.path));
  protected readonly eyeLimit = computed(() => {
    const line = governingLine(this.view(), 'eye');
    return { ...limitFigure(line.beam, line.eye.mpe), note: this.limitNote(line) };
  });
  protected readonly eyeDuration = computed(() => exposureDuration(this.view(), 'eye'));
  protected readonly skinDuration = computed(() => exposureDuration(this.view(), 'skin'));
  protected readonly densityNote = computed(() =>
    this.view().lines.length > 1 ? 'all lines together, worst place' : 'at the worst place',
  );
  protected readonly sealedEye = computed(() => {
    const sealed = this.sealed()?.result.eye;
    return sealed ? `sealed ${distance(sealed.hazardDistanceM)}` : '';
  });

  private limitNote({ beam, eye: { mpe } }: LineView): string {
    const view = this.view();
    const several = view.lines.length > 1 && !haveOneLimit(view, 'eye');
    return [
      several ? formatWavelength(beam.wavelengthNm).text : '',
      limitFigure(beam, mpe).per,
      mpe.rule === 'continuous' ? '' : RULE_WORDS[mpe.rule],
      this.eyeDuration(),
      MECHANISM_WORDS[mpe.mechanism],
      `over ${mpe.limitingApertureMm}\u202fmm`,
    ]
      .filter(Boolean)
      .join(', ');
  }
}

/** The exposure that was chosen; a single pulse is read at its own duration. */
function exposureDuration(view: ResultView, side: 'eye' | 'skin'): string {
  const { mpe } = governingLine(view, side)[side];
  const { exposure } = view.case;
  if (mpe.rule === 'single-pulse' && !exposure) return durationWords(mpe.durationS);
  const seconds = side === 'eye' ? exposure?.eyeS : (exposure?.skinS ?? exposure?.eyeS);
  return durationWords(seconds ?? mpe.durationS);
}

function distance(meters: number): string {
  return meters === 0 ? 'nowhere' : formatQuantity(meters, 'm', 'up').text;
}
