import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  inject,
  input,
  output,
  untracked,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatDialog } from '@angular/material/dialog';
import { Router } from '@angular/router';
import type { Laser, OfferedEvent } from '@shared/model/lasers';

import { StepDialog, type StepDialogData, type StepDialogResult } from './step-dialog';

/** What the workflow offers next; steps that are not possible now say every reason. */
@Component({
  selector: 'lm-laser-steps',
  imports: [MatButton],
  templateUrl: './laser-steps.html',
  styleUrl: './laser-steps.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class LaserSteps {
  private readonly dialog = inject(MatDialog);
  private readonly router = inject(Router);

  readonly laser = input.required<Laser>();
  /** The step whose dialog is open. */
  readonly step = input<string>();

  readonly moved = output<Laser>();
  /** Somebody else changed the laser meanwhile. */
  readonly outdated = output();

  protected readonly possible = computed(() =>
    this.laser().offered.filter(({ reasons }) => reasons.length === 0),
  );
  protected readonly impossible = computed(() =>
    this.laser().offered.filter(({ reasons }) => reasons.length > 0),
  );
  constructor() {
    // The address opens the dialog, so that a link does, and Back closes it.
    effect((onCleanup) => {
      const event = this.step();
      const offered = untracked(this.possible).find((one) => one.event === event);
      if (!offered) return;
      const opened = untracked(() => this.open(offered));
      onCleanup(() => opened.close());
    });
  }

  protected ask(event: string | null): void {
    void this.router.navigate([], { queryParams: { step: event }, replaceUrl: event === null });
  }

  private open(offered: OfferedEvent) {
    const opened = this.dialog.open<StepDialog, StepDialogData, StepDialogResult>(StepDialog, {
      data: { laser: this.laser(), offered },
      width: '560px',
      autoFocus: 'first-tabbable',
      closeOnNavigation: false,
    });
    opened.afterClosed().subscribe((result) => {
      if (this.step()) this.ask(null);
      if (result === 'outdated') this.outdated.emit();
      else if (result) this.moved.emit(result);
    });
    return opened;
  }
}
