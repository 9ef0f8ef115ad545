import type { LimitCandidate } from '../../shared/hazard/result';

import { dec } from './decimal-model/decimal';
import { factor } from './decimal-model/limits';
import type { RuleSetId } from './decimal-model/rows';
import { resultOf } from './engine-numbers';

export interface LimitQuestion {
  readonly ruleSet: RuleSetId;
  readonly target: 'eye-point' | 'eye-extended' | 'skin';
  readonly wavelengthNm: number;
  readonly durationS: number;
  readonly sourceMrad?: number | readonly [number, number];
}

/** A wide uniform beam: the same exposure over every aperture, so that the smallest limit governs. */
export function limitCase(question: LimitQuestion): Record<string, unknown> {
  const { ruleSet, wavelengthNm, durationS, sourceMrad } = question;
  return {
    ruleSet,
    beams: [
      {
        wavelengthNm,
        emission: { mode: 'cw', powerW: 1 },
        diameterMm: 100,
        divergenceMrad: 1,
        width: '1/e',
        profile: 'top-hat',
        ...(sourceMrad === undefined ? {} : { sourceMrad }),
      },
    ],
    exposure: { eyeS: durationS },
  };
}

/** The limits of a continuous exposure that the engine considers. */
export function candidatesOf(question: LimitQuestion): readonly LimitCandidate[] {
  const result = resultOf(limitCase(question));
  const side = question.target === 'skin' ? result.skin : result.eye;
  return side.perBeam[0]!.mpe.candidates!;
}

/** Rule sets whose cap of 1200 to 1400 nm is the skin's limit. */
const CAP_IS_SKIN: readonly RuleSetId[] = ['icnirp-2013', 'iec-60825-1-2014'];

export interface PrintedLimit {
  readonly mechanism: string;
  readonly value: number;
}

/**
 * The smallest limit as printed: without the limit that is taken over from the skin's table, and
 * without what a source larger than the photochemical cone adds.
 */
export function smallestPrinted(question: LimitQuestion): PrintedLimit {
  const { ruleSet, target, wavelengthNm } = question;
  const retinal = target !== 'skin' && wavelengthNm >= 400 && wavelengthNm < 1400;
  const capped = retinal && CAP_IS_SKIN.includes(ruleSet);
  const own = candidatesOf(question)
    .filter(({ mechanism }) => !(capped && mechanism === 'corneal'))
    .map(({ mechanism, value }) => ({
      mechanism,
      value: retinal && mechanism === 'photochemical' ? value / coneFactor(question) : value,
    }));
  return own.reduce((a, b) => (b.value < a.value ? b : a));
}

function coneFactor({ ruleSet, wavelengthNm, durationS, sourceMrad }: LimitQuestion): number {
  const alpha = typeof sourceMrad === 'number' ? sourceMrad : 0;
  const source = { x: dec(alpha), y: dec(alpha) };
  const gamma = factor('gamma_ph', { ruleSet, wavelengthNm, durationS, source });
  return gamma ? Math.max(1, alpha / gamma.toNumber()) ** 2 : 1;
}
