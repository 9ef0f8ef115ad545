import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';

import type { FieldChange } from './changed-fields';
import { fieldWords } from './field-words';
import { valueWords } from './value-words';

/** Fields that differ between two versions of a record, old and new value side by side. */
@Component({
  selector: 'lm-change-list',
  template: `
    <table>
      <thead>
        <tr>
          <th scope="col">Field</th>
          <th scope="col">{{ beforeHead() }}</th>
          <th scope="col">{{ afterHead() }}</th>
        </tr>
      </thead>
      <tbody>
        @for (row of rows(); track $index) {
          <tr>
            <th scope="row">{{ row.words }}</th>
            <td [attr.data-head]="beforeHead()">{{ row.before }}</td>
            <td [attr.data-head]="afterHead()" class="after">{{ row.after }}</td>
          </tr>
        }
      </tbody>
    </table>
  `,
  styleUrl: './change-list.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ChangeList {
  readonly changes = input.required<readonly FieldChange[]>();
  readonly beforeHead = input('Before');
  readonly afterHead = input('After');

  protected readonly rows = computed(() =>
    this.changes().map(({ field, before, after }) => ({
      words: fieldWords(field) || field,
      before: valueWords(before, field),
      after: valueWords(after, field),
    })),
  );
}
