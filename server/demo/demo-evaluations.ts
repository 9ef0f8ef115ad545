import type { Evaluation, EvaluationInput, Scenario } from '@shared/model/evaluations';

import {
  beginEvaluation,
  changeEvaluation,
  transitionEvaluation,
} from '../features/evaluations/evaluation-service';
import type { Chronicle, Hand } from './demo-chronicle';
import { type DemoLaser, lineId } from './demo-lasers';
import type { DemoPersonId } from './demo-people';

/** An evaluation under way in the seed: its present version is known from the last answer. */
export interface DemoEvaluation {
  current?: Evaluation;
}

export interface EvaluationPlan {
  readonly laser: DemoLaser;
  readonly laserId: () => string;
  readonly author: DemoPersonId;
  readonly checker: DemoPersonId;
  /** Days before today of the last step. */
  readonly daysAgo: number;
  readonly until: 'draft' | 'in-check' | 'checked' | 'approved';
}

/** From the draft to as far as the plan says: the supervisor authors, another checks, the LSO signs. */
export function noteEvaluation(chronicle: Chronicle, plan: EvaluationPlan): DemoEvaluation {
  const evaluation: DemoEvaluation = {};
  const { author, checker, daysAgo, until, laser } = plan;
  const steps = ['draft', 'in-check', 'checked', 'approved'].indexOf(until);
  chronicle.note(daysAgo + steps * 2, async (by) => {
    const begun = await beginEvaluation(by(author), { laserId: plan.laserId() });
    evaluation.current = await changeEvaluation(by(author), begun.id, {
      version: begun.version,
      input: written(begun.input, laser),
    });
  });
  const step = (
    index: number,
    person: DemoPersonId,
    event: 'send-to-check' | 'confirm' | 'sign',
  ) => {
    if (steps < index) return;
    chronicle.note(daysAgo + (steps - index) * 2, async (by) => {
      evaluation.current = await take(by, person, { evaluation, event });
    });
  };
  step(1, author, 'send-to-check');
  step(2, checker, 'confirm');
  step(3, 'P01', 'sign');
  return evaluation;
}

/** A later step of an evaluation of the seed. */
export async function take(
  by: Hand,
  person: DemoPersonId,
  {
    evaluation,
    event,
    reason,
  }: {
    evaluation: DemoEvaluation;
    event: 'send-to-check' | 'confirm' | 'sign' | 'withdraw';
    reason?: string;
  },
): Promise<Evaluation> {
  const { id, version } = current(evaluation);
  const step = { event, ...(reason ? { reason } : {}) };
  return transitionEvaluation(by(person), id, { version, step });
}

function current({ current: evaluation }: DemoEvaluation): Evaluation {
  if (!evaluation) throw new Error('A step of the demo came before its evaluation was begun.');
  return evaluation;
}

const MAKERS_WORK =
  'Done by the maker’s engineer alone, with a service permit and an evaluation of its own.';
const ENCLOSED = 'The beam is enclosed: nobody can reach it.';

/** The proposal as the author would finish it. */
function written(input: EvaluationInput, laser: DemoLaser): EvaluationInput {
  const isAnsi = laser.area === 'PC-1';
  const isEnclosed = laser.record.declaredClass === '1';
  const scenarios = input.scenarios.map((scenario) => tuned(scenario, laser));
  return {
    ...input,
    ruleSet: isAnsi ? 'ansi-z136.1-2014' : input.ruleSet,
    scenarios: isEnclosed
      ? scenarios.filter(({ activity }) => activity === 'operation').map(asService)
      : scenarios,
    notCovered: isEnclosed
      ? (['operation', 'alignment', 'maintenance'] as const).map((activity) => ({
          activity,
          reason: ENCLOSED,
        }))
      : (['maintenance', 'service'] as const).map((activity) => ({
          activity,
          reason: MAKERS_WORK,
        })),
    assumptions: [...(laser.assumptions ?? [])],
    ...(laser.conditions ? { conditions: laser.conditions } : {}),
  };
}

function tuned(scenario: Scenario, laser: DemoLaser): Scenario {
  const chosen = Object.entries(laser.atNm ?? {}).map(
    ([index, nm]) => [lineId(laser, Number(index)), nm] as const,
  );
  return {
    ...scenario,
    atWavelengthNm: { ...scenario.atWavelengthNm, ...Object.fromEntries(chosen) },
  };
}

function asService(scenario: Scenario): Scenario {
  return {
    ...scenario,
    id: scenario.id.replace('operation', 'service'),
    activity: 'service',
    name: scenario.name.replace('Operation', 'Service, housing open'),
    eyeS: Math.max(scenario.eyeS, 10),
    exposureReason: '10 s: in service the beam is looked for, so no aversion is counted on.',
  };
}
