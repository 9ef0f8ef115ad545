import { describe, expect, it } from 'vitest';
import { exposureLimit, readLimits } from './limit';

const ANSI = { ruleSet: 'ansi-z136.1-2014', side: 'eye' } as const;

describe('reading one limit', () => {
  it('takes the smallest of all that apply', () => {
    const query = {
      ruleSet: 'iec-60825-1-2014',
      side: 'eye',
      wavelengthNm: 488,
      durationS: 20,
    } as const;
    const limits = readLimits(query).map(({ mechanism, radiantExposureJPerM2 }) => [
      mechanism,
      Number(radiantExposureJPerM2.toPrecision(5)),
    ]);
    expect(limits).toEqual([
      ['photochemical', 575.44],
      ['thermal', 200],
    ]);
    expect(exposureLimit(query)).toMatchObject({ mechanism: 'thermal', irradianceWPerM2: 10 });
  });

  it('names the printed row', () => {
    const { row } = exposureLimit({ ...ANSI, wavelengthNm: 532, durationS: 0.25 });
    expect(row).toMatchObject({ quantity: 'J/cm2', coefficient: 1.8e-3, timeExponent: 0.75 });
  });

  it('multiplies a photochemical limit for a source larger than its cone', () => {
    const query = { ...ANSI, wavelengthNm: 450, durationS: 100 } as const;
    const photochemical = (sourceMrad: number) =>
      readLimits({ ...query, sourceMrad }).find(({ mechanism }) => mechanism === 'photochemical');
    expect(photochemical(11)?.radiantExposureJPerM2).toBeCloseTo(100, 12);
    expect(photochemical(22)?.radiantExposureJPerM2).toBeCloseTo(400, 12);
  });

  it('averages the limit for the front of the eye over the aperture of the skin', () => {
    const limits = readLimits({
      ruleSet: 'icnirp-2013',
      side: 'eye',
      wavelengthNm: 1390,
      durationS: 10,
    });
    expect(
      limits.map(({ mechanism, limitingApertureMm }) => [mechanism, limitingApertureMm]),
    ).toEqual([
      ['thermal', 7],
      ['corneal', 3.5],
    ]);
  });

  it('refuses what the tables do not hold', () => {
    const query = { ...ANSI, wavelengthNm: 532, durationS: 1 };
    expect(() => exposureLimit({ ...query, wavelengthNm: 179 })).toThrow(RangeError);
    expect(() => exposureLimit({ ...query, durationS: NaN })).toThrow(RangeError);
    expect(() => exposureLimit({ ...query, ruleSet: 'none' as never })).toThrow(RangeError);
  });
});
