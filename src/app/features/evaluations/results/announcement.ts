import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { toObservable, toSignal } from '@angular/core/rxjs-interop';
import { formatQuantity, spokenUnit } from '@shared/model/quantity-format';
import { debounceTime, map, skip } from 'rxjs';

import type { Outcome } from './outcome';

/** Says the result to those who do not see it, once typing has ended. */
@Component({
  selector: 'lm-announcement',
  template: '<p class="lm-unseen" role="status">{{ words() }}</p>',
  // Takes no place in the grid of the bench.
  styles: ':host { position: absolute; }',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Announcement {
  readonly outcome = input.required<Outcome>();

  protected readonly words = toSignal(
    toObservable(this.outcome).pipe(skip(1), debounceTime(1000), map(wordsOf)),
    { initialValue: '' },
  );
}

function wordsOf({ view, isCurrent, errors }: Outcome): string {
  if (!isCurrent) return errors[0] ? `Inputs need correction: ${errors[0].message}` : '';
  const meters = view?.result.eye.hazardDistanceM ?? 0;
  if (meters === 0) return 'Eye: nowhere above the limit';
  const { number, unit } = formatQuantity(meters, 'm', 'up');
  return `Eye hazard distance ${number} ${spokenUnit(unit)}`;
}
