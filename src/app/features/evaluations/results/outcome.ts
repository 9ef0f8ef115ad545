import type { HazardCase } from '@shared/hazard/case';
import type { EvaluationResult } from '@shared/hazard/result';
import { type CaseErrors, isEvaluated, type ScenarioResult } from '@shared/model/evaluation-case';
import type { FieldError } from '@shared/model/problem';
import { type ResultView, resultView } from '@shared/model/result-view';

/** What the bench shows of one case: the last results that could be had, and what stands against newer ones. */
export interface Outcome {
  readonly view: ResultView | null;
  readonly conversions: readonly string[];
  readonly assumptions: readonly string[];
  /** False while the inputs are not valid: the results are those of the last valid inputs. */
  readonly isCurrent: boolean;
  readonly errors: readonly FieldError[];
}

const NOTHING: Outcome = {
  view: null,
  conversions: [],
  assumptions: [],
  isCurrent: false,
  errors: [],
};

/** The outcome after inputs that gave `answer`; what was valid before stays in view while they are not. */
export function outcomeOf(answer: ScenarioResult, previous: Outcome = NOTHING): Outcome {
  const { case: hazardCase, result, conversions, assumptions } = answer;
  if (!hazardCase || !isEvaluated(result)) return refused(errorsOf(result), previous);
  return {
    view: resultView(hazardCase, result),
    conversions,
    assumptions,
    isCurrent: true,
    errors: [],
  };
}

/** The outcome after inputs that are not even a case. */
export function refused(errors: readonly FieldError[], previous: Outcome = NOTHING): Outcome {
  return { ...previous, isCurrent: false, errors };
}

/** A stored result, taken as it is: what was signed is the server's. */
export function storedOutcome(answer: {
  case: unknown;
  result: unknown;
  conversions: readonly string[];
  assumptions: readonly string[];
}): Outcome {
  return outcomeOf({
    scenarioId: '',
    case: answer.case as HazardCase | null,
    result: answer.result as EvaluationResult | CaseErrors,
    conversions: answer.conversions,
    assumptions: answer.assumptions,
  });
}

function errorsOf(result: EvaluationResult | CaseErrors): readonly FieldError[] {
  return isEvaluated(result) ? [] : result.errors;
}
