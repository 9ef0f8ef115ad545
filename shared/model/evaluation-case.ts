import type { Beam, HazardCase, Path } from '../hazard/case';
import { evaluate, type EvaluateOptions } from '../hazard/evaluate';
import type { EvaluationResult } from '../hazard/result';
import { ruleSetById, type RuleSetId } from '../hazard/rule-sets';
import { figure } from '../text/figure';
import { beamOf } from './emission-beam';
import type { EvaluationInput, LaserInputs, Scenario } from './evaluations';
import { lineName } from './laser-inputs';
import type { Emission } from './lasers';
import type { FieldError } from './problem';

/** The engine's case for one situation, with what was converted and assumed on the way. */
export type ScenarioCase =
  | {
      readonly ok: true;
      readonly case: HazardCase;
      readonly conversions: readonly string[];
      readonly assumptions: readonly string[];
    }
  | { readonly ok: false; readonly errors: readonly FieldError[] };

/** Why a situation could not be evaluated. */
export interface CaseErrors {
  readonly errors: readonly FieldError[];
}

/** The engine's answer for one situation. */
export interface ScenarioResult {
  readonly scenarioId: string;
  /** Null when the lines of the situation do not make a case. */
  readonly case: HazardCase | null;
  readonly result: EvaluationResult | CaseErrors;
  readonly conversions: readonly string[];
  readonly assumptions: readonly string[];
}

interface LineBeam {
  readonly emission: Emission;
  readonly beam: Beam;
  readonly fiber: Path | undefined;
}

/**
 * The case of one situation. Paths of errors begin with the scenario's own fields, or with
 * `laserInputs.` when the laser's record is at fault.
 */
export function scenarioCase(
  inputs: LaserInputs,
  scenario: Scenario,
  ruleSet: RuleSetId,
): ScenarioCase {
  const errors: FieldError[] = [];
  const conversions: string[] = [];
  const assumptions: string[] = [];
  const lines: LineBeam[] = [];
  const several = scenario.emissionIds.length > 1;
  for (const id of scenario.emissionIds) {
    const index = inputs.emissions.findIndex((emission) => emission.id === id);
    const emission = inputs.emissions[index];
    if (!emission) {
      errors.push(unknownLine(id, inputs));
      continue;
    }
    const line = beamOf(emission, scenario.atWavelengthNm[id], scenario.path as Path);
    if (!line.ok) {
      errors.push(
        ...line.errors.map((error) => ({ ...error, path: pathOf(error.path, id, index) })),
      );
      continue;
    }
    const name = several ? `${lineName(emission)}: ` : '';
    conversions.push(...line.conversions.map((sentence) => name + sentence));
    assumptions.push(...line.assumptions.map((sentence) => name + sentence));
    lines.push({ emission, beam: named(line.beam, emission), fiber: line.fiber });
  }
  const path = commonPath(scenario, lines, errors);
  if (errors.length > 0) return { ok: false, errors };
  const beams = lines.map(({ beam }) => beam);
  return {
    ok: true,
    case: { id: scenario.id, ruleSet, beams, path, ...settingsOf(scenario, ruleSet) },
    conversions,
    assumptions,
  };
}

/** Every situation of an evaluation, computed. The browser and the server both call this. */
export function evaluateScenarios(
  inputs: LaserInputs,
  input: Pick<EvaluationInput, 'ruleSet' | 'scenarios'>,
  options: EvaluateOptions = {},
): ScenarioResult[] {
  return input.scenarios.map((scenario, index) => {
    const built = scenarioCase(inputs, scenario, input.ruleSet);
    if (!built.ok) {
      const errors = built.errors.map((error) => placed(error, index));
      const none = { conversions: [], assumptions: [] };
      return { scenarioId: scenario.id, case: null, result: { errors }, ...none };
    }
    const { conversions, assumptions } = built;
    const result = evaluate(built.case, options);
    return { scenarioId: scenario.id, case: built.case, result, conversions, assumptions };
  });
}

/** Whether the engine could evaluate the case. */
export function isEvaluated(result: EvaluationResult | CaseErrors): result is EvaluationResult {
  return !('errors' in result);
}

/** Lines that no situation covers, in words. */
export function uncoveredLines(
  inputs: LaserInputs,
  input: Pick<EvaluationInput, 'scenarios'>,
): string[] {
  const covered = new Set(input.scenarios.flatMap((scenario) => scenario.emissionIds));
  return inputs.emissions.filter(({ id }) => !covered.has(id)).map(lineName);
}

function settingsOf(scenario: Scenario, ruleSet: RuleSetId): Omit<HazardCase, 'ruleSet' | 'beams'> {
  const { eyeS, skinS, aid, attenuationPerKm, growth, onAxis, atDistanceM } = scenario;
  const model = ruleSetById(ruleSet).defaultModel;
  return {
    exposure: { eyeS, ...(skinS === undefined ? {} : { skinS }) },
    ...(aid ? { aid } : {}),
    ...(attenuationPerKm ? { air: { attenuationPerKm } } : {}),
    ...(growth || onAxis
      ? { model: { growth: growth ?? model.growth, onAxis: onAxis ?? model.onAxis } }
      : {}),
    ...(atDistanceM === undefined ? {} : { at: { distanceM: atDistanceM } }),
  };
}

/** The engine takes one path for all beams: lines that leave by different ways need two situations. */
function commonPath(scenario: Scenario, lines: readonly LineBeam[], errors: FieldError[]): Path {
  if (scenario.path.kind !== 'direct') return scenario.path as Path;
  const [first, ...others] = lines;
  const other = others.find(({ fiber }) => !sameFiber(fiber, first?.fiber));
  if (first && other) {
    errors.push({
      path: 'emissionIds',
      message:
        `${lineName(first.emission)} leaves by ${way(first.fiber)}, ` +
        `${lineName(other.emission)} by ${way(other.fiber)}: they are not evaluated together.`,
      allowed: 'Lines that leave the same way; make another situation for the others.',
    });
  }
  return first?.fiber ?? { kind: 'direct' };
}

function sameFiber(a: Path | undefined, b: Path | undefined): boolean {
  return JSON.stringify(a) === JSON.stringify(b);
}

function way(fiber: Path | undefined): string {
  if (!fiber || fiber.kind !== 'fiber') return 'a free beam';
  return 'numericalAperture' in fiber
    ? `a fiber of numerical aperture ${figure(fiber.numericalAperture)}`
    : `a fiber of mode field ${figure(fiber.modeFieldDiameterUm, 'µm')}`;
}

function unknownLine(id: string, inputs: LaserInputs): FieldError {
  return {
    path: 'emissionIds',
    message: `The laser has no line "${id}".`,
    allowed: `Lines of this laser: ${inputs.emissions.map(lineName).join(', ') || 'none on record'}.`,
  };
}

function named(beam: Beam, emission: Emission): Beam {
  return { ...beam, label: emission.label ?? lineName(emission) };
}

/** The wavelength is chosen in the situation; every other figure stands in the laser's record. */
function pathOf(field: string, emissionId: string, index: number): string {
  return field === 'atWavelengthNm'
    ? `atWavelengthNm.${emissionId}`
    : `laserInputs.emissions[${index}].${field}`;
}

function placed(error: FieldError, index: number): FieldError {
  if (error.path.startsWith('laserInputs.')) return error;
  return { ...error, path: `scenarios[${index}].${error.path}` };
}
