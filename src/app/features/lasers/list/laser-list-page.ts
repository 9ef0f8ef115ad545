import { ChangeDetectionStrategy, Component, computed, inject, linkedSignal } from '@angular/core';
import { toSignal } from '@angular/core/rxjs-interop';
import { MatButton } from '@angular/material/button';
import { MatMenu, MatMenuItem, MatMenuTrigger } from '@angular/material/menu';
import { ActivatedRoute, RouterLink } from '@angular/router';
import { ruleSetById } from '@shared/hazard/rule-sets';
import type { LaserFilter, LaserListQuery } from '@shared/model/lasers';
import { scopeOf } from '@shared/permissions/permissions';

import { keepInAddress } from '../../../core/paging/keep-in-address';
import { KeysetList, PAGE_ROWS } from '../../../core/paging/keyset-list';
import { CurrentSession } from '../../../core/session/current-session';
import { CautionLine } from '../../../ui/caution-line/caution-line';
import { Icon } from '../../../ui/icon/icon';
import type { Sorting } from '../../../ui/list-table/sort-head';
import { TableState } from '../../../ui/table-state/table-state';
import { settingsResource } from '../../settings/settings-api';
import { csvAddress, LasersApi } from '../lasers-api';
import { LaserFilters } from './laser-filters';
import { type AddressParams, readListState, writeListState } from './laser-list-query';
import { LaserTable } from './laser-table';

const SORT_WORDS: Readonly<Record<LaserListQuery['sort'], string>> = {
  attention: 'ordered by what waits, then by tag',
  tag: 'ordered by tag',
  maker: 'ordered by maker',
  area: 'ordered by area',
  class: 'ordered by class',
  wavelength: 'ordered by wavelength',
  'eye-distance': 'ordered by eye hazard distance',
  'optical-density': 'ordered by optical density',
  state: 'ordered by state',
};

/** The register: every laser with its reach, what waits first. */
@Component({
  selector: 'lm-laser-list-page',
  imports: [
    CautionLine,
    Icon,
    LaserFilters,
    LaserTable,
    MatButton,
    MatMenu,
    MatMenuItem,
    MatMenuTrigger,
    RouterLink,
    TableState,
  ],
  templateUrl: './laser-list-page.html',
  styleUrl: './laser-list-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class LaserListPage {
  private readonly api = inject(LasersApi);
  private readonly route = inject(ActivatedRoute);
  private readonly user = inject(CurrentSession).user;
  private readonly settings = settingsResource();

  private readonly address = toSignal(this.route.queryParams, {
    initialValue: this.route.snapshot.queryParams,
  });
  private readonly state = linkedSignal(() => readListState(this.address() as AddressParams));
  private readonly shown = linkedSignal(() => this.state().rows);
  protected readonly filter = computed(() => this.state().filter);
  protected readonly sorting = computed<Sorting<LaserListQuery['sort']>>(() => ({
    sort: this.state().sort,
    order: this.state().order,
  }));

  protected readonly lasers = new KeysetList({
    name: 'lasers',
    query: computed(() => ({ ...this.filter(), ...this.sorting() })),
    shown: this.shown,
    load: (query, range) => this.api.list({ ...query, ...range }),
  });
  protected readonly counts = computed(() => this.lasers.page()?.counts ?? null);
  protected readonly sortWords = computed(() => SORT_WORDS[this.sorting().sort]);
  protected readonly csv = computed(() => csvAddress(this.filter()));
  protected readonly isFiltered = computed(() => Object.keys(this.filter()).length > 0);
  protected readonly mayRegister = computed(() => this.may('laser.register'));
  protected readonly mayImport = computed(() => this.may('laser.import'));
  /** The editions that the results on the page were made with; the site's own without results. */
  protected readonly editions = computed(() => {
    const used = this.lasers.rows().flatMap((row) => row.reach?.ruleSet ?? []);
    const ofSite = this.settings.hasValue() ? [this.settings.value().ruleSet] : [];
    const ids = new Set(used.length ? used : ofSite);
    return [...ids].map((id) => ruleSetById(id).edition).join(', ');
  });

  constructor() {
    keepInAddress(() => writeListState({ ...this.state(), rows: this.shown() }));
  }

  protected narrow(filter: LaserFilter): void {
    this.state.update((state) => ({ ...state, filter, rows: PAGE_ROWS }));
  }

  protected sortBy(sorting: Sorting<LaserListQuery['sort']>): void {
    this.state.update((state) => ({ ...state, ...sorting, rows: PAGE_ROWS }));
  }

  private may(action: 'laser.register' | 'laser.import'): boolean {
    return scopeOf(action, this.user()?.roles ?? []) !== undefined;
  }
}
