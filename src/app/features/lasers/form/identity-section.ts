import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { ReactiveFormsModule } from '@angular/forms';
import { LASER_CLASSES } from '@shared/model/lasers';

import { CurrentSession } from '../../../core/session/current-session';
import { Control } from '../../../ui/field/control';
import { Field } from '../../../ui/field/field';
import { DuplicateWarning } from './duplicate-warning';
import type { LaserForm } from './laser-form';

/** What the laser is: maker, serial, label, and its classes, each apart from the others. */
@Component({
  selector: 'lm-identity-section',
  imports: [Control, DuplicateWarning, Field, ReactiveFormsModule],
  templateUrl: './identity-section.html',
  styleUrl: './sections.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class IdentitySection {
  private readonly session = inject(CurrentSession);

  readonly form = input.required<LaserForm>();
  readonly laserId = input<string>();
  /** The serial as it is being typed. */
  readonly serial = input('');

  protected readonly classes = LASER_CLASSES;
  /** The verified class is the LSO's own. */
  protected readonly mayVerify = computed(() => this.session.hasRole('lso'));
}
