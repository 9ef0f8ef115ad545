import { ChangeDetectionStrategy, Component, computed, input, signal } from '@angular/core';
import { formatQuantity } from '@shared/model/quantity-format';
import { placeCautions } from '@shared/text/place-cautions';

import { Icon } from '../../../ui/icon/icon';
import { Candidates } from './candidates';
import { CaseTools } from './case-tools';
import { Derivation } from './derivation';
import type { Outcome } from './outcome';
import { ResultFold } from './result-fold';

/** What a result rests on: the derivation, the limits considered, and what to be careful about. */
@Component({
  selector: 'lm-result-grounds',
  imports: [Candidates, CaseTools, Derivation, Icon, ResultFold],
  templateUrl: './result-grounds.html',
  styleUrl: './result-grounds.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ResultGrounds {
  readonly outcome = input.required<Outcome>();
  readonly wallDistanceM = input<number>();
  /** Assumptions that the author wrote. */
  readonly ownAssumptions = input<readonly string[]>([]);
  readonly offersFreeBench = input(true);

  protected readonly showsCandidates = signal(false);
  protected readonly heading = computed(() => {
    const distanceM = this.outcome().view?.result.eye.hazardDistanceM ?? 0;
    return distanceM > 0
      ? `How ${formatQuantity(distanceM, 'm', 'up').text} was found`
      : 'How this was found';
  });
  protected readonly warnings = computed(() => this.outcome().view?.result.warnings ?? []);
  protected readonly cautions = computed(() => this.outcome().view?.result.cautions ?? []);
  protected readonly ofPlace = computed(() => {
    const { view } = this.outcome();
    return view ? placeCautions(view.result, this.wallDistanceM()) : [];
  });
  protected readonly assumed = computed(() => [
    ...this.outcome().assumptions,
    ...this.ownAssumptions(),
  ]);
}
