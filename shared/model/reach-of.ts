import { evaluate } from '../hazard/evaluate';
import type { HazardCase } from '../hazard/case';
import type { EvaluationResult } from '../hazard/result';
import { isEvaluated, type ScenarioResult } from './evaluation-case';
import type { EvaluationInput, Scenario } from './evaluations';
import type { Reach } from './lasers';

/** How far the worst situation reaches: what the reach strip draws. */
export type WorstReach = Omit<Reach, 'evaluationId' | 'evaluationNumber' | 'state'>;

interface Evaluated {
  readonly scenario: Scenario;
  readonly case: HazardCase;
  readonly result: EvaluationResult;
}

/** Undefined when no situation could be evaluated. Each figure is the worst of all situations. */
export function reachOf(
  input: Pick<EvaluationInput, 'ruleSet' | 'scenarios'>,
  results: readonly ScenarioResult[],
): WorstReach | undefined {
  const evaluated = input.scenarios.flatMap((scenario): Evaluated[] => {
    const found = results.find((one) => one.scenarioId === scenario.id);
    if (!found?.case || !isEvaluated(found.result)) return [];
    return [{ scenario, case: found.case, result: found.result }];
  });
  const [first, ...others] = evaluated;
  if (!first) return undefined;
  const farther = (a: Evaluated, b: Evaluated) =>
    b.result.eye.hazardDistanceM > a.result.eye.hazardDistanceM ? b : a;
  const worst = others.reduce(farther, first);
  const aided = evaluated.flatMap(({ result }) => result.eye.aidedHazardDistanceM ?? []);
  const { eyeS, skinS } = worst.scenario;
  return {
    ruleSet: input.ruleSet,
    eyeS,
    skinS: skinS ?? eyeS,
    eyeDistanceM: worst.result.eye.hazardDistanceM,
    skinDistanceM: Math.max(...evaluated.map(({ result }) => result.skin.hazardDistanceM)),
    ...(aided.length > 0 ? { aidedDistanceM: Math.max(...aided) } : {}),
    opticalDensity: Math.max(...evaluated.map(({ result }) => result.eye.opticalDensity)),
    scenario: worst.scenario.name,
    lines: linesAlone(worst),
  };
}

/** Each line of the situation as if it were on alone. */
function linesAlone({ case: whole, result }: Evaluated): Reach['lines'] {
  const [first, ...others] = whole.beams;
  if (first && others.length === 0) {
    return [{ wavelengthNm: first.wavelengthNm, eyeDistanceM: result.eye.hazardDistanceM }];
  }
  return whole.beams.flatMap((beam) => {
    const alone = evaluate({ ...whole, beams: [beam] }, { bare: true });
    if (!isEvaluated(alone)) return [];
    return [{ wavelengthNm: beam.wavelengthNm, eyeDistanceM: alone.eye.hazardDistanceM }];
  });
}
