import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { FieldError } from '@shared/model/problem';
import { formatQuantity, formatWavelength } from '@shared/model/quantity-format';
import { limitFigure, reachOf, type ResultView } from '@shared/model/result-view';
import { resultChart } from '@shared/model/result-chart';
import { aidName, distanceOrigin } from '@shared/text/hazard-words';

import { ExposureChart } from '../../../ui/exposure-chart/exposure-chart';
import { fieldId } from '../../../ui/field/field-id';
import { Quantity } from '../../../ui/quantity/quantity';
import { ReachLegend } from '../../../ui/reach-strip/reach-legend';
import { ReachStrip } from '../../../ui/reach-strip/reach-strip';
import { labeledMessage } from '../inputs/missing-words';
import { HeroFigures } from './hero-figures';
import { LineTable } from './line-table';
import type { Outcome } from './outcome';
import { ResultFold } from './result-fold';

/** The figures of one case: how far, how little, the strip above its chart, line by line. */
@Component({
  selector: 'lm-result-figures',
  imports: [ExposureChart, HeroFigures, LineTable, Quantity, ReachLegend, ReachStrip, ResultFold],
  templateUrl: './result-figures.html',
  styleUrl: './result-figures.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ResultFigures {
  readonly outcome = input.required<Outcome>();
  readonly subject = input.required<string>();
  readonly wallDistanceM = input<number>();
  /** The sealed results, shown beside those of today. */
  readonly sealed = input<ResultView | null>(null);

  /** Room for the chart's labels left of the axis that it shares with the strip, px. */
  protected readonly gutter = 66;
  protected readonly reach = computed(() => {
    const { view } = this.outcome();
    return view && this.reachOf(view);
  });
  protected readonly sealedReach = computed(() => {
    const sealed = this.sealed();
    return sealed && this.reachOf(sealed);
  });
  protected readonly aid = computed(() => {
    const aid = this.outcome().view?.case.aid;
    return aid ? aidName(aid) : '';
  });
  protected readonly chart = computed(() => {
    const { view } = this.outcome();
    return view && resultChart(view, this.wallDistanceM());
  });
  protected readonly origin = computed(() => distanceOrigin(this.outcome().view?.case.path));
  protected readonly at = computed(() => {
    const { view } = this.outcome();
    return view?.case.at && atRows(view, view.case.at.distanceM);
  });

  protected readonly labeled = labeledMessage;

  protected linkOf(error: FieldError): string {
    return fieldId(error.path);
  }

  protected goTo(event: Event, id: string): void {
    event.preventDefault();
    document.getElementById(id)?.focus();
  }

  private reachOf(view: ResultView) {
    const reach = reachOf(view, this.wallDistanceM());
    const { aid } = view.case;
    return aid ? { ...reach, aidName: `${aidName(aid)} optics` } : reach;
  }
}

function atRows(view: ResultView, distanceM: number) {
  const { eye, skin } = view.result;
  return {
    distance: formatQuantity(distanceM, 'm', 'nearest').text,
    eyeDensity: eye.at?.opticalDensity ?? 0,
    skinDensity: skin.at?.opticalDensity ?? 0,
    lines: view.lines.flatMap((line) =>
      line.eye.at
        ? [
            {
              wavelength: formatWavelength(line.beam.wavelengthNm).text,
              exposure: limitFigure(line.beam, line.eye.at),
              density: line.eye.at.opticalDensity,
              skinDensity: line.skin.at?.opticalDensity ?? 0,
            },
          ]
        : [],
    ),
  };
}
