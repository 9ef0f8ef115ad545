import {
  ChangeDetectionStrategy,
  Component,
  computed,
  input,
  model,
  viewChild,
} from '@angular/core';
import { output } from '@angular/core';
import { ruleSetById } from '@shared/hazard/rule-sets';
import { evaluateScenarios } from '@shared/model/evaluation-case';
import type { Evaluation, EvaluationTransition } from '@shared/model/evaluations';
import { emissionSummary, lineOf } from '@shared/model/laser-summary';
import type { Problem } from '@shared/model/problem';
import { ACTIVITY_WORDS } from '@shared/text/hazard-words';

import { LineSwatch } from '../../../ui/line-swatch/line-swatch';
import { CaseInputs } from '../inputs/case-inputs';
import { LineFigures } from '../inputs/line-figures';
import { SituationList } from '../inputs/situation-list';
import { SignatureList } from '../life-cycle/signature-list';
import { StepsPanel } from '../life-cycle/steps-panel';
import { WhatChanged } from '../life-cycle/what-changed';
import { type Outcome, refused, storedOutcome } from '../results/outcome';
import { ResultFigures } from '../results/result-figures';
import { ResultFold } from '../results/result-fold';
import { ResultGrounds } from '../results/result-grounds';

/** An evaluation as it is stored: to read, check and sign. The numbers are the server's. */
@Component({
  selector: 'lm-evaluation-record',
  imports: [
    CaseInputs,
    LineFigures,
    LineSwatch,
    ResultFigures,
    ResultFold,
    ResultGrounds,
    SignatureList,
    SituationList,
    StepsPanel,
    WhatChanged,
  ],
  templateUrl: './evaluation-record.html',
  styleUrls: ['./bench-layout.scss', '../inputs/inputs.scss'],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class EvaluationRecord {
  readonly evaluation = input.required<Evaluation>();
  /** The laser's lines as they are now, where they differ from the evaluated ones. */
  readonly linesNow = input<Evaluation['laserInputs'] | null>(null);
  readonly busy = input(false);
  readonly problem = input<Problem | null>(null);
  readonly situation = model<string>();

  readonly stepped = output<EvaluationTransition>();

  readonly steps = viewChild(StepsPanel);

  protected readonly edition = computed(() => ruleSetById(this.evaluation().input.ruleSet).edition);
  protected readonly outcomes = computed<ReadonlyMap<string, Outcome>>(
    () => new Map(this.evaluation().results.map((one) => [one.scenarioId, storedOutcome(one)])),
  );
  protected readonly situations = computed(() =>
    this.evaluation().input.scenarios.map((scenario) => ({
      scenario,
      activity: ACTIVITY_WORDS[scenario.activity],
      view: this.outcomes().get(scenario.id)?.view ?? null,
    })),
  );
  protected readonly items = computed(() =>
    this.evaluation().input.scenarios.map(({ id, name, activity }) => ({
      id,
      name,
      activity,
      outcome: this.outcomes().get(id),
    })),
  );
  protected readonly selected = computed(
    () =>
      this.situations().find(({ scenario }) => scenario.id === this.situation()) ??
      this.situations()[0],
  );
  protected readonly outcome = computed(
    () => this.outcomes().get(this.selected()?.scenario.id ?? '') ?? refused([]),
  );
  /** The same situation with the laser's present lines, where it can be had. */
  protected readonly today = computed<Outcome | null>(() => {
    const lines = this.linesNow();
    const scenario = this.selected()?.scenario;
    if (!lines || !scenario) return null;
    const { ruleSet } = this.evaluation().input;
    const emissionIds = this.linesToday(scenario.emissionIds, lines);
    const scenarios = [{ ...scenario, emissionIds }];
    const [answer] = evaluateScenarios(lines, { ruleSet, scenarios });
    return answer ? storedOutcome(answer) : null;
  });
  /** What the figures show: today's, beside the sealed ones, once they differ. */
  protected readonly shown = computed(() => {
    const today = this.today();
    return today?.view ? today : this.outcome();
  });
  protected readonly sealedView = computed(() => (this.today()?.view ? this.outcome().view : null));
  protected readonly lines = computed(() => {
    const ids = this.selected()?.scenario.emissionIds ?? [];
    return this.evaluation()
      .laserInputs.emissions.filter(({ id }) => ids.includes(id))
      .map((emission) => ({
        emission,
        swatch: lineOf(emission),
        summary: emissionSummary(emission),
      }));
  });
  protected readonly notCovered = computed(() =>
    this.evaluation().input.notCovered.map(({ activity, reason }) => ({
      word: ACTIVITY_WORDS[activity],
      reason,
    })),
  );
  protected readonly texts = computed(() => {
    const { controls, nonBeamHazards, conditions, note } = this.evaluation().input;
    return (
      [
        ['Controls required and present', controls],
        ['Non-beam hazards', nonBeamHazards],
        ['Conditions', conditions],
        ['Note', note],
      ] as const
    ).flatMap(([head, text]) => (text ? [{ head, text }] : []));
  });

  /** A situation of all lines is one of all present lines; another keeps those that are left. */
  private linesToday(ids: readonly string[], today: Evaluation['laserInputs']): string[] {
    const now = today.emissions.map(({ id }) => id);
    const coversAll = this.evaluation().laserInputs.emissions.every(({ id }) => ids.includes(id));
    return coversAll ? now : ids.filter((id) => now.includes(id));
  }
}
