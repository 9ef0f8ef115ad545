import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import type { LaserImport } from '@shared/model/laser-imports';

import { Icon } from '../../../ui/icon/icon';
import { ListTable } from '../../../ui/list-table/list-table';

/** What the dry run found, row by row, and what was stored in the end. */
@Component({
  selector: 'lm-import-report',
  imports: [Icon, ListTable, MatButton, RouterLink],
  templateUrl: './import-report.html',
  styleUrl: './import-report.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ImportReport {
  readonly report = input.required<LaserImport>();
  readonly isBusy = input(false);

  readonly saved = output();
  readonly canceled = output();
  readonly again = output();
  readonly errorsDownloaded = output();

  protected readonly percent = computed(() => {
    const { rowsDone, rowsTotal } = this.report();
    return rowsTotal === 0 ? 0 : Math.round((100 * rowsDone) / rowsTotal);
  });
  protected readonly lasers = computed(() => count(this.report().lasers, 'laser'));
  protected readonly badRows = computed(
    () => new Set(this.report().errors.map(({ row }) => row)).size,
  );
  protected readonly head = computed(() => {
    const { status, errorCount } = this.report();
    switch (status) {
      case 'checking':
        return 'Dry run: reading the rows';
      case 'checked':
        return errorCount > 0
          ? `${count(errorCount, 'error')} in the file`
          : `Every row is right: ${this.lasers()} can be saved`;
      case 'saving':
        return 'Saving';
      case 'saved':
        return `${this.lasers()} saved`;
      case 'failed':
        return 'The import failed; nothing was stored';
      case 'canceled':
        return 'Canceled; nothing was stored';
    }
  });
}

function count(number: number, word: string): string {
  return `${number.toLocaleString('en-US')} ${word}${number === 1 ? '' : 's'}`;
}
