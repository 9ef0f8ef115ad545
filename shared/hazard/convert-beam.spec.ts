import { describe, expect, it } from 'vitest';
import {
  convertAxes,
  fullFromHalfAngle,
  modeLockedEmission,
  modulatedEmission,
  oneOverE2FromFwhm,
  oneOverEFromFwhm,
  pulseEnergyFromMeanPower,
} from './convert-beam';

describe('data-sheet conversions', () => {
  it('turn a full width at half maximum into the width of a Gaussian', () => {
    expect(oneOverE2FromFwhm(1).value).toBeCloseTo(1.699, 3);
    expect(oneOverEFromFwhm(1).value).toBeCloseTo(1.201, 3);
    // Half of the peak is left at half of the width.
    const width = oneOverEFromFwhm(2).value;
    expect(Math.exp(-((2 / width) ** 2))).toBeCloseTo(0.5, 14);
  });

  it('turn a half angle into a full one, and mean power into the energy of a pulse', () => {
    expect(fullFromHalfAngle(0.4)).toMatchObject({ value: 0.8, substituted: '2*0.4' });
    expect(pulseEnergyFromMeanPower(2, 1000).value).toBe(0.002);
  });

  it('turn a mode-locked laser into pulses', () => {
    const { emission, conversions } = modeLockedEmission({
      meanPowerW: 1,
      repetitionRateHz: 8e7,
      pulseDurationS: 1e-13,
    });
    expect(emission).toEqual({
      mode: 'repetitive',
      pulseEnergyJ: 1.25e-8,
      pulseDurationS: 1e-13,
      repetitionRateHz: 8e7,
    });
    expect(conversions).toHaveLength(1);
  });

  it('turn a modulated laser into pulses, by duty or by on-time', () => {
    const byDuty = modulatedEmission({ peakPowerW: 2, modulationRateHz: 100, duty: 0.5 });
    const byTime = modulatedEmission({ peakPowerW: 2, modulationRateHz: 100, onTimeS: 0.005 });
    expect(byDuty.emission).toEqual(byTime.emission);
    expect(byDuty.emission).toMatchObject({ pulseEnergyJ: 0.01, pulseDurationS: 0.005 });
    expect(byDuty.conversions.length).toBe(byTime.conversions.length + 1);
  });

  it('convert both axes', () => {
    expect(convertAxes([1, 2], fullFromHalfAngle).value).toEqual([2, 4]);
    expect(convertAxes(3, fullFromHalfAngle).value).toBe(6);
  });
});
