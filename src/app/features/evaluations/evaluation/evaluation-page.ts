import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  inject,
  input,
  linkedSignal,
  signal,
  viewChild,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { Title } from '@angular/platform-browser';
import { Router, RouterLink } from '@angular/router';
import { ruleSetById } from '@shared/hazard/rule-sets';
import type { Evaluation, EvaluationTransition } from '@shared/model/evaluations';
import type { OfferedEvent } from '@shared/model/lasers';
import { laserInputsOf } from '@shared/model/laser-inputs';
import type { Problem } from '@shared/model/problem';
import { scopeOf } from '@shared/permissions/permissions';

import { asProblem } from '../../../core/http/problem-error';
import { CurrentSession } from '../../../core/session/current-session';
import { SiteDatePipe } from '../../../core/time/site-date-pipe';
import type { HoldsUnsavedChanges } from '../../../core/unsaved/unsaved-changes-guard';
import { CautionLine } from '../../../ui/caution-line/caution-line';
import { Icon } from '../../../ui/icon/icon';
import { ProblemPanel } from '../../../ui/problem-panel/problem-panel';
import { StateChip } from '../../../ui/state-chip/state-chip';
import { TableState } from '../../../ui/table-state/table-state';
import { laserResource } from '../../lasers/lasers-api';
import { evaluationResource, EvaluationsApi } from '../evaluations-api';
import { StateNotice } from '../life-cycle/state-notice';
import { EvaluationEditor } from './evaluation-editor';
import { EvaluationRecord } from './evaluation-record';

/** One evaluation: the bench while it is written, the record afterwards. */
@Component({
  selector: 'lm-evaluation-page',
  imports: [
    CautionLine,
    EvaluationEditor,
    EvaluationRecord,
    Icon,
    MatButton,
    ProblemPanel,
    RouterLink,
    SiteDatePipe,
    StateChip,
    StateNotice,
    TableState,
  ],
  templateUrl: './evaluation-page.html',
  styleUrl: './evaluation-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class EvaluationPage implements HoldsUnsavedChanges {
  private readonly api = inject(EvaluationsApi);
  private readonly router = inject(Router);
  private readonly title = inject(Title);
  private readonly user = inject(CurrentSession).user;

  readonly id = input.required<string>();
  readonly situation = input<string>();

  private readonly editor = viewChild(EvaluationEditor);
  private readonly record = viewChild(EvaluationRecord);

  protected readonly resource = evaluationResource(this.id);
  /** The newest that the server has said. */
  protected readonly evaluation = linkedSignal(() =>
    this.resource.hasValue() ? this.resource.value() : undefined,
  );
  /** What the editor begins from; a new object makes a new editor. */
  protected readonly draft = linkedSignal<string, Evaluation | undefined>({
    source: () => (this.resource.hasValue() ? this.resource.value().id : ''),
    computation: () => (this.resource.hasValue() ? this.resource.value() : undefined),
  });
  protected readonly shownSituation = linkedSignal(() => this.situation());
  protected readonly editingChecked = signal(false);
  protected readonly busy = signal(false);
  protected readonly problem = signal<Problem | null>(null);
  protected readonly pageProblem = computed(() => {
    const error = this.resource.error();
    return error ? asProblem(error) : null;
  });

  protected readonly edition = computed(() => {
    const evaluation = this.evaluation();
    return evaluation ? ruleSetById(evaluation.input.ruleSet).title : '';
  });
  protected readonly isEditing = computed(() => {
    const evaluation = this.evaluation();
    if (!evaluation?.mayEdit) return false;
    return evaluation.state === 'draft' || this.editingChecked();
  });
  protected readonly mayReopen = computed(() => {
    const evaluation = this.evaluation();
    return Boolean(evaluation?.mayEdit) && !this.isEditing();
  });
  protected readonly mayBegin = computed(
    () =>
      scopeOf('evaluation.begin', this.user()?.roles ?? []) !== undefined &&
      ['approved', 'stale', 'withdrawn'].includes(this.evaluation()?.state ?? ''),
  );
  protected readonly chipWord = computed(() => {
    const evaluation = this.evaluation();
    const waits = this.signingOffer();
    if (!waits || waits.reasons.length > 0) return '';
    if (evaluation?.state === 'checked') return 'Checked, waits for you';
    return evaluation?.state === 'in-check' ? 'In check, waits for you' : '';
  });
  protected readonly signingOffer = computed<OfferedEvent | undefined>(() =>
    this.evaluation()?.offered.find(
      ({ event }) => event === 'confirm' || event === 'sign' || event === 'confirm-unchanged',
    ),
  );
  protected readonly returnOffer = computed(() =>
    this.evaluation()?.offered.find(({ event, reasons }) => event === 'return' && !reasons.length),
  );
  /** The laser as it is now, once its lines differ from the evaluated ones. */
  private readonly laser = laserResource(
    computed(() =>
      this.evaluation()?.state === 'stale' ? this.evaluation()?.laser.id : undefined,
    ),
  );
  protected readonly linesNow = computed(() => {
    if (!this.laser.hasValue()) return null;
    const laser = this.laser.value();
    return laserInputsOf(laser, laser.wallDistanceM);
  });

  readonly whenLeft = 'What you typed last is not saved yet: some inputs need correction.';

  constructor() {
    // The window title names the record.
    effect(() => {
      const evaluation = this.evaluation();
      if (!evaluation) return;
      this.title.setTitle(`${evaluation.laser.tag}, evaluation ${evaluation.number} · Limen`);
    });
    // The address names the situation in view.
    effect(() => {
      void this.router.navigate([], {
        queryParams: { situation: this.shownSituation() ?? null },
        queryParamsHandling: 'merge',
        replaceUrl: true,
      });
    });
  }

  hasUnsavedChanges(): boolean {
    return this.isEditing() && (this.editor()?.isUnsaved() ?? false);
  }

  protected run(step: EvaluationTransition, version: number): void {
    const evaluation = this.evaluation();
    if (!evaluation || this.busy()) return;
    this.busy.set(true);
    this.problem.set(null);
    this.api.transition(evaluation.id, version, step).subscribe({
      next: (after) => {
        this.busy.set(false);
        this.editingChecked.set(false);
        this.replace(after);
      },
      error: (error: unknown) => this.fail(error),
    });
  }

  /** What the editor stored: the heading follows, the form stays. */
  protected keep(evaluation: Evaluation): void {
    this.evaluation.set(evaluation);
  }

  /** Shows another state of the record, and edits from there. */
  protected replace(evaluation: Evaluation): void {
    this.problem.set(null);
    this.evaluation.set(evaluation);
    this.draft.set(evaluation);
  }

  protected fail(error: unknown): void {
    this.busy.set(false);
    this.problem.set(asProblem(error));
  }

  protected goToSigning(): void {
    (this.editor()?.steps() ?? this.record()?.steps())?.focus();
  }

  protected giveBack(offer: OfferedEvent): void {
    (this.editor()?.steps() ?? this.record()?.steps())?.begin(offer);
  }

  protected beginNewVersion(evaluation: Evaluation): void {
    if (this.busy()) return;
    this.busy.set(true);
    this.api.begin(evaluation.laser.id, evaluation.id).subscribe({
      next: ({ id }) => {
        this.busy.set(false);
        void this.router.navigate(['/evaluations', id]);
      },
      error: (error: unknown) => this.fail(error),
    });
  }
}
