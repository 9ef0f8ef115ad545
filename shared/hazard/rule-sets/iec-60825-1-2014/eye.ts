import type { LimitRow, SkinReferenceRow } from '../limit-table';

// IEC 60825-1:2014, exposure limits of the eye. Bands top to bottom as printed; how bands end: ../limit-table.ts.
const THERMAL = 'thermal';
const PHOTOCHEMICAL = 'photochemical';
const CORNEAL = 'corneal';
const J_M2 = 'J/m2';
const W_M2 = 'W/m2';

const SEEN_EQUIVALENT = {
  source: 'iec-60825-1-2014:A.1',
  confidence: 'seen-equivalent',
  seenIn: 'bgi-832:6a',
} as const;
const MEMORY = { source: 'iec-60825-1-2014:A.1', confidence: 'memory-high' } as const;
const MEMORY_DGUV = {
  source: 'iec-60825-1-2014:A.1',
  confidence: 'memory-high',
  seenIn: 'dguv-203-042:annex-6',
} as const;
const SEEN_EQUIVALENT_TEXT = {
  source: 'iec-60825-1-2014:A.1',
  confidence: 'seen-equivalent',
  seenIn: 'training-text:p104',
} as const;
const MEMORY_A2 = { source: 'iec-60825-1-2014:A.2', confidence: 'memory-high' } as const;
const MEMORY_MEDIUM = { source: 'iec-60825-1-2014:A.1', confidence: 'memory-medium' } as const;

/** Cornea and lens, 180–400 nm. */
// prettier-ignore
export const EYE_ULTRAVIOLET: readonly LimitRow[] = [
  { mechanism: PHOTOCHEMICAL, wavelengthNm: [  180, 302.5], durationS: [  1e-9,    3e4], quantity: J_M2, coefficient: 30,                                         ...SEEN_EQUIVALENT },
  { mechanism: CORNEAL,       wavelengthNm: [  180,  400],  durationS: [ 1e-13,   1e-9], quantity: W_M2, coefficient: 3e10,                                       ...SEEN_EQUIVALENT },
  { mechanism: PHOTOCHEMICAL, wavelengthNm: [302.5,  315],  durationS: [    10,    3e4], quantity: J_M2, coefficient: 1,     factors: ['C2'],                     ...MEMORY },
  { mechanism: THERMAL,       wavelengthNm: [302.5,  315],  durationS: [  1e-9,   'T1'], quantity: J_M2, coefficient: 5.6e3,                  timeExponent: 0.25, ...SEEN_EQUIVALENT, note: 'the lower of C_1 and C_2' },
  { mechanism: THERMAL,       wavelengthNm: [302.5,  315],  durationS: [  'T1',     10], quantity: J_M2, coefficient: 1,     factors: ['C2'],                     ...SEEN_EQUIVALENT, note: 'the lower of C_1 and C_2' },
  { mechanism: PHOTOCHEMICAL, wavelengthNm: [  315,  400],  durationS: [    10,   1000], quantity: J_M2, coefficient: 1e4,                                        ...MEMORY },
  { mechanism: PHOTOCHEMICAL, wavelengthNm: [  315,  400],  durationS: [  1000,    3e4], quantity: W_M2, coefficient: 10,                                         ...MEMORY_DGUV },
  { mechanism: THERMAL,       wavelengthNm: [  315,  400],  durationS: [  1e-9,     10], quantity: J_M2, coefficient: 5.6e3,                  timeExponent: 0.25, ...SEEN_EQUIVALENT },
];

