import { describe, expect, it } from 'vitest';
import type { BurstEmission, RepetitiveEmission } from '../case';
import { burstDuration, emissionTiming } from './emission-timing';
import { pulseGroup, pulsesWithin } from './pulse-groups';

const PULSE = { pulseEnergyJ: 1e-6, pulseDurationS: 1e-9 };
const repetitive = (repetitionRateHz: number): RepetitiveEmission => ({
  mode: 'repetitive',
  ...PULSE,
  repetitionRateHz,
});
const burst = (change: Partial<BurstEmission> = {}): BurstEmission => ({
  mode: 'burst',
  ...PULSE,
  pulsesPerBurst: 10,
  intraBurstRateHz: 1e6,
  burstRateHz: 100,
  ...change,
});

describe('pulses that are counted', () => {
  it('are rate times time, not rounded, at least one', () => {
    expect(pulsesWithin(repetitive(7), 0.5)).toBe(3.5);
    expect(pulsesWithin(repetitive(1), 0.25)).toBe(1);
    expect(pulsesWithin(burst(), 0.25)).toBe(250);
    expect(pulsesWithin(burst(), 1e-3)).toBe(10);
  });

  it('have a mean rate', () => {
    expect(emissionTiming(burst()).meanRateHz).toBe(1000);
    expect(emissionTiming({ mode: 'single', ...PULSE }).meanRateHz).toBe(0);
  });
});

describe('pulses that count as one', () => {
  it('are those that start within the window when their period is shorter', () => {
    expect(pulseGroup(repetitive(1e6), 5e-6)).toEqual({ pulses: 5, durationS: 5e-6 });
    expect(pulseGroup(repetitive(1.1e6), 5e-6).pulses).toBe(6);
    expect(pulseGroup(repetitive(2e5), 5e-6)).toEqual({ pulses: 1, durationS: 1e-9 });
  });

  it('forgive a rounding error', () => {
    expect(pulseGroup(repetitive(3e6 * (1 + 1e-12)), 1e-6).pulses).toBe(3);
  });

  it('of a burst are at most the burst, unless bursts are as close', () => {
    expect(pulseGroup(burst(), 5e-6).pulses).toBe(5);
    expect(pulseGroup(burst({ intraBurstRateHz: 1e9 }), 5e-6).pulses).toBe(10);
    expect(pulseGroup(burst({ intraBurstRateHz: 1e9, burstRateHz: 1e6 }), 5e-6).pulses).toBe(50);
  });
});

describe('a burst', () => {
  it('lasts from its first pulse to the end of its last', () => {
    expect(burstDuration(burst())).toBeCloseTo(9.001e-6, 18);
  });
});
