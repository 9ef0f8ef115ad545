import { describe, expect, it } from 'vitest';
import type { HazardCase } from './case';
import { evaluate } from './evaluate';
import { exposureCurve } from './exposure-curve';
import type { EvaluationResult } from './result';

const CASE: HazardCase = {
  ruleSet: 'iec-60825-1-2014',
  beams: [
    { wavelengthNm: 450, powerW: 0.5 },
    { wavelengthNm: 1064, powerW: 20 },
  ].map(({ wavelengthNm, powerW }) => ({
    wavelengthNm,
    emission: { mode: 'cw', powerW },
    diameterMm: 2,
    divergenceMrad: 1,
    width: '1/e2',
    profile: 'gaussian',
  })),
  exposure: { eyeS: 60 },
  aid: { objectiveMm: 50, magnification: 7, transmission: 0.9 },
  air: { attenuationPerKm: 0.2 },
};

describe('the exposure curve', () => {
  it('crosses 1 at the hazard distances of the result', () => {
    const spot: HazardCase = {
      ...CASE,
      path: { kind: 'diffuse', reflectance: 0.9, angleDeg: 20, spotMm: 5 },
    };
    for (const input of [CASE, spot]) {
      const { eye, skin } = evaluate(input, { bare: true }) as EvaluationResult;
      const [atEye, atSkin, atAided] = exposureCurve(input, [
        eye.hazardDistanceM,
        skin.hazardDistanceM,
        eye.aidedHazardDistanceM!,
      ]);
      expect(atEye?.eyeRatio).toBeCloseTo(1, 9);
      expect(atSkin?.skinRatio).toBeCloseTo(1, 9);
      expect(atAided?.aidedRatio).toBeCloseTo(1, 9);
    }
  });

  it('gives each beam in the terms of its emission', () => {
    const pulse = { mode: 'single', pulseEnergyJ: 1, pulseDurationS: 1e-8 } as const;
    const [point] = exposureCurve(
      { ...CASE, beams: [{ ...CASE.beams[0]!, emission: pulse }] },
      [10],
    );
    expect(Object.keys(point!.beams[0]!)).toEqual(['radiantExposureJPerM2']);
    const [cw] = exposureCurve(CASE, [10]);
    expect(cw!.beams.map((beam) => Object.keys(beam)[0])).toEqual([
      'irradianceWPerM2',
      'irradianceWPerM2',
    ]);
  });

  it('falls with distance', () => {
    const distances = Array.from({ length: 50 }, (_, i) => 10 ** (i / 12));
    const ratios = exposureCurve(CASE, distances).map(({ eyeRatio }) => eyeRatio);
    expect(ratios).toEqual([...ratios].sort((a, b) => b - a));
  });
});
