import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';

import { Icon } from '../icon/icon';

export interface Sorting<Column extends string> {
  readonly sort: Column;
  readonly order: 'asc' | 'desc';
}

/** A column's head that sorts by it, and turns the order when it does already. */
@Component({
  selector: 'th[lmSortHead]',
  imports: [Icon],
  template: `
    <button type="button" (click)="choose()">
      <ng-content />
      <lm-icon [name]="sorting().order === 'asc' ? 'up' : 'down'" />
    </button>
  `,
  styles: `
    button {
      display: inline-flex;
      align-items: flex-end;
      gap: 2px;
      min-block-size: 24px;
      padding: 0;
      border: 0;
      border-radius: 3px;
      background: none;
      font: inherit;
      color: inherit;
      text-align: inherit;
      cursor: pointer;
      --lm-icon-size: 14px;

      &:hover {
        color: var(--lm-ink);
        text-decoration: underline;
        text-underline-offset: 3px;
      }
    }

    lm-icon {
      visibility: hidden;
      margin-block-end: 2px;
    }

    :host(.sorted) {
      color: var(--lm-ink);

      lm-icon {
        visibility: visible;
      }
    }
  `,
  host: { scope: 'col', '[class.sorted]': 'isSorted()', '[attr.aria-sort]': 'ariaSort()' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SortHead<Column extends string> {
  readonly column = input.required<Column>({ alias: 'lmSortHead' });
  readonly sorting = input.required<Sorting<Column>>();

  readonly sortingChange = output<Sorting<Column>>();

  protected readonly isSorted = computed(() => this.sorting().sort === this.column());
  protected readonly ariaSort = computed(() => {
    if (!this.isSorted()) return null;
    return this.sorting().order === 'asc' ? 'ascending' : 'descending';
  });

  protected choose(): void {
    const order = this.isSorted() && this.sorting().order === 'asc' ? 'desc' : 'asc';
    this.sortingChange.emit({ sort: this.column(), order });
  }
}