/** Retina, 400–1400 nm, sources up to α_min. */
// prettier-ignore
export const EYE_RETINA_SMALL_SOURCE: readonly LimitRow[] = [
  { mechanism: PHOTOCHEMICAL, wavelengthNm: [  400,  450], durationS: [    10,    100], quantity: J_M2, coefficient: 100,                                             ...MEMORY },
  { mechanism: PHOTOCHEMICAL, wavelengthNm: [  400,  500], durationS: [   100,    3e4], quantity: W_M2, coefficient: 1,    factors: ['CB'],                           ...MEMORY },
  { mechanism: THERMAL,       wavelengthNm: [  400, 1050], durationS: [ 1e-13,  1e-11], quantity: J_M2, coefficient: 1e-3,                                            ...MEMORY },
  { mechanism: THERMAL,       wavelengthNm: [  400, 1050], durationS: [ 1e-11,   5e-6], quantity: J_M2, coefficient: 2e-3, factors: ['CA'],                           ...MEMORY },
  { mechanism: THERMAL,       wavelengthNm: [  400, 1050], durationS: [  5e-6,     10], quantity: J_M2, coefficient: 18,   factors: ['CA'],       timeExponent: 0.75, ...MEMORY },
  { mechanism: PHOTOCHEMICAL, wavelengthNm: [  450,  500], durationS: [    10,    100], quantity: J_M2, coefficient: 100,  factors: ['CB'],                           ...MEMORY,               note: 'dual limit with 10 W/m²; they cross at 10·C_3 s' },
  { mechanism: THERMAL,       wavelengthNm: [  450,  700], durationS: [    10,    3e4], quantity: W_M2, coefficient: 10,                                              ...SEEN_EQUIVALENT_TEXT, note: 'printed only where it can be the lower limit' },
  { mechanism: THERMAL,       wavelengthNm: [  700, 1400], durationS: [    10,    3e4], quantity: W_M2, coefficient: 10,   factors: ['CA', 'CC'],                     ...MEMORY },
  { mechanism: THERMAL,       wavelengthNm: [ 1050, 1400], durationS: [ 1e-13,  1e-11], quantity: J_M2, coefficient: 1e-2, factors: ['CC'],                           ...MEMORY },
  { mechanism: THERMAL,       wavelengthNm: [ 1050, 1400], durationS: [ 1e-11, 1.3e-5], quantity: J_M2, coefficient: 2e-2, factors: ['CC'],                           ...MEMORY },
  { mechanism: THERMAL,       wavelengthNm: [ 1050, 1400], durationS: [1.3e-5,     10], quantity: J_M2, coefficient: 90,   factors: ['CC'],       timeExponent: 0.75, ...MEMORY },
];

/** Retina, 400–1400 nm, sources above α_min. */
// prettier-ignore
export const EYE_RETINA_EXTENDED_SOURCE: readonly LimitRow[] = [
  { mechanism: PHOTOCHEMICAL, wavelengthNm: [  400,  484], durationS: [     1,     10], quantity: J_M2, coefficient: 100,  factors: ['CB'],                                            sourceMrad: [1.5, 82], ...MEMORY_A2, note: 'footnote: the limit reaches down to 1 s for sources between 1.5 and 82 mrad' },
  { mechanism: PHOTOCHEMICAL, wavelengthNm: [  400,  600], durationS: [    10,    100], quantity: J_M2, coefficient: 100,  factors: ['CB'],                                                                   ...MEMORY_A2, note: 'from 1 s for some sources: see the row above' },
  { mechanism: PHOTOCHEMICAL, wavelengthNm: [  400,  600], durationS: [   100,    3e4], quantity: W_M2, coefficient: 1,    factors: ['CB'],                                                                   ...MEMORY_A2 },
  { mechanism: THERMAL,       wavelengthNm: [  400, 1050], durationS: [ 1e-13,  1e-11], quantity: J_M2, coefficient: 1e-3, factors: ['CE'],                                                                   ...MEMORY_A2 },
  { mechanism: THERMAL,       wavelengthNm: [  400, 1050], durationS: [ 1e-11,   5e-6], quantity: J_M2, coefficient: 2e-3, factors: ['CA', 'CE'],                                                             ...MEMORY_A2 },
  { mechanism: THERMAL,       wavelengthNm: [  400, 1050], durationS: [  5e-6,     10], quantity: J_M2, coefficient: 18,   factors: ['CA', 'CE'],                  timeExponent: 0.75,                        ...MEMORY_A2 },
  { mechanism: THERMAL,       wavelengthNm: [  400, 1400], durationS: [    10,   'T2'], quantity: J_M2, coefficient: 18,   factors: ['CA', 'CC', 'CE'],            timeExponent: 0.75,                        ...MEMORY_A2 },
  { mechanism: THERMAL,       wavelengthNm: [  400, 1400], durationS: [  'T2',    3e4], quantity: W_M2, coefficient: 18,   factors: ['CA', 'CC', 'CE', 'T2^-1/4'],                                            ...MEMORY_A2 },
  { mechanism: THERMAL,       wavelengthNm: [ 1050, 1400], durationS: [ 1e-13,  1e-11], quantity: J_M2, coefficient: 1e-2, factors: ['CC', 'CE'],                                                             ...MEMORY_A2 },
  { mechanism: THERMAL,       wavelengthNm: [ 1050, 1400], durationS: [ 1e-11, 1.3e-5], quantity: J_M2, coefficient: 2e-2, factors: ['CC', 'CE'],                                                             ...MEMORY_A2 },
  { mechanism: THERMAL,       wavelengthNm: [ 1050, 1400], durationS: [1.3e-5,     10], quantity: J_M2, coefficient: 90,   factors: ['CC', 'CE'],                  timeExponent: 0.75,                        ...MEMORY_A2 },
];

