import type { Beam, HazardCase, OpticalAid, Path } from '../hazard/case';
import type { LimitRule, Mechanism } from '../hazard/result';
import type { Activity } from '../model/evaluations';
import { formatFull, UNIT_SPACE } from '../model/quantity-format';

export const ACTIVITY_WORDS: Readonly<Record<Activity, string>> = {
  operation: 'Operation',
  alignment: 'Alignment',
  maintenance: 'Maintenance',
  service: 'Service',
};

/** The rule by which a limit was found, in a sentence's middle. */
export const RULE_WORDS: Readonly<Record<LimitRule, string>> = {
  continuous: 'continuous exposure',
  'single-pulse': 'single pulse',
  average: 'average over the exposure',
  'pulse-train': 'pulse train',
};

export const MECHANISM_WORDS: Readonly<Record<Mechanism, string>> = {
  thermal: 'thermal',
  photochemical: 'photochemical',
  corneal: 'corneal',
};

export const GROWTH_WORDS = {
  hyperbolic: 'hyperbolic beam growth',
  linear: 'linear beam growth',
} as const;

export const ON_AXIS_WORDS = {
  peak: 'peak on the axis',
  'aperture-mean': 'mean over the limiting aperture',
} as const;

/** The way of the beam to the person. */
export function pathWords(path: Path = { kind: 'direct' }): string {
  switch (path.kind) {
    case 'direct':
      return 'Direct beam';
    case 'lens':
      return `Beyond the focus of a lens of ${formatFull(path.focalLengthMm, 'mm')}`;
    case 'fiber':
      return 'numericalAperture' in path
        ? `From a multimode fiber of numerical aperture ${path.numericalAperture}`
        : `From a single-mode fiber of mode field ${formatFull(path.modeFieldDiameterUm, 'µm')}`;
    case 'diffuse':
      return (
        `Diffuse reflection, ${formatFull(100 * path.reflectance, '%')} at ${path.angleDeg}°` +
        (path.spotMm === undefined ? '' : `, spot of ${formatFull(path.spotMm, 'mm')}`)
      );
  }
}

/** Where distances count from. */
export function distanceOrigin(path: Path = { kind: 'direct' }): string {
  const origins = {
    direct: 'the aperture',
    lens: 'the focus of the lens',
    fiber: 'the end of the fiber',
    diffuse: 'the lit spot',
  } as const;
  return origins[path.kind];
}

/** "7 × 50": magnification and objective in mm, as printed on binoculars. */
export function aidName(aid: OpticalAid): string {
  return `${aid.magnification}${UNIT_SPACE}×${UNIT_SPACE}${aid.objectiveMm}`;
}

/** "CW, 5 W", or "2 mJ, 10 ns, 1 kHz". */
export function emissionWords({ emission }: Beam): string {
  switch (emission.mode) {
    case 'cw':
      return `CW, ${formatFull(emission.powerW, 'W')}`;
    case 'single':
      return `${pulseWords(emission)}, single pulse`;
    case 'repetitive':
      return `${pulseWords(emission)}, ${formatFull(emission.repetitionRateHz, 'Hz')}`;
    case 'burst':
      return (
        `${pulseWords(emission)}, bursts of ${emission.pulsesPerBurst} at ` +
        `${formatFull(emission.intraBurstRateHz, 'Hz')}, ${formatFull(emission.burstRateHz, 'Hz')}`
      );
  }
}

/** Durations of a case, said with their side. */
export function exposureWords({ exposure }: HazardCase): string {
  if (!exposure) return 'one pulse';
  const skinS = exposure.skinS ?? exposure.eyeS;
  return `eye ${durationWords(exposure.eyeS)}, skin ${durationWords(skinS)}`;
}

/** Seconds without a prefix from 10 ms up: 0.25 s, 30,000 s. */
export function durationWords(seconds: number): string {
  if (seconds < 0.01) return formatFull(seconds, 's');
  const [whole = '', fraction] = String(Number(seconds.toPrecision(10))).split('.');
  const grouped = seconds >= 1e4 ? whole.replace(/\B(?=(\d{3})+$)/g, ',') : whole;
  return `${fraction ? `${grouped}.${fraction}` : grouped}${UNIT_SPACE}s`;
}

function pulseWords(pulse: { pulseEnergyJ: number; pulseDurationS: number }): string {
  return `${formatFull(pulse.pulseEnergyJ, 'J')}, ${formatFull(pulse.pulseDurationS, 's')}`;
}
