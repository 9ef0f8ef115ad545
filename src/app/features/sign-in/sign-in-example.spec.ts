import { evaluate } from '@shared/hazard/evaluate';

import { EXAMPLE_REACH } from './sign-in-example';

const LINES = [
  [457.9, 0.35],
  [476.5, 0.75],
  [488, 1.5],
  [496.5, 0.7],
  [501.7, 0.4],
  [514.5, 2],
] as const;

it('the strip beside the sign-in shows what the engine computes', () => {
  const result = evaluate({
    ruleSet: 'eu-2006-25',
    exposure: { eyeS: 0.25, skinS: 10 },
    aid: { objectiveMm: 50, magnification: 7, transmission: 0.9 },
    beams: LINES.map(([wavelengthNm, powerW]) => ({
      wavelengthNm,
      emission: { mode: 'cw', powerW },
      diameterMm: 1.5,
      divergenceMrad: 0.5,
      width: '1/e2',
      profile: 'gaussian',
    })),
  });
  if ('errors' in result) throw new Error(JSON.stringify(result.errors));
  expect(EXAMPLE_REACH.eyeDistanceM / result.eye.hazardDistanceM).toBeCloseTo(1, 5);
  expect(EXAMPLE_REACH.skinDistanceM / result.skin.hazardDistanceM).toBeCloseTo(1, 5);
  const aided = result.eye.aidedHazardDistanceM ?? Number.NaN;
  expect(EXAMPLE_REACH.aidedDistanceM / aided).toBeCloseTo(1, 5);
});
