import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import type { TodayItem } from '@shared/model/today';

import { asProblem } from '../../core/http/problem-error';
import { CurrentSession } from '../../core/session/current-session';
import { SiteDatePipe } from '../../core/time/site-date-pipe';
import { Icon } from '../../ui/icon/icon';
import { type ChipState, StateChip } from '../../ui/state-chip/state-chip';
import { TableState } from '../../ui/table-state/table-state';
import { todayResource } from './today-api';

type Kind = TodayItem['kind'];
type Group = 'worse' | 'decision' | 'soon';

interface KindWords {
  readonly group: Group;
  readonly chip: ChipState;
  readonly word: string;
  readonly action: string;
}

const KINDS: Readonly<Record<Kind, KindWords>> = {
  stale: { group: 'worse', chip: 'stale', word: 'Evaluation stale', action: 'Look again' },
  blocked: { group: 'worse', chip: 'blocked', word: 'Blocked', action: 'Open laser' },
  'not-evaluated': {
    group: 'worse',
    chip: 'registered',
    word: 'Not evaluated',
    action: 'Open laser',
  },
  sign: { group: 'decision', chip: 'checked', word: 'Checked', action: 'Read, sign' },
  check: { group: 'decision', chip: 'in-check', word: 'In check', action: 'Read, check' },
  returned: { group: 'decision', chip: 'draft', word: 'Returned', action: 'Go on writing' },
  'laser-check': {
    group: 'decision',
    chip: 'registered',
    word: 'To be checked',
    action: 'Open laser',
  },
  'waiver-ends': { group: 'soon', chip: 'review-due', word: 'Waiver ends', action: 'Open laser' },
  'review-due': { group: 'soon', chip: 'review-due', word: 'Review due', action: 'Review' },
};

const GROUPS: readonly { group: Group; title: string; note: string }[] = [
  { group: 'worse', title: 'Got worse, or stands open', note: 'sorted by consequence' },
  { group: 'decision', title: 'Waits for your signature or decision', note: 'oldest first' },
  { group: 'soon', title: 'Ends soon', note: '' },
];

/** What waits for the signed-in person; every count equals the rows below it. */
@Component({
  selector: 'lm-today-page',
  imports: [Icon, MatButton, RouterLink, SiteDatePipe, StateChip, TableState],
  templateUrl: './today-page.html',
  styleUrl: './today-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class TodayPage {
  protected readonly site = inject(CurrentSession).site;
  protected readonly resource = todayResource();
  protected readonly problem = computed(() => {
    const error = this.resource.error();
    return error ? asProblem(error) : null;
  });
  protected readonly items = computed(() =>
    this.resource.hasValue() ? this.resource.value().items : null,
  );
  protected readonly groups = computed(() =>
    GROUPS.map(({ group, title, note }) => ({
      title,
      note,
      rows: (this.items() ?? [])
        .filter((item) => KINDS[item.kind].group === group)
        .map((item) => ({ item, words: KINDS[item.kind], link: linkOf(item) })),
    })).filter(({ rows }) => rows.length > 0),
  );
  /** Two primary buttons at most: what got worse first, and the oldest signature. */
  protected readonly primary = computed(
    () =>
      new Set(
        this.groups()
          .slice(0, 2)
          .map(({ rows }) => rows[0]?.item),
      ),
  );
  protected readonly now = new Date().toISOString();

  protected words(count: number): string {
    return count === 1 ? 'one thing waits for you' : `${count} things wait for you`;
  }
}

function linkOf({ recordKind, recordId }: TodayItem): string[] {
  return [recordKind === 'evaluation' ? '/evaluations' : '/lasers', recordId];
}
