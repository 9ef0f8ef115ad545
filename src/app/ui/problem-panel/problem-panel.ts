import {
  afterNextRender,
  booleanAttribute,
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  ElementRef,
  inject,
  Injector,
  input,
  output,
} from '@angular/core';
import type { FieldError, Problem } from '@shared/model/problem';

import { fieldId } from '../field/field-id';
import { Icon } from '../icon/icon';

/**
 * What stands in the way: heading, reasons, and a link to each field that needs correction.
 * Takes the focus when a new problem appears.
 */
@Component({
  selector: 'lm-problem-panel',
  imports: [Icon],
  templateUrl: './problem-panel.html',
  styleUrl: './problem-panel.scss',
  host: { role: 'alert', tabindex: '-1' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ProblemPanel {
  private readonly host = inject<ElementRef<HTMLElement>>(ElementRef);
  private readonly injector = inject(Injector);

  readonly problem = input<Problem | null>(null);
  /** Errors found in the browser, shown like those of the server. */
  readonly errors = input<readonly FieldError[]>([]);
  readonly heading = input('');
  readonly dismissible = input(false, { transform: booleanAttribute });

  readonly dismissed = output();

  protected readonly title = computed(() => this.heading() || this.titleOf(this.problem()));
  protected readonly fields = computed(() =>
    [...this.errors(), ...(this.problem()?.errors ?? [])].map((error) => ({
      ...error,
      id: fieldId(error.path),
    })),
  );
  protected readonly detail = computed(() => {
    const detail = this.problem()?.detail;
    return detail === this.title() ? undefined : detail;
  });

  constructor() {
    // Moves the focus, outside of Angular's state, to each new problem.
    effect(() => {
      if (!this.problem() && this.errors().length === 0) return;
      afterNextRender(() => this.host.nativeElement.focus(), { injector: this.injector });
    });
  }

  protected goTo(event: Event, id: string): void {
    event.preventDefault();
    const target = document.getElementById(id);
    target?.focus();
    target?.scrollIntoView({ block: 'center' });
  }

  private titleOf(problem: Problem | null): string {
    if (problem) return problem.title;
    const count = this.errors().length;
    return count === 1 ? 'One field needs correction' : `${count} fields need correction`;
  }
}
