import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { BeamResult, Side } from '@shared/hazard/result';
import { formatQuantity } from '@shared/model/quantity-format';
import {
  type LimitFigure,
  limitFigure,
  type LineView,
  type ResultView,
  totalPowerW,
} from '@shared/model/result-view';
import { emissionWords, MECHANISM_WORDS, RULE_WORDS } from '@shared/text/hazard-words';

import { LineSwatch } from '../../../ui/line-swatch/line-swatch';
import { ListTable } from '../../../ui/list-table/list-table';
import { Quantity } from '../../../ui/quantity/quantity';

interface Row {
  readonly line: LineView;
  readonly emission: string;
  readonly limit: LimitFigure;
  readonly why: string;
  readonly exposure: LimitFigure;
  readonly density: number;
  readonly aloneM: number;
}

/** Each line against its limit, then all of them together, for one side. */
@Component({
  selector: 'lm-line-table',
  imports: [LineSwatch, ListTable, Quantity],
  templateUrl: './line-table.html',
  styleUrl: './line-table.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class LineTable {
  readonly view = input.required<ResultView>();
  readonly side = input.required<Side>();

  protected readonly rows = computed<Row[]>(() =>
    this.view().lines.map((line) => rowOf(line, this.side())),
  );
  protected readonly together = computed(() => this.view().result[this.side()]);
  protected readonly totalPower = computed(() => {
    const watts = totalPowerW(this.view());
    return watts === undefined ? '' : `${formatQuantity(watts, 'W', 'nearest').text} mean power`;
  });
}

function rowOf(line: LineView, side: Side): Row {
  const result: BeamResult = line[side];
  return {
    line,
    emission: emissionWords(line.beam),
    limit: limitFigure(line.beam, result.mpe),
    why: `${RULE_WORDS[result.mpe.rule]}, ${MECHANISM_WORDS[result.mpe.mechanism]}`,
    exposure: limitFigure(line.beam, result.exposure),
    density: result.opticalDensity,
    aloneM: side === 'eye' ? line.eyeAloneM : line.skinAloneM,
  };
}
