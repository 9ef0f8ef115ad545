import { ChangeDetectionStrategy, Component, inject, output } from '@angular/core';
import { toSignal } from '@angular/core/rxjs-interop';
import { MatButton } from '@angular/material/button';
import type { Problem } from '@shared/model/problem';
import { catchError, map, type Observable, of, startWith } from 'rxjs';

import { asProblem } from '../../core/http/problem-error';
import { Icon } from '../../ui/icon/icon';
import { ProblemPanel } from '../../ui/problem-panel/problem-panel';
import { RecordsApi, type TrailVerification } from './records-api';

interface CheckState {
  readonly result?: TrailVerification;
  readonly problem?: Problem;
}

/** Recomputes every hash of the trail on the server, and says what came of it. */
@Component({
  selector: 'lm-trail-check',
  imports: [Icon, MatButton, ProblemPanel],
  template: `
    @let now = state();
    <div role="status" class="text">
      @if (now.result; as result) {
        @if (result.firstBad; as bad) {
          <h2><lm-icon name="barred" />The trail is not intact</h2>
          <p>Entry {{ bad.sequence }}: {{ bad.problem }}</p>
          <p>Nothing after it can be trusted. Tell the laser safety officer and keep a copy.</p>
        } @else if (result.intact) {
          <h2><lm-icon name="check" />The trail is intact</h2>
          <p>
            {{ result.entries }} entries, each chained to the one before, and
            {{ result.checkpoints }} signed checkpoints agree.
          </p>
          <p class="lm-label hash">Head {{ result.headHash }}</p>
        } @else {
          <h2><lm-icon name="barred" />The trail is not intact</h2>
          <p>Its end does not meet the last signed checkpoint: entries are missing.</p>
        }
      } @else if (!now.problem) {
        <h2>Verifying…</h2>
        <p>Every entry's hash is computed again.</p>
      }
    </div>
    @if (now.problem; as problem) {
      <lm-problem-panel [problem]="problem" />
    }
    <button matButton type="button" (click)="closed.emit()">Close</button>
  `,
  styles: `
    :host {
      display: flex;
      align-items: flex-start;
      gap: 16px;
      padding: 14px 18px;
      border: 1px solid var(--lm-edge);
      border-radius: 6px;
      background: var(--lm-sheet);
    }

    :host(.bad) {
      border-color: var(--lm-stop);
      background: var(--lm-stop-ground);
    }

    .text {
      flex: 1;
      display: grid;
      gap: 4px;
    }

    .text:empty {
      display: none;
    }

    h2 {
      display: flex;
      align-items: center;
      gap: 8px;
      font: var(--lm-title-part);
    }

    .hash {
      overflow-wrap: anywhere;
    }
  `,
  host: { '[class.bad]': 'state().result?.intact === false' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class TrailCheck {
  readonly closed = output();

  protected readonly state = toSignal(checkState(inject(RecordsApi).verify()), {
    requireSync: true,
  });
}

function checkState(verification: Observable<TrailVerification>): Observable<CheckState> {
  return verification.pipe(
    map((result): CheckState => ({ result })),
    catchError((error: unknown) => of({ problem: asProblem(error) })),
    startWith({}),
  );
}
