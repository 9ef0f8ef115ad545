import { ENGINE_VERSION } from '@shared/hazard/engine-version';
import { beamOf } from '@shared/model/emission-beam';
import { isEvaluated, uncoveredLines } from '@shared/model/evaluation-case';
import { ACTIVITIES } from '@shared/model/evaluations';
import { lineName } from '@shared/model/laser-inputs';
import type { Settings } from '@shared/model/settings';
import type { EvaluationGuard } from '@shared/workflow/evaluation-life-cycle';

import type { Guard, StepInput } from '../../workflow/transition';
import { hashOfInputs, type LaserRecord, placementOf } from '../lasers/laser-standing-service';
import type { EvaluationRecord } from './evaluation-record';
import { changedResults } from './evaluation-results';

/** An evaluation with the facts that its guards look at. */
export interface EvaluationSubject {
  readonly evaluation: EvaluationRecord;
  readonly laser: LaserRecord;
  readonly settings: Settings;
  readonly isNew?: boolean;
}

export interface EvaluationStep extends StepInput {
  /** Why it became stale: its inputs changed, or its review date passed. */
  readonly cause?: 'inputs' | 'review';
  readonly supersededById?: string;
}

type GuardCheck = Guard<EvaluationSubject, EvaluationStep>;

/** What must hold before a step, and the words for what does not. */
export const EVALUATION_GUARDS: Readonly<Record<EvaluationGuard, GuardCheck>> = {
  'rule-set-chosen': ({ evaluation }) => when(!evaluation.input.ruleSet, 'Choose the rule set.'),
  'inputs-complete': ({ evaluation }) => incompleteInputs(evaluation),
  'all-lines-covered': ({ evaluation }) => uncovered(evaluation),
  'all-activities-answered': ({ evaluation }) => unanswered(evaluation),
  'evaluates-without-error': ({ evaluation }) => withoutResult(evaluation),
  'checker-is-not-author': ({ evaluation }, { ctx }) =>
    when(evaluation.author.id === ctx.actor.id, 'The author does not check their own evaluation.'),
  'approver-is-not-author': ({ evaluation, settings }, { ctx }) =>
    when(
      evaluation.author.id === ctx.actor.id && !settings.authorMayApprove,
      'The author does not sign their own evaluation.',
    ),
  'deputy-has-delegation': (_, { ctx }) =>
    when(
      !ctx.actor.roles.includes('lso'),
      'Delegations are not recorded here: a deputy authors and checks, the LSO signs.',
    ),
  'lso-is-not-a-party': ({ evaluation, laser, settings }, { ctx }) => [
    ...when(
      placementOf(laser).supervisorIds.includes(ctx.actor.id),
      'You supervise this laser: somebody else decides.',
    ),
    ...when(
      evaluation.author.id === ctx.actor.id && !settings.authorMayApprove,
      'The author does not sign their own evaluation.',
    ),
  ],
  'laser-inputs-equal': ({ evaluation, laser }) =>
    when(
      evaluation.laserInputsHash !== hashOfInputs(laser),
      'The laser’s inputs have changed since: the author takes them over first.',
    ),
  // Equal inputs have a guard of their own: here the engine of today meets the sealed results.
  'results-equal': ({ evaluation }) =>
    changedResults(evaluation, evaluation.laserInputs).map(
      ({ scenario, what }) => `The result differs from the sealed one: ${scenario}, ${what}.`,
    ),
  'presence-proven': (_, { ctx, input }) =>
    when(input !== undefined && ctx.proof === null, 'Prove your presence: enter your password.'),
  'reason-given': (_, { input }) => when(input !== undefined && !input.reason, 'Give the reason.'),
};

function incompleteInputs({ laserInputs, input }: EvaluationRecord): string[] {
  const lines = laserInputs.emissions.flatMap((emission) => {
    const beam = beamOf(emission, emission.wavelengthToNm && emission.wavelengthNm.value);
    return beam.ok ? [] : beam.errors.map(({ message }) => `${lineName(emission)}: ${message}`);
  });
  return [
    ...when(laserInputs.emissions.length === 0, 'The laser has no line on record.'),
    ...when(input.scenarios.length === 0, 'Add at least one situation.'),
    ...lines,
  ];
}

function uncovered({ laserInputs, input }: EvaluationRecord): string[] {
  const sets = laserInputs.emissionSets.filter(
    (set) =>
      !input.scenarios.some(({ emissionIds }) =>
        set.emissionIds.every((id) => emissionIds.includes(id)),
      ),
  );
  return [
    ...uncoveredLines(laserInputs, input).map((line) => `No situation covers ${line}.`),
    ...sets.map(({ name }) => `No situation covers the set "${name}".`),
  ];
}

function unanswered({ input }: EvaluationRecord): string[] {
  return ACTIVITIES.filter(
    (activity) =>
      !input.scenarios.some((scenario) => scenario.activity === activity) &&
      !input.notCovered.some((answer) => answer.activity === activity),
  ).map((activity) => `Evaluate ${activity}, or say why it is not evaluated.`);
}

function withoutResult({ input, results, engineVersion }: EvaluationRecord): string[] {
  const failed = input.scenarios.filter(({ id }) => {
    const found = results.find(({ scenarioId }) => scenarioId === id);
    return !found || !isEvaluated(found.result);
  });
  return [
    ...when(
      engineVersion !== ENGINE_VERSION,
      `The results are of engine ${engineVersion}; this is ${ENGINE_VERSION}. The author saves once more.`,
    ),
    ...failed.map(({ name }) => `"${name}" cannot be evaluated; its errors stand at the fields.`),
  ];
}

function when(fails: boolean, reason: string): string[] {
  return fails ? [reason] : [];
}
