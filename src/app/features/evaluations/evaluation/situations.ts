import { proposedExposure } from '@shared/hazard/default-exposure';
import { evaluateScenarios } from '@shared/model/evaluation-case';
import type { Activity, LaserInputs, Scenario } from '@shared/model/evaluations';
import { ACTIVITY_WORDS } from '@shared/text/hazard-words';
import type { RuleSetId } from '@shared/hazard/rule-sets';

import { atOurFields } from '../inputs/case-paths';
import type { ScenarioReading } from '../inputs/evaluation-form';
import { type Outcome, outcomeOf, refused } from '../results/outcome';

/** An outcome with the inputs it came from, so that only what changed is computed again. */
export interface KeptOutcome {
  readonly key: string;
  readonly outcome: Outcome;
}

/** The outcome of one situation after a keystroke; the same object when nothing changed in it. */
export function situationOutcome(
  laserInputs: LaserInputs,
  ruleSet: RuleSetId,
  reading: ScenarioReading,
  previous: KeptOutcome | undefined,
): KeptOutcome {
  const key = JSON.stringify([ruleSet, reading]);
  if (previous?.key === key) return previous;
  if (!reading.ok) return { key, outcome: refused(reading.errors, previous?.outcome) };
  const [answer] = evaluateScenarios(laserInputs, { ruleSet, scenarios: [reading.scenario] });
  if (!answer) return { key, outcome: refused([], previous?.outcome) };
  const outcome = outcomeOf(answer, previous?.outcome);
  return { key, outcome: { ...outcome, errors: atOurFields(outcome.errors) } };
}

/** What is proposed for these lines on this path. */
export function proposalFor(
  laserInputs: LaserInputs,
  emissionIds: readonly string[],
  pathKind: Scenario['path']['kind'],
) {
  const chosen = laserInputs.emissions.filter(({ id }) => emissionIds.includes(id));
  const wavelengths = chosen.flatMap(({ wavelengthNm, wavelengthToNm }) => [
    wavelengthNm.value,
    ...(wavelengthToNm ? [wavelengthToNm.value] : []),
  ]);
  return proposedExposure(wavelengths.length > 0 ? wavelengths : [532], pathKind);
}

/** A new situation: all lines, the direct beam, the proposed exposure. */
export function newSituation(id: string, activity: Activity, laserInputs: LaserInputs): Scenario {
  const emissionIds = laserInputs.emissions.map((line) => line.id);
  const { eyeS, skinS, reason } = proposalFor(laserInputs, emissionIds, 'direct');
  return {
    id,
    activity,
    name: ACTIVITY_WORDS[activity],
    emissionIds,
    atWavelengthNm: Object.fromEntries(
      laserInputs.emissions.flatMap((line) =>
        line.wavelengthToNm ? [[line.id, line.wavelengthNm.value]] : [],
      ),
    ),
    eyeS,
    skinS,
    exposureReason: reason,
    path: { kind: 'direct' },
  };
}
