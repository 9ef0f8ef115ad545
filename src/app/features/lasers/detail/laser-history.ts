import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  linkedSignal,
} from '@angular/core';
import { MatButton } from '@angular/material/button';

import { KeysetList } from '../../../core/paging/keyset-list';
import { InstantPipe } from '../../../core/time/instant-pipe';
import { AuditEntryView } from '../../../ui/audit-entry/audit-entry-view';
import { TableState } from '../../../ui/table-state/table-state';
import { LasersApi } from '../lasers-api';

const FIRST_ROWS = 10;

/** What happened to the laser, newest first, with old and new values. */
@Component({
  selector: 'lm-laser-history',
  imports: [AuditEntryView, InstantPipe, MatButton, TableState],
  template: `
    <section aria-labelledby="laser-history">
      <div class="lm-section-head"><h2 id="laser-history">History</h2></div>
      <ol>
        @for (entry of entries.rows(); track entry.sequence) {
          <li><lm-audit-entry brief [entry]="entry" [at]="entry.at | lmInstant" /></li>
        }
      </ol>
      @if (entries.problem(); as problem) {
        <lm-table-state state="error" [problem]="problem" (retry)="entries.reload()" />
      } @else if (entries.isLoading()) {
        <lm-table-state state="loading" />
      }
      @if (entries.nextCount(); as count) {
        <button
          matButton="outlined"
          type="button"
          [disabled]="entries.isBusy()"
          (click)="entries.more()"
        >
          Show the next {{ count }}
        </button>
      }
    </section>
  `,
  styles: `
    section {
      display: grid;
      grid-template-columns: minmax(0, 1fr);
      gap: 8px;
      justify-items: start;

      > * {
        inline-size: 100%;
      }
    }

    ol {
      --lm-audit-time: minmax(0, 1fr);
    }

    lm-audit-entry {
      grid-template-columns: minmax(0, 1fr);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class LaserHistory {
  private readonly api = inject(LasersApi);

  readonly laserId = input.required<string>();
  /** A new version of the laser has new history. */
  readonly version = input.required<number>();

  protected readonly entries = new KeysetList({
    name: 'laser-history',
    query: computed(() => ({ id: this.laserId(), version: this.version() })),
    shown: linkedSignal({ source: this.laserId, computation: () => FIRST_ROWS }),
    load: ({ id }, range) => this.api.history(id, range),
  });
}
