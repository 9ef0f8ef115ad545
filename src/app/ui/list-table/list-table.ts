import { ChangeDetectionStrategy, Component, ViewEncapsulation } from '@angular/core';

/** On a `table`: a list that lies on the paper, with hairlines between rows. */
@Component({
  selector: 'table[lmListTable]',
  template: '<ng-content />',
  styleUrl: './list-table.scss',
  // The rows come from the page that uses it.
  encapsulation: ViewEncapsulation.None,
  host: { class: 'lm-list-table' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ListTable {}
