import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  inject,
  Injector,
  input,
  linkedSignal,
  model,
  output,
  runInInjectionContext,
  signal,
  untracked,
  viewChild,
} from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { RULE_SETS, type RuleSet } from '@shared/hazard/rule-sets';
import { uncoveredLines } from '@shared/model/evaluation-case';
import { ACTIVITIES, type Evaluation, type EvaluationTransition } from '@shared/model/evaluations';
import type { Problem } from '@shared/model/problem';
import { ACTIVITY_WORDS } from '@shared/text/hazard-words';
import { switchMap } from 'rxjs';

import { Control } from '../../../ui/field/control';
import { Field } from '../../../ui/field/field';
import { Icon } from '../../../ui/icon/icon';
import { VersionConflict } from '../../../ui/version-conflict/version-conflict';
import { EvaluationsApi } from '../evaluations-api';
import { sentencesByPath } from '../inputs/case-paths';
import {
  evaluationForm,
  readEvaluation,
  readScenario,
  scenarioForm,
  type ScenarioForm,
} from '../inputs/evaluation-form';
import { formSignal } from '../inputs/form-signal';
import { labeledMessage } from '../inputs/missing-words';
import { ScenarioFields } from '../inputs/scenario-fields';
import { SituationList } from '../inputs/situation-list';
import { typed } from '../inputs/typed-quantity';
import { StepsPanel } from '../life-cycle/steps-panel';
import { Announcement } from '../results/announcement';
import { refused } from '../results/outcome';
import { ResultFigures } from '../results/result-figures';
import { ResultFold } from '../results/result-fold';
import { ResultGrounds } from '../results/result-grounds';
import { DraftSaver } from './draft-saver';
import { firstDifference } from './same-numbers';
import { type KeptOutcome, newSituation, proposalFor, situationOutcome } from './situations';

