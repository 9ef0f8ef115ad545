import type { BurstEmission, RepetitiveEmission } from '../case';

/** Emissions with more than one pulse. */
export type PulsedEmission = RepetitiveEmission | BurstEmission;

/** Consecutive pulses that count as one. */
export interface PulseGroup {
  /** n_g, 1 where every pulse stands alone. */
  readonly pulses: number;
  /** How long the pulse lasts that they count as, s. */
  readonly durationS: number;
}

/** N within a time: rate × time, not rounded; at least one pulse or one burst. */
export function pulsesWithin(emission: PulsedEmission, timeS: number): number {
  if (emission.mode === 'repetitive') return Math.max(1, emission.repetitionRateHz * timeS);
  return emission.pulsesPerBurst * Math.max(1, emission.burstRateHz * timeS);
}

/**
 * The pulses within W = min(T_i, exposure), which count as one pulse of that duration.
 *
 * @param emission repetitive or bursts.
 * @param windowS W, s; 0 where the edition has no T_i at the wavelength.
 */
export function pulseGroup(emission: PulsedEmission, windowS: number): PulseGroup {
  const pulses =
    emission.mode === 'repetitive'
      ? pulsesStartedWithin(windowS, emission.repetitionRateHz)
      : burstPulsesWithin(windowS, emission);
  return pulses > 1
    ? { pulses, durationS: windowS }
    : { pulses: 1, durationS: emission.pulseDurationS };
}

function burstPulsesWithin(windowS: number, emission: BurstEmission): number {
  const bursts = pulsesStartedWithin(windowS, emission.burstRateHz);
  if (bursts > 1) return emission.pulsesPerBurst * bursts;
  return Math.min(emission.pulsesPerBurst, pulsesStartedWithin(windowS, emission.intraBurstRateHz));
}

/** ⌈W · rate⌉ when the period is below W, which forgives a rounding error of 1e-9; 1 otherwise. */
function pulsesStartedWithin(windowS: number, rateHz: number): number {
  return Math.max(1, Math.ceil(windowS * rateHz - 1e-9));
}
