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
import { scopeOf } from '@shared/permissions/permissions';

import { keepInAddress } from '../../../core/paging/keep-in-address';
import { KeysetList, PAGE_ROWS } from '../../../core/paging/keyset-list';
import { CurrentSession } from '../../../core/session/current-session';
import { Icon } from '../../../ui/icon/icon';
import { ListTable } from '../../../ui/list-table/list-table';
import { Quantity } from '../../../ui/quantity/quantity';
import { SearchBox } from '../../../ui/search-box/search-box';
import { TableState } from '../../../ui/table-state/table-state';
import { AreasApi } from '../areas-api';

/** The rooms with lasers in them. */
@Component({
  selector: 'lm-area-list-page',
  imports: [Icon, ListTable, MatButton, Quantity, RouterLink, SearchBox, TableState],
  templateUrl: './area-list-page.html',
  styleUrl: './area-list-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class AreaListPage {
  private readonly api = inject(AreasApi);
  private readonly user = inject(CurrentSession).user;

  readonly q = input<string>();
  readonly rows = input<string>();

  protected readonly search = linkedSignal(() => this.q() ?? '');
  private readonly shown = linkedSignal(() => Number(this.rows()) || PAGE_ROWS);

  protected readonly areas = new KeysetList({
    name: 'areas',
    query: computed(() => ({ q: this.search() })),
    shown: this.shown,
    load: (query, range) => this.api.list({ ...query, ...range }),
  });
  protected readonly mayCreate = computed(
    () => scopeOf('area.create', this.user()?.roles ?? []) !== undefined,
  );

  constructor() {
    keepInAddress(() => ({
      q: this.search() || null,
      rows: this.shown() > PAGE_ROWS ? this.shown() : null,
    }));
  }

  protected find(text: string): void {
    this.search.set(text);
    this.shown.set(PAGE_ROWS);
  }
}
