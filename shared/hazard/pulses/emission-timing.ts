import type { Emission } from '../case';

/** An emission in the terms that limits are compared in. */
export interface EmissionTiming {
  /** Mean power of a CW beam, W; energy of one pulse otherwise, J. */
  readonly powerOrEnergy: number;
  readonly isPulsed: boolean;
  /** Duration of one pulse, s; 0 for CW. */
  readonly pulseS: number;
  /** Mean pulse rate, 1/s; 0 for CW and single pulses. */
  readonly meanRateHz: number;
}

/** What the pulses of an emission are and how often they come. */
export function emissionTiming(emission: Emission): EmissionTiming {
  if (emission.mode === 'cw') {
    return { powerOrEnergy: emission.powerW, isPulsed: false, pulseS: 0, meanRateHz: 0 };
  }
  return {
    powerOrEnergy: emission.pulseEnergyJ,
    isPulsed: true,
    pulseS: emission.pulseDurationS,
    meanRateHz: meanPulseRate(emission),
  };
}

/** From the limit of one pulse, or of the whole exposure, to an irradiance: a factor in 1/s. */
export function irradiancePerExposure(timing: EmissionTiming, durationS: number): number {
  if (!timing.isPulsed) return 1 / durationS;
  return timing.meanRateHz > 0 ? timing.meanRateHz : 1 / timing.pulseS;
}

/** How long a burst lasts from the start of its first pulse to the end of its last, s. */
export function burstDuration(emission: Extract<Emission, { mode: 'burst' }>): number {
  return (emission.pulsesPerBurst - 1) / emission.intraBurstRateHz + emission.pulseDurationS;
}

function meanPulseRate(emission: Exclude<Emission, { mode: 'cw' }>): number {
  if (emission.mode === 'repetitive') return emission.repetitionRateHz;
  if (emission.mode === 'burst') return emission.pulsesPerBurst * emission.burstRateHz;
  return 0;
}
