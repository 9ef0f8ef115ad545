import fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import type { WarningCode } from '../../shared/hazard/result';
import { axes, type ModelBeam, type ModelCase } from '../support/decimal-model/case';
import { shortestDurationS } from '../support/decimal-model/rows';
import { resultOf } from '../support/engine-numbers';
import { aCase } from '../support/random-cases';

const SEED = 2_718;

const warned = (input: unknown, code: WarningCode): boolean =>
  resultOf(input).warnings.some((warning) => warning.code === code);

const isDirect = (input: ModelCase): boolean => (input.path?.kind ?? 'direct') === 'direct';

/** Width of a Gaussian at 1/e², in the unit of the value. */
function atE2(beam: ModelBeam, value: number): number {
  return beam.width === '1/e' ? value * Math.SQRT2 : value;
}

/** Whether an axis of a Gaussian diverges less than diffraction allows for its waist. */
function belowDiffraction(beam: ModelBeam): boolean {
  if (beam.profile === 'top-hat') return false;
  return [0, 1].some((axis) => {
    const exit = axes(beam.diameterMm!)[axis]! / 1000;
    const divergence = axes(beam.divergenceMrad!)[axis]! / 1000;
    const z = beam.waistDistanceM ?? 0;
    const waist = Math.sqrt(exit ** 2 - (divergence * z) ** 2);
    const least = (4 * beam.wavelengthNm * 1e-9) / (Math.PI * atE2(beam, waist));
    return atE2(beam, divergence) < least;
  });
}

describe(`warnings are given exactly when they are due (seed ${SEED})`, () => {
  const check = (what: (input: ModelCase) => void, numRuns = 150): void =>
    fc.assert(fc.property(aCase, what), { seed: SEED, numRuns });

  it('a superseded edition', () => {
    check((input) => {
      const old = ['ansi-z136.1-2007', 'ansi-z136.1-1993'].includes(input.ruleSet);
      expect(warned(input, 'superseded-edition')).toBe(old);
    });
  });

  it('a pulse shorter than the tables', () => {
    check((input) => {
      const short = input.beams.some(
        ({ emission }) =>
          emission.mode !== 'cw' && emission.pulseDurationS < shortestDurationS(input.ruleSet),
      );
      expect(warned(input, 'outside-validity'), JSON.stringify(input)).toBe(short);
    });
  });

  it('the other growth reaches over 1 % farther', () => {
    check((input) => {
      const ansi = input.ruleSet.startsWith('ansi');
      const model = input.model ?? {
        growth: ansi ? 'hyperbolic' : 'linear',
        onAxis: 'aperture-mean',
      };
      const growth = model.growth === 'linear' ? 'hyperbolic' : 'linear';
      const [own, other] = [resultOf(input), resultOf({ ...input, model: { ...model, growth } })];
      const farther = (['eye', 'skin'] as const).some(
        (side) => other[side].hazardDistanceM > 1.01 * own[side].hazardDistanceM,
      );
      expect(warned(input, 'growth-model'), JSON.stringify(input)).toBe(farther);
    });
  });

  it('a Gaussian that diverges less than diffraction allows', () => {
    check((input) => {
      if (!isDirect(input)) return;
      const below = input.beams.some(belowDiffraction);
      expect(warned(input, 'below-diffraction-limit'), JSON.stringify(input)).toBe(below);
    });
  });

  it('a governing limit that is held from memory with low confidence', () => {
    const at = (wavelengthNm: number, pulseDurationS: number): unknown => ({
      ruleSet: 'ansi-z136.1-2014',
      beams: [
        {
          wavelengthNm,
          emission: { mode: 'single', pulseEnergyJ: 1, pulseDurationS },
          diameterMm: 1,
          divergenceMrad: 10,
          width: '1/e',
          profile: 'gaussian',
        },
      ],
      exposure: { eyeS: 10 },
    });
    expect(warned(at(1550, 1e-10), 'low-confidence-row')).toBe(true);
    expect(warned(at(1450, 1e-6), 'low-confidence-row')).toBe(true);
    expect(warned(at(1064, 1e-8), 'low-confidence-row')).toBe(false);
  });

  it('every result carries its cautions, among them who decides', () => {
    check((input) => {
      const cautions = resultOf(input).cautions.join(' ');
      expect(cautions).toMatch(/trained/i);
      expect(cautions).toMatch(/laser safety officer|LSO/i);
      expect(cautions).toContain(resultOf(input).edition);
    }, 20);
  });
});
