import type { DurationRow } from '../limit-table';

// Limiting apertures, mm. Half-open bands; the last duration band includes its end.

const SEEN_EQUIVALENT = {
  source: 'iec-60825-1-2014:apertures',
  confidence: 'seen-equivalent',
  seenIn: 'bgv-b2-da:5',
} as const;

/** Eye. */
// prettier-ignore
export const EYE_APERTURES: readonly DurationRow[] = [
  { wavelengthNm: [ 180,  400], durationS: [1e-13,  3e4], coefficient: 1,                                    ...SEEN_EQUIVALENT },
  { wavelengthNm: [ 400, 1400], durationS: [1e-13,  3e4], coefficient: 7,                                    ...SEEN_EQUIVALENT },
  { wavelengthNm: [1400,  1e5], durationS: [1e-13, 0.35], coefficient: 1,                                    ...SEEN_EQUIVALENT },
  { wavelengthNm: [1400,  1e5], durationS: [ 0.35,   10], coefficient: 1.5, timeExponent: 0.375,             ...SEEN_EQUIVALENT },
  { wavelengthNm: [1400,  1e5], durationS: [   10,  3e4], coefficient: 3.5,                                  ...SEEN_EQUIVALENT },
  { wavelengthNm: [ 1e5,  1e6], durationS: [1e-13,  3e4], coefficient: 11,                                   ...SEEN_EQUIVALENT },
];

/** Skin. */
// prettier-ignore
export const SKIN_APERTURES: readonly DurationRow[] = [
  { wavelengthNm: [ 180,  1e5], durationS: [1e-13,  3e4], coefficient: 3.5,                                  ...SEEN_EQUIVALENT },
  { wavelengthNm: [ 1e5,  1e6], durationS: [1e-13,  3e4], coefficient: 11,                                   ...SEEN_EQUIVALENT },
];
