import { evaluate } from '../../shared/hazard/evaluate';
import type { EvaluationErrors, EvaluationResult, SideResult } from '../../shared/hazard/result';

import type { Numbers } from './decimal-model/numbers';

/** Evaluates a case that must be valid. */
export function resultOf(input: unknown): EvaluationResult {
  const outcome = evaluate(input);
  if ('errors' in outcome) {
    throw new Error(`${JSON.stringify(input)} was refused: ${JSON.stringify(outcome.errors)}`);
  }
  return outcome;
}

/** Evaluates a case that must be refused. */
export function errorsOf(input: unknown): EvaluationErrors['errors'] {
  const outcome = evaluate(input);
  if (!('errors' in outcome)) throw new Error(`${JSON.stringify(input)} was evaluated`);
  return outcome.errors;
}

/** The numbers of the engine's result under the names that the model uses. */
export function engineNumbers(input: unknown): Numbers {
  const result = resultOf(input);
  return { ...sideNumbers('eye', result.eye), ...sideNumbers('skin', result.skin) };
}

function sideNumbers(side: string, result: SideResult): Record<string, number> {
  const numbers: Record<string, number> = {
    [`${side}.opticalDensity`]: result.opticalDensity,
    [`${side}.hazardDistance`]: result.hazardDistanceM,
  };
  if (result.at) numbers[`${side}.at.opticalDensity`] = result.at.opticalDensity;
  if (result.aidedHazardDistanceM !== undefined) {
    numbers[`${side}.aidedHazardDistance`] = result.aidedHazardDistanceM;
  }
  result.perBeam.forEach((beam, i) => {
    const prefix = `${side}.${i}`;
    numbers[`${prefix}.mpe.radiantExposure`] = beam.mpe.radiantExposureJPerM2;
    numbers[`${prefix}.mpe.irradiance`] = beam.mpe.irradianceWPerM2;
    numbers[`${prefix}.mpe.limitingAperture`] = beam.mpe.limitingApertureMm;
    numbers[`${prefix}.exposure.radiantExposure`] = beam.exposure.radiantExposureJPerM2;
    numbers[`${prefix}.exposure.irradiance`] = beam.exposure.irradianceWPerM2;
    numbers[`${prefix}.exposure.distance`] = beam.exposure.distanceM;
    numbers[`${prefix}.opticalDensity`] = beam.opticalDensity;
    if (beam.at) {
      numbers[`${prefix}.at.radiantExposure`] = beam.at.radiantExposureJPerM2;
      numbers[`${prefix}.at.opticalDensity`] = beam.at.opticalDensity;
    }
  });
  return numbers;
}
