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
import { type Role, ROLE_WORDS, ROLES, roleSchema } from '@shared/model/people';
import { scopeOf } from '@shared/permissions/permissions';

import { keepInAddress } from '../../../core/paging/keep-in-address';
import { KeysetList, PAGE_ROWS } from '../../../core/paging/keyset-list';
import { CurrentSession } from '../../../core/session/current-session';
import { Icon } from '../../../ui/icon/icon';
import { ListTable } from '../../../ui/list-table/list-table';
import { SearchBox } from '../../../ui/search-box/search-box';
import { TableState } from '../../../ui/table-state/table-state';
import { PeopleApi } from '../people-api';

/** Everyone with an account, and what each may do. */
@Component({
  selector: 'lm-person-list-page',
  imports: [Icon, ListTable, MatButton, RouterLink, SearchBox, TableState],
  templateUrl: './person-list-page.html',
  styleUrl: './person-list-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PersonListPage {
  private readonly api = inject(PeopleApi);
  private readonly user = inject(CurrentSession).user;

  readonly q = input<string>();
  readonly role = input<string>();
  readonly rows = input<string>();

  protected readonly search = linkedSignal(() => this.q() ?? '');
  protected readonly chosenRole = linkedSignal<Role | ''>(
    () => roleSchema.safeParse(this.role()).data ?? '',
  );
  private readonly shown = linkedSignal(() => Number(this.rows()) || PAGE_ROWS);

  protected readonly people = new KeysetList({
    name: 'people',
    query: computed(() => ({ q: this.search(), role: this.chosenRole() || undefined })),
    shown: this.shown,
    load: (query, range) => this.api.list({ ...query, ...range }),
  });
  protected readonly roles = ROLES.map((role) => ({ role, words: ROLE_WORDS[role] }));
  protected readonly isFiltered = computed(() => this.search() !== '' || this.chosenRole() !== '');
  protected readonly mayCreate = computed(
    () => scopeOf('person.create', this.user()?.roles ?? []) !== undefined,
  );

  constructor() {
    keepInAddress(() => ({
      q: this.search() || null,
      role: this.chosenRole() || null,
      rows: this.shown() > PAGE_ROWS ? this.shown() : null,
    }));
  }

  protected find(text: string): void {
    this.search.set(text);
    this.shown.set(PAGE_ROWS);
  }

  protected chooseRole(role: string): void {
    this.chosenRole.set(roleSchema.safeParse(role).data ?? '');
    this.shown.set(PAGE_ROWS);
  }

  protected clear(): void {
    this.chooseRole('');
    this.find('');
  }

  protected wordsOf(roles: readonly Role[]): string {
    return roles.map((role) => ROLE_WORDS[role]).join(', ') || 'no role';
  }
}
