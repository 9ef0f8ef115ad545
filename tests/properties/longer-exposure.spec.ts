import fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import { RULE_SETS } from '../../shared/hazard/rule-sets';
import type { RuleSetId } from '../support/decimal-model/rows';
import { smallestPrinted } from '../support/limit-of';
import { decades } from '../support/random-cases';

const SEED = 815;

/** Constants printed with two or three digits do not meet exactly where two formulas meet. */
const PRINTED_ROUNDING = 1.005;

/** The exceptions: durations at which the tables let the irradiance limit rise, and by how much. */
const RISES: Readonly<Record<RuleSetId, Readonly<Record<number, [factor: number, why: string]>>>> =
  {
    'icnirp-2013': {
      1e-11: [10.001, 'below 10 ps the retinal limit is flat and has no C_A'],
      1e-9: [1.051, 'ultraviolet: 30 GW/m² times 1 ns is 30, the formula gives 31.5 J/m²'],
      10: [1.023, 'skin: 2000 W/m² after 19.6 kJ/m² at 10 s'],
    },
    'eu-2006-25': {
      1e-11: [1.013, 'retina: 1.5e-4 before 2.7e4 t^0.75'],
      1e-9: [1.051, 'ultraviolet as above; retina: 2.7e4 t^0.75 before 5e-3'],
      5e-5: [1.071, 'near infrared: 5e-2 before 90 t^0.75'],
      10: [1.023, 'skin as above'],
    },
    'iec-60825-1-2014': {
      1e-11: [10.001, 'below 10 ps the retinal limit is flat and has no C4'],
      1e-9: [1.055, 'ultraviolet as above; 302.5 nm: 30 before C2'],
      10: [1.023, 'skin as above'],
    },
    'ansi-z136.1-2014': {
      1e-11: [10.001, 'below 10 ps the retinal limit is flat and has no C_A'],
      1e-9: [3.001, '1400–1500 nm: kept at the irradiance of 2007 below 1 ns'],
      4: [1.009, 'cornea and lens: 0.2 + 0.56 t^0.25 before 1 J/cm²'],
      10: [1.023, 'skin as above'],
    },
    'ansi-z136.1-2007': {
      1e-11: [1.013, 'retina: 1.5e-8 before 2.7 t^0.75'],
      1e-9: [1.042, 'retina: 2.7 t^0.75 before 5e-7'],
      5e-5: [1.071, 'near infrared: 5e-6 before 9e-3 t^0.75'],
      10: [1.023, 'skin as above'],
    },
    'ansi-z136.1-1993': {
      5e-5: [1.071, 'near infrared: 5e-6 before 9e-3 t^0.75'],
      10: [1.023, 'skin as above'],
    },
  };

function allowedRise(ruleSet: RuleSetId, from: number, to: number): number {
  return Object.entries(RISES[ruleSet])
    .filter(([edge]) => from < Number(edge) && Number(edge) <= to)
    .reduce((product, [, [factor]]) => product * factor, PRINTED_ROUNDING);
}

describe(`a longer exposure never raises the irradiance limit (seed ${SEED})`, () => {
  for (const { id, edition } of RULE_SETS) {
    it(`${edition}, eye and skin, but for the listed steps of its tables`, () => {
      fc.assert(
        fc.property(
          fc.constantFrom('eye-point' as const, 'eye-extended' as const, 'skin' as const),
          decades(180, 1e6),
          decades(1e-13, 3e4),
          decades(1.0001, 1000),
          (target, wavelengthNm, durationS, factor) => {
            const source = target === 'eye-extended' ? { sourceMrad: 20 } : {};
            const longer = Math.min(30_000, durationS * factor);
            const at = (t: number): number => {
              const asked = { ruleSet: id, target, wavelengthNm, durationS: t, ...source };
              return smallestPrinted(asked).value / t;
            };
            const rise = at(longer) / at(durationS);
            const place = `${target} ${wavelengthNm} nm, ${durationS} s to ${longer} s: ${rise}`;
            expect(rise, place).toBeLessThanOrEqual(allowedRise(id, durationS, longer));
          },
        ),
        { seed: SEED, numRuns: 500 },
      );
    });
  }
});
