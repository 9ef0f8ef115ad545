import type { ReachDistances } from '@shared/drawing/reach';
import type { RuleSetId } from '@shared/hazard/rule-sets';
import { beamOf } from '@shared/model/emission-beam';
import { evaluateScenarios, isEvaluated } from '@shared/model/evaluation-case';
import { laserInputsOf } from '@shared/model/laser-inputs';
import { type Emission, emissionSchema } from '@shared/model/lasers';
import { proposeScenarios } from '@shared/model/propose-scenarios';
import { reachOf, type WorstReach } from '@shared/model/reach-of';

import { filled } from '../../../core/forms/filled';
import { emissionFrom, type EmissionValue, type LaserFormValue } from './laser-form-value';

/** What can be said while the record is still being typed. */
export interface Preview {
  readonly reach: (ReachDistances & WorstReach) | undefined;
  /** No line holds anything yet. */
  readonly isEmpty: boolean;
  /** Lines that do not count, and what the result warns of. */
  readonly notes: readonly string[];
}

/** The reach in operation, by the lines that are complete so far. */
export function previewOf(
  { emissions, emissionSets }: LaserFormValue,
  ruleSet: RuleSetId,
  wallDistanceM: number | undefined,
): Preview {
  const lines = emissions.map(lineOf);
  const complete = lines.flatMap(({ emission }) => emission ?? []);
  const ids = complete.map(({ id }) => id);
  const sets = emissionSets
    .map(({ name, emissionIds }) => ({
      name,
      emissionIds: emissionIds.filter((id) => ids.includes(id)),
    }))
    .filter(({ emissionIds }) => emissionIds.length > 0);
  const missing = lines.flatMap(({ why }, index) =>
    why ? [`Line ${index + 1} does not count yet. ${why}`] : [],
  );
  const isEmpty = emissions.every((line) => line.wavelengthNm.value === null);
  if (complete.length === 0) return { reach: undefined, isEmpty, notes: isEmpty ? [] : missing };

  const inputs = laserInputsOf({ emissions: complete, emissionSets: sets }, wallDistanceM);
  const scenarios = proposeScenarios(inputs, ruleSet).filter(
    ({ activity }) => activity === 'operation',
  );
  const results = evaluateScenarios(inputs, { ruleSet, scenarios });
  const worst = reachOf({ ruleSet, scenarios }, results);
  const warnings = results.flatMap(({ result }) =>
    isEvaluated(result)
      ? // How the growth model matters belongs to the evaluation.
        result.warnings.filter(({ code }) => code !== 'growth-model').map(({ text }) => text)
      : result.errors.map(({ message }) => message),
  );
  return {
    reach: worst && { ...worst, wallDistanceM },
    isEmpty: false,
    notes: [...missing, ...new Set(warnings)],
  };
}

function lineOf(value: EmissionValue): { emission?: Emission; why?: string } {
  if (value.wavelengthNm.value === null) return { why: 'The wavelength is missing.' };
  const emission = emissionSchema.safeParse(filled(emissionFrom(value))).data;
  if (!emission) return { why: 'A field of it cannot be read.' };
  const { wavelengthNm, wavelengthToNm } = emission;
  const beam = beamOf(emission, wavelengthToNm && wavelengthNm.value);
  return beam.ok ? { emission } : { why: beam.errors.map(({ message }) => message).join(' ') };
}