/** Cornea and lens where the retinal limits alone would not protect them. */
// prettier-ignore
export const EYE_ANTERIOR_CAP: readonly SkinReferenceRow[] = [
  { mechanism: CORNEAL, wavelengthNm: [ 1250, 1400], durationS: [  1e-9,    3e4], sameAs: 'skin', ...MEMORY_MEDIUM, note: 'the retinal limits may not protect the front of the eye' },
];

/** Cornea, 1400 nm – 1 mm. */
// prettier-ignore
export const EYE_FAR_INFRARED: readonly LimitRow[] = [
  { mechanism: CORNEAL, wavelengthNm: [ 1400, 1500], durationS: [ 1e-13,   1e-9], quantity: W_M2, coefficient: 1e12,                      ...SEEN_EQUIVALENT },
  { mechanism: CORNEAL, wavelengthNm: [ 1400, 1500], durationS: [  1e-9,  0.001], quantity: J_M2, coefficient: 1e3,                       ...SEEN_EQUIVALENT },
  { mechanism: CORNEAL, wavelengthNm: [ 1400, 1500], durationS: [ 0.001,     10], quantity: J_M2, coefficient: 5.6e3, timeExponent: 0.25, ...SEEN_EQUIVALENT },
  { mechanism: CORNEAL, wavelengthNm: [ 1400,  1e6], durationS: [    10,    3e4], quantity: W_M2, coefficient: 1000,                      ...MEMORY_DGUV },
  { mechanism: CORNEAL, wavelengthNm: [ 1500, 1800], durationS: [ 1e-13,   1e-9], quantity: W_M2, coefficient: 1e13,                      ...SEEN_EQUIVALENT },
  { mechanism: CORNEAL, wavelengthNm: [ 1500, 1800], durationS: [  1e-9,     10], quantity: J_M2, coefficient: 1e4,                       ...SEEN_EQUIVALENT },
  { mechanism: CORNEAL, wavelengthNm: [ 1800, 2600], durationS: [ 1e-13,   1e-9], quantity: W_M2, coefficient: 1e12,                      ...SEEN_EQUIVALENT },
  { mechanism: CORNEAL, wavelengthNm: [ 1800, 2600], durationS: [  1e-9,  0.001], quantity: J_M2, coefficient: 1e3,                       ...SEEN_EQUIVALENT },
  { mechanism: CORNEAL, wavelengthNm: [ 1800, 2600], durationS: [ 0.001,     10], quantity: J_M2, coefficient: 5.6e3, timeExponent: 0.25, ...SEEN_EQUIVALENT },
  { mechanism: CORNEAL, wavelengthNm: [ 2600,  1e6], durationS: [ 1e-13,   1e-9], quantity: W_M2, coefficient: 1e11,                      ...SEEN_EQUIVALENT },
  { mechanism: CORNEAL, wavelengthNm: [ 2600,  1e6], durationS: [  1e-9,   1e-7], quantity: J_M2, coefficient: 100,                       ...SEEN_EQUIVALENT },
  { mechanism: CORNEAL, wavelengthNm: [ 2600,  1e6], durationS: [  1e-7,     10], quantity: J_M2, coefficient: 5.6e3, timeExponent: 0.25, ...SEEN_EQUIVALENT },
];
