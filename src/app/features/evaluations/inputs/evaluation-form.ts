import type { NonNullableFormBuilder } from '@angular/forms';
import {
  ACTIVITIES,
  type Activity,
  type Evaluation,
  type EvaluationInput,
  evaluationInputSchema,
  type LaserInputs,
  type Scenario,
  scenarioSchema,
} from '@shared/model/evaluations';
import type { FieldError } from '@shared/model/problem';

import { contractErrors } from '../../../core/forms/contract-errors';
import { filled } from '../../../core/forms/filled';
import { formErrors } from '../../../core/forms/form-errors';
import { inOurWords } from './missing-words';
import { readSurroundings, surroundingsForm } from './surroundings';
import { type Typed, typed } from './typed-quantity';

/** The form of one situation. A line that the laser no longer has keeps its place until it is taken out. */
export function scenarioForm(fb: NonNullableFormBuilder, scenario: Scenario, lines: LaserInputs) {
  const lineIds = lines.emissions.map(({ id }) => id);
  return fb.group({
    id: [scenario.id],
    activity: [scenario.activity],
    name: [scenario.name],
    lines: fb.record(
      Object.fromEntries(lineIds.map((id) => [id, scenario.emissionIds.includes(id)])),
    ),
    atWavelengthNm: fb.record<Typed>(
      Object.fromEntries(lineIds.map((id) => [id, typed(scenario.atWavelengthNm[id], 'nm')])),
    ),
    surroundings: surroundingsForm(fb, scenario),
    exposureReason: [scenario.exposureReason],
    note: [scenario.note ?? ''],
  });
}
export type ScenarioForm = ReturnType<typeof scenarioForm>;

/** The form of all that the author decides. */
export function evaluationForm(fb: NonNullableFormBuilder, evaluation: Evaluation) {
  const { input, laserInputs } = evaluation;
  return fb.group({
    ruleSet: [input.ruleSet],
    scenarios: fb.array(input.scenarios.map((scenario) => scenarioForm(fb, scenario, laserInputs))),
    notCovered: fb.group(notCoveredReasons(input)),
    /** One a line. */
    assumptions: [input.assumptions.join('\n')],
    controls: [input.controls ?? ''],
    nonBeamHazards: [input.nonBeamHazards ?? ''],
    conditions: [input.conditions ?? ''],
    note: [input.note ?? ''],
  });
}
export type EvaluationForm = ReturnType<typeof evaluationForm>;

function notCoveredReasons(input: EvaluationInput): Record<Activity, string> {
  const reasonOf = (activity: Activity) =>
    input.notCovered.find((one) => one.activity === activity)?.reason ?? '';
  return {
    operation: reasonOf('operation'),
    alignment: reasonOf('alignment'),
    maintenance: reasonOf('maintenance'),
    service: reasonOf('service'),
  };
}

/** The form's value as the contract wants it, or what is wrong with it, field by field. */
export type EvaluationReading =
  | { readonly ok: true; readonly input: EvaluationInput }
  | { readonly ok: false; readonly errors: readonly FieldError[] };

export function readEvaluation(form: EvaluationForm): EvaluationReading {
  const parsed = evaluationInputSchema.safeParse(candidateOf(form));
  const errors = uniqueByPath([
    ...formErrors(form).map((error) => ({ ...error, path: contractPath(error.path) })),
    ...(parsed.success ? [] : inOurWords(contractErrors(parsed.error))),
  ]);
  return parsed.success && errors.length === 0
    ? { ok: true, input: parsed.data }
    : { ok: false, errors };
}

/** One situation by itself, so that an error in another does not stop its results. */
export type ScenarioReading =
  | { readonly ok: true; readonly scenario: Scenario }
  | { readonly ok: false; readonly errors: readonly FieldError[] };

export function readScenario(form: ScenarioForm): ScenarioReading {
  const parsed = scenarioSchema.safeParse(scenarioOf(form));
  const errors = uniqueByPath([
    ...formErrors(form).map((error) => ({ ...error, path: scenarioPath(error.path) })),
    ...(parsed.success ? [] : inOurWords(contractErrors(parsed.error))),
  ]);
  return parsed.success && errors.length === 0
    ? { ok: true, scenario: parsed.data }
    : { ok: false, errors };
}

function candidateOf(form: EvaluationForm) {
  const value = form.getRawValue();
  return {
    ruleSet: value.ruleSet,
    scenarios: form.controls.scenarios.controls.map(scenarioOf),
    notCovered: ACTIVITIES.filter((activity) => value.notCovered[activity].trim()).map(
      (activity) => ({ activity, reason: value.notCovered[activity] }),
    ),
    assumptions: value.assumptions.split('\n').filter((line) => line.trim()),
    controls: value.controls.trim() || undefined,
    nonBeamHazards: value.nonBeamHazards.trim() || undefined,
    conditions: value.conditions.trim() || undefined,
    note: value.note.trim() || undefined,
  };
}

function scenarioOf(form: ScenarioForm) {
  const { id, activity, name, lines, atWavelengthNm, exposureReason, note } = form.getRawValue();
  const emissionIds = Object.keys(lines).filter((line) => lines[line]);
  return {
    id,
    activity,
    name,
    emissionIds,
    atWavelengthNm: Object.fromEntries(
      emissionIds.flatMap((line) => {
        const at = atWavelengthNm[line];
        return at ? [[line, at.value]] : [];
      }),
    ),
    exposureReason,
    note: note.trim() || undefined,
    ...(filled(readSurroundings(form.controls.surroundings)) as object),
  };
}

/** The contract has no `surroundings`: its fields stand in the situation. */
function contractPath(formPath: string): string {
  return formPath.replace(/\.surroundings\b/, '');
}

function scenarioPath(formPath: string): string {
  return formPath.replace(/^surroundings\./, '');
}

function uniqueByPath(errors: readonly FieldError[]): FieldError[] {
  return errors.filter(
    ({ path }, index) => errors.findIndex((other) => other.path === path) === index,
  );
}
