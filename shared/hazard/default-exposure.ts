import type { Path } from './case';

/** Exposure durations that are proposed, and why. The person chooses. */
export interface ProposedExposure {
  readonly eyeS: number;
  readonly skinS: number;
  readonly reason: string;
}

/** A working day in the open beam or in ultraviolet, s. */
const ALL_DAY_S = 30_000;

/** Looking at a lit spot while working, s. */
const DIFFUSE_S = 600;

/** Staying in the beam where nothing warns and movement is limited, s. */
const UNNOTICED_S = 100;

/** Natural movement ends an exposure to near infrared, s. */
const NEAR_INFRARED_S = 10;

/** Turning away from a bright light, s. */
const AVERSION_S = 0.25;

/**
 * The exposure durations that the product proposes for these wavelengths on this path.
 *
 * @param wavelengthsNm all wavelengths that can reach the person at once, nm.
 * @param pathKind how they reach the person.
 */
export function proposedExposure(
  wavelengthsNm: readonly number[],
  pathKind: Path['kind'],
): ProposedExposure {
  const [eyeS, reason] = proposal(wavelengthsNm, pathKind);
  if (eyeS >= NEAR_INFRARED_S) return { eyeS, skinS: eyeS, reason };
  // Why: the skin has no aversion to light; only movement ends its exposure.
  return { eyeS, skinS: NEAR_INFRARED_S, reason: `${reason} The skin does not turn away: 10 s.` };
}

function proposal(
  wavelengthsNm: readonly number[],
  pathKind: Path['kind'],
): [seconds: number, reason: string] {
  if (wavelengthsNm.some((nm) => nm < 400)) {
    return [
      ALL_DAY_S,
      '30 000 s: ultraviolet adds up over the day, so the exposure is taken over a whole one.',
    ];
  }
  if (pathKind === 'diffuse') {
    return [DIFFUSE_S, '600 s: looking at the lit spot of a diffuse reflection while working.'];
  }
  if (wavelengthsNm.some((nm) => nm >= 1400)) {
    return [
      UNNOTICED_S,
      '100 s: this wavelength is not seen and gives no aversion; movement is taken to be limited.',
    ];
  }
  if (wavelengthsNm.some((nm) => nm >= 700)) {
    return [
      NEAR_INFRARED_S,
      '10 s: near infrared is not seen; natural movement of eye and head ends the exposure.',
    ];
  }
  return [
    AVERSION_S,
    '0.25 s: visible light, unintended viewing; turning away and blinking end the exposure.',
  ];
}
