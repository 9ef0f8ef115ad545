import fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import { evaluate } from '../../shared/hazard/evaluate';
import type { EvaluationResult } from '../../shared/hazard/result';
import type { Emission, ModelBeam, ModelCase } from '../support/decimal-model/case';
import { engineNumbers, resultOf } from '../support/engine-numbers';
import { aCase, decades } from '../support/random-cases';

const SEED = 4_711;
const options = (numRuns: number): fc.Parameters<unknown> => ({ seed: SEED, numRuns });

/** Relative room for rounding between two ways to the same number. */
const ROUNDING = 1e-9;

function scaled(emission: Emission, factor: number): Emission {
  return emission.mode === 'cw'
    ? { ...emission, powerW: emission.powerW * factor }
    : { ...emission, pulseEnergyJ: emission.pulseEnergyJ * factor };
}

function withBeams(input: ModelCase, change: (beam: ModelBeam) => ModelBeam): ModelCase {
  return { ...input, beams: input.beams.map(change) };
}

const relative = (a: number, b: number): number =>
  a === b ? 0 : Math.abs(a - b) / Math.max(Math.abs(a), Math.abs(b));

function expectClose(actual: unknown, expected: unknown, tolerance: number, place = ''): void {
  if (typeof expected === 'number') {
    expect(relative(actual as number, expected), `${place}: ${actual}, ${expected}`).toBeLessThan(
      tolerance,
    );
  } else if (typeof expected === 'object' && expected !== null) {
    expect(Object.keys(actual as object), place).toEqual(Object.keys(expected));
    for (const [key, value] of Object.entries(expected)) {
      expectClose((actual as Record<string, unknown>)[key], value, tolerance, `${place}.${key}`);
    }
  } else expect(actual, place).toBe(expected);
}

