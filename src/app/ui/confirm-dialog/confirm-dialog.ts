import { inject, Injectable } from '@angular/core';
import { MatDialog } from '@angular/material/dialog';
import { map, type Observable } from 'rxjs';

import { ConfirmQuestion, type Question } from './confirm-question';

/** Asks before an act that cannot be undone, and for its reason where one is kept. */
@Injectable({ providedIn: 'root' })
export class ConfirmDialog {
  private readonly dialog = inject(MatDialog);

  /** Emits once: the answer, or null when the person turned back. */
  ask(question: Question): Observable<{ readonly reason: string } | null> {
    return this.dialog
      .open<ConfirmQuestion, Question, { reason: string }>(ConfirmQuestion, {
        data: question,
        width: '520px',
        autoFocus: 'first-tabbable',
      })
      .afterClosed()
      .pipe(map((answer) => answer ?? null));
  }
}
