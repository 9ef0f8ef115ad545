import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  output,
  signal,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatMenu, MatMenuItem, MatMenuTrigger } from '@angular/material/menu';
import { LASER_CLASSES, type LaserFilter, type LaserPage } from '@shared/model/lasers';
import { LASER_STATE_WORDS, LASER_STATES } from '@shared/workflow/laser-life-cycle';

import { Icon } from '../../../ui/icon/icon';
import { ReachLegend } from '../../../ui/reach-strip/reach-legend';
import { SearchBox } from '../../../ui/search-box/search-box';
import { AreasApi, type AreaPage } from '../../areas/areas-api';
import { bandWords, WAVELENGTH_BANDS } from './wavelength-bands';

type Counts = LaserPage['counts'];

const ATTENTION = [
  { value: undefined, words: 'All', count: (counts: Counts) => counts.all },
  { value: 'any', words: 'Needs attention', count: (counts: Counts) => counts.attention },
  { value: 'blocked', words: 'Blocked', count: (counts: Counts) => counts.blocked },
  { value: 'stale', words: 'Stale', count: (counts: Counts) => counts.stale },
  {
    value: 'not-evaluated',
    words: 'Not evaluated',
    count: (counts: Counts) => counts.notEvaluated,
  },
] as const;

/** What narrows the list: chips with counts, menus, a wavelength, words. */
@Component({
  selector: 'lm-laser-filters',
  imports: [Icon, MatButton, MatMenu, MatMenuItem, MatMenuTrigger, ReachLegend, SearchBox],
  templateUrl: './laser-filters.html',
  styleUrl: './laser-filters.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class LaserFilters {
  private readonly areasApi = inject(AreasApi);

  readonly filter = input.required<LaserFilter>();
  readonly counts = input.required<Counts | null>();

  readonly filterChange = output<LaserFilter>();

  protected readonly attention = ATTENTION;
  protected readonly classes = LASER_CLASSES;
  protected readonly states = LASER_STATES.map((state) => ({
    state,
    words: LASER_STATE_WORDS[state],
  }));
  protected readonly bands = WAVELENGTH_BANDS;
  protected readonly areas = signal<AreaPage['rows']>([]);
  protected readonly isOwnBandOpen = signal(false);

  protected readonly areaWords = computed(() => {
    const { areaId } = this.filter();
    if (!areaId) return '';
    return this.areas().find((area) => area.id === areaId)?.code ?? 'one area';
  });
  protected readonly stateWords = computed(() => {
    const { state } = this.filter();
    return state ? LASER_STATE_WORDS[state] : '';
  });
  protected readonly bandWords = computed(() =>
    bandWords(this.filter().fromNm, this.filter().toNm),
  );
  protected readonly isNarrowed = computed(() => Object.keys(this.filter()).length > 0);

  constructor() {
    // A failure here only leaves the menu short; the list itself says what is wrong.
    this.areasApi.list({ limit: 200 }).subscribe({
      next: (page) => this.areas.set(page.rows),
      error: () => this.areas.set([]),
    });
  }

  protected set(part: Partial<LaserFilter>): void {
    const merged = Object.entries({ ...this.filter(), ...part });
    const filter = Object.fromEntries(
      merged.filter(([, value]) => value !== undefined && value !== ''),
    );
    this.filterChange.emit(filter);
  }

  protected setOwnBand(event: Event, fromText: string, toText: string): void {
    event.preventDefault();
    this.set({ fromNm: nanometers(fromText), toNm: nanometers(toText) });
    this.isOwnBandOpen.set(false);
  }
}

function nanometers(text: string): number | undefined {
  const value = Number(text);
  return text.trim() !== '' && value >= 180 && value <= 1e6 ? value : undefined;
}
