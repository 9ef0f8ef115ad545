import { ENGINE_VERSION } from '@shared/hazard/engine-version';
import { ruleSetById } from '@shared/hazard/rule-sets';
import { compareResults } from '@shared/model/compare-results';
import { evaluateScenarios, isEvaluated, type ScenarioResult } from '@shared/model/evaluation-case';
import type { EvaluationInput, LaserInputs, ResultChange } from '@shared/model/evaluations';
import { hashedInputs } from '@shared/model/laser-inputs';
import { proposeScenarios } from '@shared/model/propose-scenarios';

import { sha256OfJson } from '../../audit-trail/row-hash';
import type { EvaluationRecord, ResultSummary } from './evaluation-record';

type Content = Pick<
  EvaluationRecord,
  | 'ruleSet'
  | 'edition'
  | 'input'
  | 'laserInputs'
  | 'laserInputsHash'
  | 'engineVersion'
  | 'results'
  | 'summary'
>;

/** What an evaluation holds, computed here whatever the browser showed. */
export function computed(laserInputs: LaserInputs, input: EvaluationInput): Content {
  const results = evaluateScenarios(laserInputs, input);
  return {
    ruleSet: input.ruleSet,
    edition: ruleSetById(input.ruleSet).edition,
    input,
    laserInputs,
    laserInputsHash: sha256OfJson(hashedInputs(laserInputs)),
    engineVersion: ENGINE_VERSION,
    results,
    summary: summaryOf(results),
  };
}

/**
 * Every result that differs between the evaluated inputs and the laser's present ones. Situations
 * that cover every line cover the new ones too; otherwise new lines make situations of their own.
 */
export function changedResults(
  evaluation: Pick<EvaluationRecord, 'input' | 'laserInputs' | 'results'>,
  today: LaserInputs,
): ResultChange[] {
  const input = adaptedTo(today, evaluation);
  return compareResults(
    { scenarios: evaluation.input.scenarios, results: evaluation.results },
    { scenarios: input.scenarios, results: evaluateScenarios(today, input, { bare: true }) },
  );
}

/** The situations of an evaluation for other inputs of the same laser. */
export function adaptedTo(
  today: LaserInputs,
  evaluation: Pick<EvaluationRecord, 'input' | 'laserInputs'>,
): EvaluationInput {
  const { input, laserInputs } = evaluation;
  const before = new Set(laserInputs.emissions.map(({ id }) => id));
  const now = today.emissions.map(({ id }) => id);
  const added = now.filter((id) => !before.has(id));
  const coversAll = (ids: readonly string[]) => [...before].every((id) => ids.includes(id));
  const scenarios = input.scenarios.map((scenario) => ({
    ...scenario,
    emissionIds: coversAll(scenario.emissionIds)
      ? now
      : scenario.emissionIds.filter((id) => now.includes(id)),
  }));
  const kept = scenarios.filter(({ emissionIds }) => emissionIds.length > 0);
  const isNewCovered = kept.some(({ emissionIds }) =>
    added.every((id) => emissionIds.includes(id)),
  );
  const forNew = isNewCovered ? [] : proposeScenarios(only(today, added), input.ruleSet);
  const ids = new Set(kept.map(({ id }) => id));
  return { ...input, scenarios: [...kept, ...forNew.filter(({ id }) => !ids.has(id))] };
}

function only(inputs: LaserInputs, ids: readonly string[]): LaserInputs {
  return {
    ...inputs,
    emissions: inputs.emissions.filter(({ id }) => ids.includes(id)),
    emissionSets: [],
  };
}

function summaryOf(results: readonly ScenarioResult[]): ResultSummary {
  const evaluated = results.flatMap(({ result }) => (isEvaluated(result) ? [result] : []));
  if (evaluated.length === 0) {
    return { eyeDistanceM: null, skinDistanceM: null, opticalDensity: null };
  }
  return {
    eyeDistanceM: Math.max(...evaluated.map(({ eye }) => eye.hazardDistanceM)),
    skinDistanceM: Math.max(...evaluated.map(({ skin }) => skin.hazardDistanceM)),
    opticalDensity: Math.max(...evaluated.map(({ eye }) => eye.opticalDensity)),
  };
}
