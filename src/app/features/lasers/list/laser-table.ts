import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import { RouterLink } from '@angular/router';
import type { LaserListQuery, LaserRow } from '@shared/model/lasers';
import { formatFull, formatOpticalDensity, formatQuantity } from '@shared/model/quantity-format';
import { LASER_STATE_WORDS } from '@shared/workflow/laser-life-cycle';

import { LineSwatch } from '../../../ui/line-swatch/line-swatch';
import { ListTable } from '../../../ui/list-table/list-table';
import { SortHead, type Sorting } from '../../../ui/list-table/sort-head';
import { ReachAxis } from '../../../ui/reach-strip/reach-axis';
import { ReachStrip } from '../../../ui/reach-strip/reach-strip';
import { StateChip } from '../../../ui/state-chip/state-chip';
import { reachDistances } from '../reach-distances';

/** Lasers in rows, each with its reach under one axis. */
@Component({
  selector: 'lm-laser-table',
  imports: [LineSwatch, ListTable, ReachAxis, ReachStrip, RouterLink, SortHead, StateChip],
  templateUrl: './laser-table.html',
  styleUrl: './laser-table.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class LaserTable {
  readonly rows = input.required<readonly LaserRow[]>();
  readonly sorting = input.required<Sorting<LaserListQuery['sort']>>();
  readonly isBusy = input(false);

  readonly sortingChange = output<Sorting<LaserListQuery['sort']>>();

  protected readonly lasers = computed(() => this.rows().map(viewOf));
}

function viewOf(row: LaserRow) {
  const { reach, attention } = row;
  // The chip has said its own word.
  const waits = attention.filter((words) => words !== LASER_STATE_WORDS[row.state]);
  const summaries = [...new Set(row.lines.map((line) => line.summary))];
  return {
    ...row,
    name: `${row.maker} ${row.model}`,
    strip: reachDistances(reach, row.wallDistanceM),
    isNowhere: reach?.eyeDistanceM === 0,
    // Plain text: a control for each number would make a list long to walk by Tab.
    distance: reach && formatQuantity(reach.eyeDistanceM, 'm', 'up'),
    density: reach ? formatOpticalDensity(reach.opticalDensity) : '–',
    duration: reach ? `at ${formatFull(reach.eyeS, 's')}` : '',
    summary: summaries.length > 2 ? `${summaries.length} emissions` : summaries.join('; '),
    class: row.verifiedClass ?? row.declaredClass,
    waits: waits[0],
    more: waits.length > 1 ? `and ${waits.length - 1} more` : '',
    allThatWaits: waits.join(' · '),
    isStale: reach?.state === 'stale',
    // Chips that touch take less room; which lines are on together stands on the laser's page.
    isMany: row.lines.length > 3,
  };
}
