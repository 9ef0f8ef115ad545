import { describe, expect, it } from 'vitest';

import { apertureFraction } from '../../support/decimal-model/geometry';
import { dec } from '../../support/decimal-model/decimal';
import { resultOf } from '../../support/engine-numbers';

import fixtures from './fixtures.json';

type Row = (typeof fixtures.fractions)[number];

/** A case whose limiting aperture is the wanted one, and the side on which it is. */
const APERTURES: Record<number, { side: 'eye' | 'skin'; wavelengthNm: number; eyeS: number }> = {
  1: { side: 'eye', wavelengthNm: 1550, eyeS: 0.1 },
  3.5: { side: 'skin', wavelengthNm: 532, eyeS: 0.25 },
  7: { side: 'eye', wavelengthNm: 532, eyeS: 0.25 },
  11: { side: 'eye', wavelengthNm: 118_000, eyeS: 100 },
};

function fractionFromEngine({ apertureMm, profile, widthsMm }: Row): number {
  const { side, wavelengthNm, eyeS } = APERTURES[apertureMm]!;
  const result = resultOf({
    ruleSet: 'icnirp-2013',
    beams: [
      {
        wavelengthNm,
        emission: { mode: 'cw', powerW: 1 },
        diameterMm: widthsMm,
        divergenceMrad: 10,
        width: '1/e',
        profile,
      },
    ],
    exposure: { eyeS },
  });
  const beam = result[side].perBeam[0]!;
  expect(beam.mpe.limitingApertureMm).toBe(apertureMm);
  return (beam.exposure.irradianceWPerM2 * Math.PI * (apertureMm / 1000) ** 2) / 4;
}

function distanceFromEngine(input: {
  powerW: number;
  diametersMm: readonly number[];
  divergencesMrad: readonly number[];
  waistDistanceM: number;
  attenuationPerKm: number;
  profile: string;
  growth: string;
  onAxis: 'peak' | 'aperture-mean';
}): number {
  const result = resultOf({
    ruleSet: 'iec-60825-1-2014',
    beams: [
      {
        wavelengthNm: 532,
        emission: { mode: 'cw', powerW: input.powerW },
        diameterMm: input.diametersMm,
        divergenceMrad: input.divergencesMrad,
        width: '1/e',
        profile: input.profile,
        ...(input.waistDistanceM ? { waistDistanceM: input.waistDistanceM } : {}),
      },
    ],
    exposure: { eyeS: 0.25 },
    model: { growth: input.growth, onAxis: input.onAxis },
    ...(input.attenuationPerKm ? { air: { attenuationPerKm: input.attenuationPerKm } } : {}),
  });
  return result.eye.hazardDistanceM;
}

const off = (actual: number, expected: number): number =>
  expected === 0 ? Math.abs(actual) : Math.abs(actual / expected - 1);

describe('the geometry agrees with SciPy', () => {
  it('on what passes an aperture: the engine', () => {
    for (const row of fixtures.fractions) {
      const actual = fractionFromEngine(row);
      expect(off(actual, row.fraction), JSON.stringify(row)).toBeLessThan(1e-11);
    }
  });

  it('on what passes an aperture: the decimal model', () => {
    for (const row of fixtures.fractions) {
      const [x, y] = row.widthsMm.map(dec);
      const actual = apertureFraction(row.profile === 'gaussian', dec(row.apertureMm), [x!, y!]);
      expect(off(actual.toNumber(), row.fraction), JSON.stringify(row)).toBeLessThan(1e-11);
    }
  });

  it('on hazard distances, round and elliptical, with and without air', () => {
    for (const row of fixtures.distances) {
      const actual = distanceFromEngine({ ...row, onAxis: 'aperture-mean' });
      expect(off(actual, row.distanceM), JSON.stringify(row)).toBeLessThan(1e-9);
    }
  });

  it('on the far field in air, which the Lambert function solves', () => {
    for (const row of fixtures.farFields) {
      const actual = distanceFromEngine({
        ...row,
        diametersMm: [1e-3, 1e-3],
        divergencesMrad: [row.divergenceMrad, row.divergenceMrad],
        waistDistanceM: 0,
        profile: 'gaussian',
        growth: 'hyperbolic',
        onAxis: 'peak',
      });
      expect(off(actual, row.distanceM), JSON.stringify(row)).toBeLessThan(1e-9);
    }
  });
});
