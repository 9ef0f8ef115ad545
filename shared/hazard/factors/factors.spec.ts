import { describe, expect, it } from 'vitest';
import { ruleSetById } from '../rule-sets';
import { meanInside } from './apparent-source';
import { breakTimeT2 } from './break-time-t2';
import { correctionFactorCE } from './correction-factor-ce';
import { factorRowAt, factorValue, inBand } from './factor-value';
import { pulseTrainFactor, pulseTrainRow } from './pulse-train-factor';

const round = (angleMrad: number) => ({ xMrad: angleMrad, yMrad: angleMrad });

function factor(
  ruleSet: 'iec-60825-1-2014' | 'eu-2006-25',
  symbol: 'CA' | 'CB' | 'CC',
  nm: number,
) {
  const row = factorRowAt(ruleSetById(ruleSet).factors[symbol], nm);
  return row === undefined ? 1 : factorValue(row, nm);
}

describe('factors of the wavelength', () => {
  it('have their printed values', () => {
    expect(factor('iec-60825-1-2014', 'CA', 699)).toBe(1);
    expect(factor('iec-60825-1-2014', 'CA', 800)).toBeCloseTo(1.5849, 4);
    expect(factor('iec-60825-1-2014', 'CA', 1064)).toBe(5);
    expect(factor('iec-60825-1-2014', 'CB', 488)).toBeCloseTo(5.754, 3);
    expect(factor('eu-2006-25', 'CC', 1310)).toBe(8);
    expect(factor('iec-60825-1-2014', 'CC', 1310)).toBeCloseTo(8 + 10 ** 2.4, 9);
  });

  it('hold in half-open bands, and up to 1 mm', () => {
    expect(inBand(400, [400, 700])).toBe(true);
    expect(inBand(700, [400, 700])).toBe(false);
    expect(inBand(1e6, [1e5, 1e6])).toBe(true);
  });
});

describe('C_E', () => {
  it('grows with the angle, and beyond α_max with the area', () => {
    expect(correctionFactorCE(round(1.5), 100)).toBe(1);
    expect(correctionFactorCE(round(20), 100)).toBeCloseTo(20 / 1.5, 12);
    expect(correctionFactorCE(round(200), 100)).toBeCloseTo(200 ** 2 / (1.5 * 100), 10);
    expect(correctionFactorCE(round(50), 5)).toBeCloseTo(50 ** 2 / (1.5 * 5), 10);
  });

  it('takes the mean of the axes of an oblong source, each inside its bounds', () => {
    expect(meanInside({ xMrad: 0.5, yMrad: 20 }, 100)).toBe(10.75);
    expect(correctionFactorCE({ xMrad: 0.5, yMrad: 20 }, 100)).toBeCloseTo(10.75 / 1.5, 12);
    expect(correctionFactorCE({ xMrad: 10, yMrad: 200 }, 100)).toBeCloseTo((55 / 1.5) * 2, 12);
  });
});

describe('T_2', () => {
  it('is from 10 to 100 s', () => {
    expect(breakTimeT2(round(1))).toBe(10);
    expect(breakTimeT2(round(20))).toBeCloseTo(15.41, 2);
    expect(breakTimeT2(round(100))).toBe(100);
    expect(breakTimeT2(round(500))).toBe(100);
  });
});

describe('the pulse-train factor', () => {
  const train = {
    wavelengthNm: 1064,
    pulseS: 1e-8,
    upToTi: true,
    exposureS: 100,
    sourceMrad: 0,
    alphaMaxMrad: 5,
  };
  const factorOf = (ruleSet: Parameters<typeof ruleSetById>[0], pulses: number, change = {}) => {
    const rows = ruleSetById(ruleSet as never)?.factors.CP ?? [];
    return pulseTrainFactor(pulseTrainRow(rows, { ...train, ...change }, pulses), pulses);
  };

  it('of IEC 60825-1:2014 for short pulses starts above 600 pulses and ends at 0.4', () => {
    expect(factorOf('iec-60825-1-2014', 600)).toBe(1);
    expect(factorOf('iec-60825-1-2014', 601)).toBe(1);
    expect(factorOf('iec-60825-1-2014', 1e4)).toBeCloseTo(0.5, 14);
    expect(factorOf('iec-60825-1-2014', 1e6)).toBe(0.4);
    expect(factorOf('iec-60825-1-2014', 1e6, { exposureS: 0.25 })).toBe(1);
  });

  it('of IEC 60825-1:2014 for longer pulses depends on the source', () => {
    const long = { pulseS: 1e-3, upToTi: false, alphaMaxMrad: 200 * Math.sqrt(1e-3) };
    const at = (sourceMrad: number, pulses: number) =>
      factorOf('iec-60825-1-2014', pulses, { ...long, sourceMrad });
    expect(at(5, 1000)).toBe(1);
    expect(at(6, 16)).toBeCloseTo(0.5, 14);
    expect(at(6, 1000)).toBe(0.4);
    expect(at(20, 625)).toBeCloseTo(0.2, 14);
    expect(at(20, 1e6)).toBe(0.2);
    expect(at(101, 1e6)).toBe(1);
  });

  it('of the directive is N^(-1/4) for every pulse', () => {
    expect(factorOf('eu-2006-25', 16)).toBe(0.5);
    expect(factorOf('eu-2006-25', 16, { upToTi: false, wavelengthNm: 10_600 })).toBe(0.5);
  });

  it('is never above 1', () => {
    expect(pulseTrainFactor({ coefficient: 5, floor: 0.4 }, 1)).toBe(1);
  });
});
