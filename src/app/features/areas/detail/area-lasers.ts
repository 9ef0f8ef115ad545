import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  linkedSignal,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import { formatFull } from '@shared/model/quantity-format';

import { KeysetList, PAGE_ROWS } from '../../../core/paging/keyset-list';
import { LineSwatch } from '../../../ui/line-swatch/line-swatch';
import { ListTable } from '../../../ui/list-table/list-table';
import { Quantity } from '../../../ui/quantity/quantity';
import { ReachAxis } from '../../../ui/reach-strip/reach-axis';
import { ReachStrip } from '../../../ui/reach-strip/reach-strip';
import { StateChip } from '../../../ui/state-chip/state-chip';
import { TableState } from '../../../ui/table-state/table-state';
import { LasersApi } from '../../lasers/lasers-api';

/** The lasers of one room with their reach, worst first. */
@Component({
  selector: 'lm-area-lasers',
  imports: [
    LineSwatch,
    ListTable,
    MatButton,
    Quantity,
    ReachAxis,
    ReachStrip,
    RouterLink,
    StateChip,
    TableState,
  ],
  templateUrl: './area-lasers.html',
  styleUrl: './area-lasers.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class AreaLasers {
  private readonly api = inject(LasersApi);

  readonly areaId = input.required<string>();
  readonly areaCode = input.required<string>();

  protected readonly lasers = new KeysetList({
    name: 'area-lasers',
    query: computed(
      () => ({ areaId: this.areaId(), sort: 'eye-distance', order: 'desc' }) as const,
    ),
    shown: linkedSignal({ source: this.areaId, computation: () => PAGE_ROWS }),
    load: (query, range) => this.api.list({ ...query, ...range }),
  });

  protected durationOf(eyeS: number): string {
    return formatFull(eyeS, 's');
  }
}
