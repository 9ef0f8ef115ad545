import { ChangeDetectionStrategy, Component, input, output, signal } from '@angular/core';
import { takeUntilDestroyed, toObservable } from '@angular/core/rxjs-interop';
import { MatButton } from '@angular/material/button';
import type { Problem } from '@shared/model/problem';
import { map, of, switchMap, timer } from 'rxjs';

/** Loading is silent for 300 ms, then lines; after 2 s a sentence and a way out. */
const LINES_AFTER_MS = 300;
const SENTENCE_AFTER_MS = 2000;

/** In place of a list's rows: being read, empty, or not readable. The heading stays above it. */
@Component({
  selector: 'lm-table-state',
  imports: [MatButton],
  templateUrl: './table-state.html',
  styleUrl: './table-state.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class TableState {
  readonly state = input.required<'loading' | 'empty' | 'error'>();
  readonly problem = input<Problem | null>(null);
  /** Shows a Cancel button once reading takes long. */
  readonly cancellable = input(false);

  readonly retry = output();
  readonly cancelled = output();

  protected readonly stage = signal<'silent' | 'lines' | 'sentence'>('silent');
  protected readonly lines = [1, 2, 3, 4, 5, 6];

  constructor() {
    toObservable(this.state)
      .pipe(
        switchMap((state) =>
          state === 'loading'
            ? timer(LINES_AFTER_MS, SENTENCE_AFTER_MS - LINES_AFTER_MS).pipe(
                map((tick) => (tick === 0 ? 'lines' : 'sentence') as 'lines' | 'sentence'),
              )
            : of('silent' as const),
        ),
        takeUntilDestroyed(),
      )
      .subscribe((stage) => this.stage.set(stage));
  }
}
