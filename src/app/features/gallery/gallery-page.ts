import { ChangeDetectionStrategy, Component, inject, signal } from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule, Validators } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { EVALUATION_STATES } from '@shared/workflow/evaluation-life-cycle';
import { LASER_STATES } from '@shared/workflow/laser-life-cycle';

import { Theme } from '../../core/theme/theme';
import { CautionLine } from '../../ui/caution-line/caution-line';
import { ConfirmDialog } from '../../ui/confirm-dialog/confirm-dialog';
import { ExposureChart } from '../../ui/exposure-chart/exposure-chart';
import { Control } from '../../ui/field/control';
import { Field } from '../../ui/field/field';
import { Formula } from '../../ui/formula/formula';
import { Icon } from '../../ui/icon/icon';
import { ICON_PATHS, type IconName } from '../../ui/icon/icon-paths';
import { LineSwatch } from '../../ui/line-swatch/line-swatch';
import { PasswordPrompt } from '../../ui/password-prompt/password-prompt';
import { ProblemPanel } from '../../ui/problem-panel/problem-panel';
import { Quantity } from '../../ui/quantity/quantity';
import { QuantityField, type TypedQuantity } from '../../ui/quantity-field/quantity-field';
import { ReachAxis } from '../../ui/reach-strip/reach-axis';
import { ReachLegend } from '../../ui/reach-strip/reach-legend';
import { ReachStrip } from '../../ui/reach-strip/reach-strip';
import { type ChipState, StateChip } from '../../ui/state-chip/state-chip';
import { TableState } from '../../ui/table-state/table-state';
import { CHART, FORMULAS, GUARDS, PROBLEM, REACHES, SWATCHES } from './gallery-data';

/** Development only: every piece of `ui` in every state, for the eye and for axe. */
@Component({
  selector: 'lm-gallery-page',
  imports: [
    CautionLine,
    Control,
    ExposureChart,
    Field,
    Formula,
    Icon,
    LineSwatch,
    MatButton,
    PasswordPrompt,
    ProblemPanel,
    Quantity,
    QuantityField,
    ReachAxis,
    ReachLegend,
    ReachStrip,
    ReactiveFormsModule,
    StateChip,
    TableState,
  ],
  templateUrl: './gallery-page.html',
  styleUrl: './gallery-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class GalleryPage {
  private readonly builder = inject(NonNullableFormBuilder);
  private readonly confirmDialog = inject(ConfirmDialog);
  protected readonly theme = inject(Theme);

  protected readonly reaches = REACHES;
  protected readonly swatches = SWATCHES;
  protected readonly chart = CHART;
  protected readonly several = REACHES[5]?.reach ?? 'unknown';
  protected readonly problem = PROBLEM;
  protected readonly guards = GUARDS;
  protected readonly formulas = FORMULAS;
  protected readonly icons = Object.keys(ICON_PATHS) as IconName[];
  protected readonly states: readonly ChipState[] = [
    ...EVALUATION_STATES,
    ...LASER_STATES.filter((state) => state !== 'withdrawn'),
    'overdue',
    'review-due',
    'active',
  ];
  protected readonly answer = signal('');
  protected readonly form = this.builder.group({
    serial: ['', Validators.required],
    mode: ['cw'],
    note: [''],
    power: this.builder.control<TypedQuantity | null>({ value: 0.005, text: '5 mW' }),
    unclear: this.builder.control<TypedQuantity | null>(null),
    wrong: this.builder.control<TypedQuantity | null>(null),
    duration: this.builder.control<TypedQuantity | null>(null, Validators.required),
  });

  protected ask(): void {
    this.confirmDialog
      .ask({
        title: 'Block L-02?',
        text: 'Nobody may use it until the LSO releases it.',
        action: 'Block',
        reason: { label: 'Reason, kept with the record', minLength: 10 },
      })
      .subscribe((answer) => this.answer.set(answer ? `Blocked: ${answer.reason}` : 'Turned back'));
  }
}
