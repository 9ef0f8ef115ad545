import type { HazardCase } from './case';
import { cautionsOf } from './cautions';
import { derive } from './derivation/derive';
import { DerivedResult } from './derived-result';
import { ENGINE_VERSION } from './engine-version';
import { parseCase } from './parse-case';
import { sideResult } from './side-result';
import type { EvaluationErrors, EvaluationResult } from './result';
import { sceneOf } from './scene';
import { sideHazard } from './side-hazard';
import { warningsOf } from './warnings';

/** What can be switched off for speed. */
export interface EvaluateOptions {
  /** Leaves out steps and candidates. */
  readonly bare?: boolean;
}

/** Evaluates one case. Never throws: what is wrong with the case comes back as field errors. */
export function evaluate(
  input: unknown,
  { bare = false }: EvaluateOptions = {},
): EvaluationResult | EvaluationErrors {
  const parsed = parseCase(input);
  if (!parsed.ok) {
    const { id, errors } = parsed;
    return id === undefined ? { errors } : { id, errors };
  }
  try {
    return evaluateCase(parsed.case, bare);
  } catch (error) {
    // Why: numbers such as 1e-300 are valid each, but lead beyond what can be computed with.
    if (error instanceof RangeError) return outOfRange(parsed.case.id);
    throw error;
  }
}

function evaluateCase(hazardCase: HazardCase, bare: boolean): EvaluationResult {
  const scene = sceneOf(hazardCase);
  const { ruleSet } = scene.rules;
  const eye = sideHazard(scene, 'eye');
  const skin = sideHazard(scene, 'skin');
  const { id } = hazardCase;
  const result: EvaluationResult = {
    ruleSet: hazardCase.ruleSet,
    edition: ruleSet.edition,
    engineVersion: ENGINE_VERSION,
    eye: sideResult(scene, eye, bare),
    skin: sideResult(scene, skin, bare),
    distances: { hazardDistanceM: { eye: eye.hazardDistanceM, skin: skin.hazardDistanceM } },
    warnings: warningsOf(scene, eye, skin),
    cautions: cautionsOf(ruleSet),
  };
  const named = id === undefined ? result : { id, ...result };
  return bare ? named : new DerivedResult(named, () => derive(scene, eye, skin));
}

function outOfRange(id: string | undefined): EvaluationErrors {
  const errors = [
    {
      path: '',
      message: 'The numbers of this case lie too far apart to be computed with.',
      allowed: 'powers, sizes and times that a laser can have',
    },
  ];
  return id === undefined ? { errors } : { id, errors };
}