describe(`properties of the hazard engine (seed ${SEED})`, () => {
  it('more power never shortens a hazard distance', () => {
    fc.assert(
      fc.property(aCase, decades(1.001, 1e4), (input, factor) => {
        const less = resultOf(input);
        const more = resultOf(
          withBeams(input, (b) => ({ ...b, emission: scaled(b.emission, factor) })),
        );
        for (const side of ['eye', 'skin'] as const) {
          const low = less[side].hazardDistanceM;
          expect(more[side].hazardDistanceM).toBeGreaterThanOrEqual(low * (1 - ROUNDING));
          expect(more[side].opticalDensity).toBeGreaterThanOrEqual(less[side].opticalDensity);
        }
      }),
      options(150),
    );
  });

  it('two equal beams of half the power equal one', () => {
    fc.assert(
      fc.property(aCase, (input) => {
        const one = { ...input, beams: input.beams.slice(0, 1) };
        const half = { ...one.beams[0]!, emission: scaled(one.beams[0]!.emission, 0.5) };
        const whole = resultOf(one);
        const halves = resultOf({ ...one, beams: [half, half] });
        for (const side of ['eye', 'skin'] as const) {
          expectClose(halves[side].hazardDistanceM, whole[side].hazardDistanceM, ROUNDING);
          const densities = [halves[side].opticalDensity, whole[side].opticalDensity] as const;
          expect(Math.abs(densities[0] - densities[1])).toBeLessThan(1e-10);
        }
      }),
      options(150),
    );
  });

  it('a width at 1/e² and its counterpart at 1/e give the same result', () => {
    const narrower = (value: ModelBeam['diameterMm']): ModelBeam['diameterMm'] => {
      if (value === undefined) return undefined;
      return typeof value === 'number'
        ? value / Math.SQRT2
        : [value[0] / Math.SQRT2, value[1] / Math.SQRT2];
    };
    fc.assert(
      fc.property(aCase, (input) => {
        const gaussian = (b: ModelBeam): ModelBeam => ({ ...b, profile: 'gaussian' });
        const atE2 = withBeams(input, (b) => ({ ...gaussian(b), width: '1/e2' }));
        const atE = withBeams(input, (b) => ({
          ...gaussian(b),
          width: '1/e',
          diameterMm: narrower(b.diameterMm!)!,
          divergenceMrad: narrower(b.divergenceMrad!)!,
        }));
        const path = input.path;
        const lens =
          path?.kind === 'lens' && path.diameterAtLensMm !== undefined
            ? { path: { ...path, diameterAtLensMm: path.diameterAtLensMm / Math.SQRT2 } }
            : {};
        expectClose(engineNumbers({ ...atE, ...lens }), engineNumbers(atE2), ROUNDING);
      }),
      options(150),
    );
  });

  it('far away the hyperbolic growth becomes the linear one', () => {
    fc.assert(
      fc.property(decades(1, 1e4), decades(0.2, 5), decades(0.5, 5), (powerW, divergence, d) => {
        const beam = {
          wavelengthNm: 532,
          emission: { mode: 'cw', powerW },
          diameterMm: d,
          divergenceMrad: divergence,
          width: '1/e',
          profile: 'gaussian',
        };
        const distance = (growth: string, onAxis: string): number =>
          resultOf({
            ruleSet: 'icnirp-2013',
            beams: [beam],
            exposure: { eyeS: 0.25 },
            model: { growth, onAxis },
          }).eye.hazardDistanceM;
        // On the axis: √(D² − d²)/φ and (D − d)/φ, so that they differ by less than d/φ.
        const [round, straight] = [distance('hyperbolic', 'peak'), distance('linear', 'peak')];
        const most = (d / divergence) * (1 + ROUNDING);
        expect(round - straight).toBeGreaterThanOrEqual(-ROUNDING * round);
        expect(round - straight).toBeLessThanOrEqual(most);
        const wide = Math.hypot(d / divergence, round);
        expect(relative(straight + d / divergence, wide)).toBeLessThan(ROUNDING);
        // And far away the mean over the aperture is the value on the axis.
        if (round > 1000 * (7 / divergence)) {
          expect(relative(distance('hyperbolic', 'aperture-mean'), round)).toBeLessThan(1e-6);
        }
      }),
      options(200),
    );
  });

  it('the exposure at the hazard distance equals the limit', () => {
    fc.assert(
      fc.property(aCase, (input) => {
        const one: ModelCase = {
          ...input,
          beams: input.beams.slice(0, 1),
          model: { growth: input.model?.growth ?? 'linear', onAxis: 'aperture-mean' },
        };
        const r = resultOf(one).eye.hazardDistanceM;
        const spot = one.path?.kind === 'diffuse' && one.path.spotMm !== undefined;
        if (!(r > 1e-6) || spot) return;
        const near = resultOf({ ...one, at: { distanceM: r * (1 - 1e-6) } });
        const far = resultOf({ ...one, at: { distanceM: r * (1 + 1e-6) } });
        expect(far.eye.at!.opticalDensity).toBe(0);
        expect(near.eye.at!.opticalDensity).toBeLessThan(1e-4);
        expect(near.eye.at!.opticalDensity).toBeGreaterThanOrEqual(0);
        const between = resultOf({ ...one, at: { distanceM: r } }).eye.at!.opticalDensity;
        expect(between).toBeLessThan(1e-8);
      }),
      options(200),
    );
  });

  it('an optical aid never shortens the hazard distance', () => {
    fc.assert(
      fc.property(aCase, (input) => {
        const { eye } = resultOf(input);
        if (input.aid) expect(eye.aidedHazardDistanceM).toBeGreaterThanOrEqual(eye.hazardDistanceM);
        else expect(eye.aidedHazardDistanceM).toBeUndefined();
      }),
      options(200),
    );
  });

  it('air only shortens distances', () => {
    fc.assert(
      fc.property(aCase, decades(0.01, 10), (input, attenuationPerKm) => {
        const { air: replaced, ...clear } = input;
        const hazy = resultOf({ ...clear, air: { attenuationPerKm } });
        if (replaced) expect(resultOf(input).eye.hazardDistanceM).toBeGreaterThanOrEqual(0);
        const distance = resultOf(clear).eye.hazardDistanceM;
        expect(hazy.eye.hazardDistanceM).toBeLessThanOrEqual(distance * (1 + ROUNDING));
      }),
      options(100),
    );
  });

  it('a case written in other units gives the same result to 1e-12', () => {
    fc.assert(
      fc.property(aCase, (input) => {
        // Through the units of a data sheet and back: mW, µm, degrees, minutes.
        const through = (value: number, unit: number): number => (value * unit) / unit;
        const again = withBeams(input, (b) => ({
          ...b,
          wavelengthNm: through(b.wavelengthNm, 1e-3),
          emission: scaled(scaled(b.emission, 1e3), 1e-3),
          ...(typeof b.diameterMm === 'number' ? { diameterMm: through(b.diameterMm, 1e3) } : {}),
          ...(typeof b.divergenceMrad === 'number'
            ? { divergenceMrad: through(b.divergenceMrad, 180 / (1000 * Math.PI)) }
            : {}),
        }));
        const [numbers, expected] = [engineNumbers(again), engineNumbers(input)];
        for (const [key, value] of Object.entries(expected)) {
          const room = /[dD]istance$/.test(key) ? ROUNDING : 1e-12;
          const size = key.endsWith('opticalDensity') ? 1 : Math.abs(value);
          expect(Math.abs(numbers[key]! - value), key).toBeLessThanOrEqual(room * size);
        }
      }),
      options(150),
    );
  });

  it('a bare evaluation has the same numbers', () => {
    fc.assert(
      fc.property(aCase, (input) => {
        const full = resultOf(input);
        const bare = evaluate(input, { bare: true }) as EvaluationResult;
        expect(bare.steps).toBeUndefined();
        const stripped = structuredClone(full);
        delete stripped.steps;
        for (const side of ['eye', 'skin'] as const) {
          for (const beam of stripped[side].perBeam) delete beam.mpe.candidates;
        }
        expect(bare).toEqual(stripped);
      }),
      options(150),
    );
  });

  it('a result survives JSON, and the same case gives the same result again', () => {
    fc.assert(
      fc.property(aCase, (input) => {
        const result = resultOf(input);
        expect(JSON.parse(JSON.stringify(result))).toEqual(result);
        expect(resultOf(JSON.parse(JSON.stringify(input)))).toEqual(result);
      }),
      options(150),
    );
  });
});
