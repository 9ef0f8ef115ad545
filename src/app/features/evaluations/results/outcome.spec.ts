import type { HazardCase } from '@shared/hazard/case';
import { evaluate } from '@shared/hazard/evaluate';

import { outcomeOf, refused } from './outcome';

const CASE: HazardCase = {
  ruleSet: 'iec-60825-1-2014',
  beams: [
    {
      wavelengthNm: 532,
      emission: { mode: 'cw', powerW: 5 },
      diameterMm: 2.3,
      divergenceMrad: 0.5,
      width: '1/e2',
      profile: 'gaussian',
    },
  ],
  exposure: { eyeS: 0.25 },
};

function answer(hazardCase: HazardCase) {
  const result = evaluate(hazardCase);
  return { scenarioId: 's', case: hazardCase, result, conversions: [], assumptions: [] };
}

describe('outcome', () => {
  it('is current for a case that can be evaluated', () => {
    const outcome = outcomeOf(answer(CASE));
    expect(outcome.isCurrent).toBe(true);
    expect(outcome.view?.result.eye.hazardDistanceM).toBeGreaterThan(1000);
  });

  it('keeps the last valid results, marked as such, while the inputs are wrong', () => {
    const before = outcomeOf(answer(CASE));
    const after = outcomeOf(answer({ ...CASE, exposure: { eyeS: -1 } }), before);
    expect(after.isCurrent).toBe(false);
    expect(after.view).toBe(before.view);
    expect(after.errors[0]?.path).toBe('exposure.eyeS');
  });

  it('has no results at all when there never were any', () => {
    expect(refused([{ path: 'eyeS', message: 'Enter it.' }]).view).toBeNull();
  });
});
