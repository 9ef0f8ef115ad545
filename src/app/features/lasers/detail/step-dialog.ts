import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import {
  MAT_DIALOG_DATA,
  MatDialogActions,
  MatDialogContent,
  MatDialogRef,
  MatDialogTitle,
} from '@angular/material/dialog';
import { type Laser, laserTransitionSchema, type OfferedEvent } from '@shared/model/lasers';
import { addMonths, localDateAt } from '@shared/model/local-date';
import { NOT_RECORDED_GUARDS } from '@shared/workflow/laser-life-cycle';
import { map } from 'rxjs';

import { RecordSave } from '../../../core/forms/record-save';
import { CurrentSession } from '../../../core/session/current-session';
import { Control } from '../../../ui/field/control';
import { Field } from '../../../ui/field/field';
import { ProblemPanel } from '../../../ui/problem-panel/problem-panel';
import type { FindRecords } from '../../../ui/record-picker/record-option';
import { RecordPicker } from '../../../ui/record-picker/record-picker';
import { AreasApi } from '../../areas/areas-api';
import { LasersApi } from '../lasers-api';

export interface StepDialogData {
  readonly laser: Laser;
  readonly offered: OfferedEvent;
}

/** The laser after the step; `outdated` when somebody else changed it first. */
export type StepDialogResult = Laser | 'outdated';

const WAIVABLE = Object.values(NOT_RECORDED_GUARDS);
/** The longest a waiver may run. */
const WAIVER_MONTHS = 12;

/** Asks for what a step needs, says every reason why it cannot be, and takes it. */
@Component({
  selector: 'lm-step-dialog',
  imports: [
    Control,
    Field,
    MatButton,
    MatDialogActions,
    MatDialogContent,
    MatDialogTitle,
    ProblemPanel,
    ReactiveFormsModule,
    RecordPicker,
  ],
  templateUrl: './step-dialog.html',
  styleUrl: './step-dialog.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class StepDialog {
  private readonly api = inject(LasersApi);
  private readonly areas = inject(AreasApi);
  private readonly fb = inject(NonNullableFormBuilder);
  private readonly dialog = inject<MatDialogRef<StepDialog, StepDialogResult>>(MatDialogRef);
  private readonly zone = inject(CurrentSession).site()?.zone ?? 'UTC';

  protected readonly data = inject<StepDialogData>(MAT_DIALOG_DATA);
  protected readonly save = new RecordSave<Laser>();
  protected readonly waivable = WAIVABLE;
  protected readonly today = localDateAt(new Date(), this.zone);
  protected readonly latest = addMonths(this.today, WAIVER_MONTHS);
  protected readonly form = this.fb.group({
    reason: [''],
    areaId: [''],
    waiver: this.fb.group({
      untilOn: [''],
      missing: this.fb.record(Object.fromEntries(WAIVABLE.map((words) => [words, true]))),
    }),
    alsoMissing: [''],
  });

  protected readonly findAreas: FindRecords = (q) =>
    this.areas
      .list({ q, limit: 20 })
      .pipe(map((page) => page.rows.map(({ id, code, name }) => ({ id, name: code, note: name }))));

  constructor() {
    if (this.asks('area')) {
      this.form.controls.areaId.addValidators(({ value }) =>
        value ? null : { missing: 'Choose the area from the list.' },
      );
    }
  }

  protected asks(what: OfferedEvent['asks'][number]): boolean {
    return this.data.offered.asks.includes(what);
  }

  protected take(): void {
    const step = this.save.check(this.form, laserTransitionSchema, this.value());
    if (!step) return;
    this.save.run(this.form, {
      send: () => this.api.transition(this.data.laser, step),
      reread: () => this.api.read(this.data.laser.id),
      done: (laser) => this.dialog.close(laser),
    });
  }

  protected cancel(): void {
    this.dialog.close(this.save.stored() ? 'outdated' : undefined);
  }

  private value(): object {
    const { reason, areaId, waiver, alsoMissing } = this.form.getRawValue();
    const also = alsoMissing
      .split('\n')
      .map((line) => line.trim())
      .filter(Boolean);
    const missing = [...WAIVABLE.filter((words) => waiver.missing[words]), ...also];
    return {
      event: this.data.offered.event,
      // A blank, where nothing was typed: the contract then says what a reason needs.
      ...(this.asks('reason') && { reason: reason || ' ' }),
      ...(this.asks('area') && { areaId }),
      ...(this.asks('waiver') && { waiver: { untilOn: waiver.untilOn, missing } }),
    };
  }
}
