import type { HazardCase } from '@shared/hazard/case';

import { decodeCase, encodeCase } from './case-link';

const CASE: HazardCase = {
  ruleSet: 'eu-2006-25',
  beams: [
    {
      label: 'Grün, 532 nm µ-beam',
      wavelengthNm: 532.1,
      emission: { mode: 'cw', powerW: 0.1 + 0.2 },
      diameterMm: [2.3, 1 / 3],
      divergenceMrad: 0.5,
      width: '1/e2',
      profile: 'gaussian',
    },
  ],
  exposure: { eyeS: 0.25 },
};

describe('link to a case', () => {
  it('gives the same case to the last bit', () => {
    expect(decodeCase(encodeCase(CASE))).toEqual(CASE);
  });

  it('needs no escaping in an address', () => {
    expect(encodeCase(CASE)).toMatch(/^[A-Za-z0-9_-]+$/);
  });

  it.each(['', '%%%', 'bm90IGpzb24', '__79'])('says that %j is no case', (text) => {
    expect(decodeCase(text)).toBeUndefined();
  });
});
