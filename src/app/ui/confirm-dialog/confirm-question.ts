import { ChangeDetectionStrategy, Component, computed, inject, signal } from '@angular/core';
import { MatButton } from '@angular/material/button';
import {
  MAT_DIALOG_DATA,
  MatDialogActions,
  MatDialogContent,
  MatDialogRef,
  MatDialogTitle,
} from '@angular/material/dialog';

/** What is asked, and the words on the button that does it. */
export interface Question {
  readonly title: string;
  readonly text: string;
  readonly action: string;
  /** Asks for a reason of at least this many characters, which is kept with the record. */
  readonly reason?: { readonly label: string; readonly minLength: number };
}

@Component({
  selector: 'lm-confirm-question',
  imports: [MatButton, MatDialogActions, MatDialogContent, MatDialogTitle],
  templateUrl: './confirm-question.html',
  styleUrl: './confirm-question.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ConfirmQuestion {
  private readonly dialog = inject<MatDialogRef<ConfirmQuestion, { reason: string }>>(MatDialogRef);

  protected readonly question = inject<Question>(MAT_DIALOG_DATA);
  protected readonly tried = signal(false);
  protected readonly reason = signal('');
  protected readonly error = computed(() => {
    const least = this.question.reason?.minLength ?? 0;
    const length = this.reason().trim().length;
    if (!this.tried() || length >= least) return '';
    return `Give a reason of at least ${least} characters; it is kept with the record.`;
  });

  protected answer(event: Event): void {
    event.preventDefault();
    this.tried.set(true);
    if (this.error() === '') this.dialog.close({ reason: this.reason().trim() });
  }

  protected cancel(): void {
    this.dialog.close();
  }
}
