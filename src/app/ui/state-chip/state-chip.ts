import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import {
  EVALUATION_STATE_WORDS,
  type EvaluationState,
} from '@shared/workflow/evaluation-life-cycle';
import { LASER_STATE_WORDS, type LaserState } from '@shared/workflow/laser-life-cycle';

import { Icon } from '../icon/icon';
import type { IconName } from '../icon/icon-paths';

/** States of the records, and what else is said in a chip. */
export type ChipState = EvaluationState | LaserState | 'overdue' | 'review-due' | 'active';

type Form = 'quiet' | 'dashed' | 'edge' | 'checked' | 'signed' | 'stale' | 'stop' | 'filled';

// prettier-ignore
const FORMS: Readonly<Record<ChipState, readonly [form: Form, icon: IconName]>> = {
  draft: ['dashed', 'edit'],
  'in-check': ['edge', 'search'],
  checked: ['checked', 'check'],
  approved: ['signed', 'seal'],
  stale: ['stale', 'broken'],
  superseded: ['dashed', 'double-tick'],
  withdrawn: ['filled', 'barred'],
  discarded: ['dashed', 'close'],

  requested: ['dashed', 'send'],
  'approved-to-buy': ['edge', 'check'],
  'on-order': ['edge', 'clock'],
  received: ['dashed', 'box'],
  registered: ['dashed', 'edit'],
  'under-evaluation': ['edge', 'evaluations'],
  evaluated: ['checked', 'check'],
  commissioning: ['edge', 'evaluations'],
  'in-use': ['quiet', 'ringed-dot'],
  'change-open': ['stale', 'arrows'],
  'service-open': ['stale', 'clock'],
  blocked: ['filled', 'barred'],
  stored: ['edge', 'box'],
  'on-loan': ['edge', 'arrows'],
  transferring: ['edge', 'arrows'],
  rejected: ['stop', 'close'],
  transferred: ['dashed', 'double-tick'],
  disposed: ['dashed', 'close'],

  overdue: ['stop', 'clock'],
  'review-due': ['stale', 'clock'],
  active: ['signed', 'ringed-dot'],
};

/** A purchase that was given up is no alarm; an evaluation withdrawn as wrong is one. */
const LASER_WITHDRAWN = ['dashed', 'close'] as const;

const WORDS: Readonly<Record<ChipState, string>> = {
  ...LASER_STATE_WORDS,
  ...EVALUATION_STATE_WORDS,
  overdue: 'Overdue',
  'review-due': 'Review due',
  active: 'Active',
};

/** The state of a record: an icon of its own shape and a word, so that gray tells it too. */
@Component({
  selector: 'lm-state-chip',
  imports: [Icon],
  template: '<lm-icon [name]="icon()" />{{ shown() }}',
  styleUrl: './state-chip.scss',
  host: { '[class]': 'form()' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class StateChip {
  readonly state = input.required<ChipState>();
  /** Two life cycles have a state `withdrawn`. */
  readonly record = input<'evaluation' | 'laser'>('evaluation');
  /** Another word in the same form: "Evaluation stale". */
  readonly word = input('');

  private readonly look = computed(() =>
    this.state() === 'withdrawn' && this.record() === 'laser'
      ? LASER_WITHDRAWN
      : FORMS[this.state()],
  );
  protected readonly form = computed(() => this.look()[0]);
  protected readonly icon = computed(() => this.look()[1]);
  protected readonly shown = computed(() => this.word() || WORDS[this.state()]);
}