/** The bench: an evaluation while it is written, its results on every keystroke, saved by itself. */
@Component({
  selector: 'lm-evaluation-editor',
  imports: [
    Announcement,
    Control,
    Field,
    Icon,
    MatButton,
    ReactiveFormsModule,
    ResultFigures,
    ResultFold,
    ResultGrounds,
    ScenarioFields,
    SituationList,
    StepsPanel,
    VersionConflict,
  ],
  templateUrl: './evaluation-editor.html',
  styleUrls: ['./bench-layout.scss', '../inputs/inputs.scss'],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class EvaluationEditor {
  private readonly fb = inject(NonNullableFormBuilder);
  private readonly api = inject(EvaluationsApi);
  private readonly injector = inject(Injector);

  /** As it was when editing began; a newer one makes a new editor. */
  readonly evaluation = input.required<Evaluation>();
  readonly busy = input(false);
  readonly problem = input<Problem | null>(null);
  /** The situation in view, by id. */
  readonly situation = model<string>();

  /** A step asked for, once all that was typed is stored. */
  readonly stepped = output<{ readonly step: EvaluationTransition; readonly version: number }>();
  /** The evaluation anew: somebody else's version, or one with the laser's present lines. */
  readonly replaced = output<Evaluation>();
  readonly saved = output<Evaluation>();
  readonly failed = output<unknown>();

  readonly steps = viewChild(StepsPanel);

  protected readonly labeled = labeledMessage;
  protected readonly ruleSets: readonly RuleSet[] = RULE_SETS;
  protected readonly form = computed(() => evaluationForm(this.fb, this.evaluation()));
  protected readonly saver = computed(() =>
    runInInjectionContext(this.injector, () => new DraftSaver(this.evaluation())),
  );
  protected readonly latest = computed(() => this.saver().saved()?.evaluation ?? this.evaluation());
  protected readonly laserInputs = computed(() => this.evaluation().laserInputs);
  protected readonly value = formSignal(this.form);
  protected readonly reading = computed(() => {
    this.value();
    return readEvaluation(this.form());
  });
  private readonly outcomes = linkedSignal<unknown, ReadonlyMap<string, KeptOutcome>>({
    source: this.value,
    computation: (_, previous) => this.computeOutcomes(previous?.value),
  });
  protected readonly selected = computed(() => {
    this.value();
    const forms = this.form().controls.scenarios.controls;
    const index = forms.findIndex((form) => form.controls.id.value === this.situation());
    const form = forms[Math.max(index, 0)];
    return form ? { form, index: Math.max(index, 0) } : null;
  });
  protected readonly outcome = computed(() => {
    const id = this.selected()?.form.controls.id.value ?? '';
    return this.outcomes().get(id)?.outcome ?? refused([]);
  });
  /** The outcome with its errors at the fields of the whole form. */
  protected readonly shownOutcome = computed(() => {
    const prefix = this.prefix();
    const outcome = this.outcome();
    const errors = outcome.errors.map((error) => ({ ...error, path: prefix + error.path }));
    return { ...outcome, errors };
  });
  protected readonly problems = computed(() => sentencesByPath(this.outcome().errors));
  protected readonly prefix = computed(() => `scenarios[${this.selected()?.index ?? 0}].`);
  protected readonly situations = computed(() =>
    this.value().scenarios.map(({ id, name, activity }) => ({
      id,
      name,
      activity,
      outcome: this.outcomes().get(id)?.outcome,
    })),
  );
  protected readonly openActivities = computed(() =>
    ACTIVITIES.filter(
      (activity) => !this.value().scenarios.some((scenario) => scenario.activity === activity),
    ).map((activity) => ({ activity, word: ACTIVITY_WORDS[activity] })),
  );
  protected readonly uncovered = computed(() => {
    const reading = this.reading();
    return reading.ok ? uncoveredLines(this.laserInputs(), reading.input) : [];
  });
  protected readonly proposal = computed(() => {
    const selected = this.selected();
    this.value();
    return selected && this.proposalOf(selected.form);
  });
  protected readonly assumptions = computed(() =>
    this.value()
      .assumptions.split('\n')
      .filter((line) => line.trim()),
  );
  protected readonly obstacle = computed(() => {
    if (this.saver().state() === 'conflict')
      return 'Two versions differ: choose one of them first.';
    return this.reading().ok ? '' : 'Some inputs need correction first; they are named above.';
  });
  protected readonly otherErrors = computed(() => {
    const reading = this.reading();
    if (reading.ok) return [];
    return reading.errors.filter(({ path }) => !path.startsWith(this.prefix()));
  });
  protected readonly removed = signal<{ form: ScenarioForm; index: number } | null>(null);
  protected readonly linesChanged = computed(
    () => this.latest().laserInputsHash !== this.latest().laserInputsHashNow,
  );
  /** A number in which the server's results differ from those of this browser. */
  protected readonly mismatch = computed(() => {
    const saved = this.saver().saved();
    if (!saved) return undefined;
    return untracked(() => this.compareWithServer(saved.evaluation));
  });
  protected readonly savedWords = computed(() => {
    const words = {
      saved: this.saver().saved() ? 'Saved' : '',
      unsaved: 'Not saved yet',
      saving: 'Saving…',
      conflict: 'Not saved: somebody changed it meanwhile',
      failed: 'Not saved',
    };
    return this.reading().ok
      ? words[this.saver().state()]
      : 'Not saved: some inputs need correction';
  });

  constructor() {
    // Hands each valid input to the saver, which writes to the server.
    effect(() => {
      const reading = this.reading();
      if (reading.ok) untracked(() => this.saver().take(reading.input));
    });
    // Tells the page of what is stored, for the heading above.
    effect(() => {
      const saved = this.saver().saved();
      if (saved) this.saved.emit(saved.evaluation);
    });
  }

  /** Whether something typed is not stored yet. */
  isUnsaved(): boolean {
    return this.saver().state() !== 'saved' || !this.reading().ok;
  }

  protected ask(step: EvaluationTransition): void {
    this.saver()
      .flush()
      .subscribe({
        next: ({ version }) => this.stepped.emit({ step, version }),
        error: (error: unknown) => this.failed.emit(error),
      });
  }

  protected addSituation(): void {
    const activity = this.openActivities()[0]?.activity ?? 'operation';
    this.append(
      scenarioForm(
        this.fb,
        newSituation(newId(), activity, this.laserInputs()),
        this.laserInputs(),
      ),
    );
  }

  protected duplicate(form: ScenarioForm): void {
    const reading = readScenario(form);
    const base = reading.ok
      ? reading.scenario
      : newSituation('', form.controls.activity.value, this.laserInputs());
    const copy = scenarioForm(this.fb, { ...base, id: newId() }, this.laserInputs());
    copy.controls.name.setValue(`${form.controls.name.value}, copy`.slice(0, 80));
    this.append(copy);
  }

  protected remove(form: ScenarioForm, index: number): void {
    this.form().controls.scenarios.removeAt(index);
    this.removed.set({ form, index });
    this.situation.set(
      this.form().controls.scenarios.controls[Math.max(0, index - 1)]?.controls.id.value,
    );
  }

  protected undoRemove(): void {
    const removed = this.removed();
    if (!removed) return;
    this.form().controls.scenarios.insert(removed.index, removed.form);
    this.situation.set(removed.form.controls.id.value);
    this.removed.set(null);
  }

  protected takeProposal(form: ScenarioForm): void {
    const { eyeS, skinS, reason } = this.exposureFor(form);
    const { surroundings, exposureReason } = form.controls;
    surroundings.patchValue({ eyeS: typed(eyeS, 's'), skinS: typed(skinS, 's') });
    exposureReason.setValue(reason);
  }

  protected takeLines(): void {
    this.saver()
      .flush()
      .pipe(switchMap(({ id, version }) => this.api.refreshInputs(id, version)))
      .subscribe({
        next: (evaluation) => this.replaced.emit(evaluation),
        error: (error: unknown) => this.failed.emit(error),
      });
  }

  protected takeTheirs(): void {
    const theirs = this.saver().theirs();
    if (theirs) this.replaced.emit(theirs);
  }

  private computeOutcomes(
    previous: ReadonlyMap<string, KeptOutcome> | undefined,
  ): ReadonlyMap<string, KeptOutcome> {
    const ruleSet = this.form().controls.ruleSet.value;
    return new Map(
      this.form().controls.scenarios.controls.map((form) => {
        const id = form.controls.id.value;
        const reading = readScenario(form);
        return [id, situationOutcome(this.laserInputs(), ruleSet, reading, previous?.get(id))];
      }),
    );
  }

  private append(form: ScenarioForm): void {
    this.form().controls.scenarios.push(form);
    this.situation.set(form.controls.id.value);
  }

  private exposureFor(form: ScenarioForm) {
    const { lines, surroundings } = form.getRawValue();
    const ids = Object.keys(lines).filter((id) => lines[id]);
    const kind = surroundings.path.kind === 'diffuse' ? 'diffuse' : 'direct';
    return proposalFor(this.laserInputs(), ids, kind);
  }

  /** Shown while the durations are other than proposed. */
  private proposalOf(form: ScenarioForm): string {
    const { eyeS, skinS, reason } = this.exposureFor(form);
    const { eyeS: eye, skinS: skin } = form.controls.surroundings.getRawValue();
    const isTaken = eye?.value === eyeS && (skin?.value ?? eye.value) === skinS;
    return isTaken ? '' : `Proposed for the eye ${reason} Skin ${skinS} s.`;
  }

  private compareWithServer(evaluation: Evaluation): string | undefined {
    for (const { scenarioId, result } of evaluation.results) {
      const mine = this.outcomes().get(scenarioId)?.outcome;
      if (!mine?.isCurrent || this.saver().state() !== 'saved') continue;
      const path = firstDifference(mine.view?.result, result);
      if (path !== undefined) return path;
    }
    return undefined;
  }
}

function newId(): string {
  return crypto.randomUUID();
}
