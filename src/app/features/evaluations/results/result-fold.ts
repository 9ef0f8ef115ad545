import { BreakpointObserver } from '@angular/cdk/layout';
import { ChangeDetectionStrategy, Component, inject, input, signal } from '@angular/core';

/** A part of the results under its heading; closed at first where the screen is narrow. */
@Component({
  selector: 'lm-result-fold',
  template: `
    <details [open]="isOpen()" (toggle)="isOpen.set(details.open)" #details>
      <summary>
        <h2>{{ heading() }}</h2>
        @if (note()) {
          <span class="lm-label">{{ note() }}</span>
        }
      </summary>
      <ng-content />
    </details>
  `,
  styleUrl: './result-fold.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ResultFold {
  readonly heading = input.required<string>();
  readonly note = input('');

  protected readonly isOpen = signal(!inject(BreakpointObserver).isMatched('(max-width: 599px)'));
}
