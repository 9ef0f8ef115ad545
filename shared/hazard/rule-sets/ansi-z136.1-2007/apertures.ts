import type { DurationRow } from '../limit-table';

// Limiting apertures, mm. Half-open bands; the last duration band includes its end.

const MEMORY = { source: 'ansi-z136.1-2007:8', confidence: 'memory-high' } as const;

/** Eye. */
// prettier-ignore
export const EYE_APERTURES: readonly DurationRow[] = [
  { wavelengthNm: [ 180,  400], durationS: [1e-13,  0.3], coefficient: 1,                                    ...MEMORY },
  { wavelengthNm: [ 180,  400], durationS: [  0.3,   10], coefficient: 1.5, timeExponent: 0.375,             ...MEMORY },
  { wavelengthNm: [ 180,  400], durationS: [   10,  3e4], coefficient: 3.5,                                  ...MEMORY },
  { wavelengthNm: [ 400, 1400], durationS: [1e-13,  3e4], coefficient: 7,                                    ...MEMORY },
  { wavelengthNm: [1400,  1e5], durationS: [1e-13,  0.3], coefficient: 1,                                    ...MEMORY },
  { wavelengthNm: [1400,  1e5], durationS: [  0.3,   10], coefficient: 1.5, timeExponent: 0.375,             ...MEMORY },
  { wavelengthNm: [1400,  1e5], durationS: [   10,  3e4], coefficient: 3.5,                                  ...MEMORY },
  { wavelengthNm: [ 1e5,  1e6], durationS: [1e-13,  3e4], coefficient: 11,                                   ...MEMORY },
];

/** Skin. */
// prettier-ignore
export const SKIN_APERTURES: readonly DurationRow[] = [
  { wavelengthNm: [ 180,  1e5], durationS: [1e-13,  3e4], coefficient: 3.5,                                  ...MEMORY },
  { wavelengthNm: [ 1e5,  1e6], durationS: [1e-13,  3e4], coefficient: 11,                                   ...MEMORY },
];
