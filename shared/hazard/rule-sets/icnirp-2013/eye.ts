import type { LimitRow, SkinReferenceRow } from '../limit-table';

// ICNIRP 2013, exposure limits of the eye. Bands top to bottom as printed; how bands end: ../limit-table.ts.
const THERMAL = 'thermal';
const PHOTOCHEMICAL = 'photochemical';
const CORNEAL = 'corneal';
const J_M2 = 'J/m2';
const W_M2 = 'W/m2';

const SEEN_EQUIVALENT = {
  source: 'icnirp-2013:eye',
  confidence: 'seen-equivalent',
  seenIn: 'bgi-832:6a',
} as const;
const MEMORY = { source: 'icnirp-2013:eye', confidence: 'memory-high' } as const;
const MEMORY_MEDIUM = { source: 'icnirp-2013:eye', confidence: 'memory-medium' } as const;
const MEMORY_DGUV = {
  source: 'icnirp-2013:eye',
  confidence: 'memory-high',
  seenIn: 'dguv-203-042:annex-6',
} as const;

/** Cornea and lens, 180–400 nm. */
// prettier-ignore
export const EYE_ULTRAVIOLET: readonly LimitRow[] = [
  { mechanism: PHOTOCHEMICAL, wavelengthNm: [  180,  303], durationS: [  1e-9,    3e4], quantity: J_M2, coefficient: 30,                        ...SEEN_EQUIVALENT, note: 'printed for 180–302 nm; taken up to the line of 303 nm' },
  { mechanism: THERMAL,       wavelengthNm: [  180,  315], durationS: [  1e-9,     10], quantity: J_M2, coefficient: 5.6e3, timeExponent: 0.25, ...MEMORY,          note: 'dual limit with the photochemical rows' },
  { mechanism: CORNEAL,       wavelengthNm: [  180,  400], durationS: [ 1e-13,   1e-9], quantity: W_M2, coefficient: 3e10,                      ...SEEN_EQUIVALENT },
  { mechanism: PHOTOCHEMICAL, wavelengthNm: [  303,  304], durationS: [  1e-9,    3e4], quantity: J_M2, coefficient: 40,                        ...MEMORY },
  { mechanism: PHOTOCHEMICAL, wavelengthNm: [  304,  305], durationS: [  1e-9,    3e4], quantity: J_M2, coefficient: 60,                        ...MEMORY },
  { mechanism: PHOTOCHEMICAL, wavelengthNm: [  305,  306], durationS: [  1e-9,    3e4], quantity: J_M2, coefficient: 100,                       ...MEMORY },
  { mechanism: PHOTOCHEMICAL, wavelengthNm: [  306,  307], durationS: [  1e-9,    3e4], quantity: J_M2, coefficient: 160,                       ...MEMORY },
  { mechanism: PHOTOCHEMICAL, wavelengthNm: [  307,  308], durationS: [  1e-9,    3e4], quantity: J_M2, coefficient: 250,                       ...MEMORY },
  { mechanism: PHOTOCHEMICAL, wavelengthNm: [  308,  309], durationS: [  1e-9,    3e4], quantity: J_M2, coefficient: 400,                       ...MEMORY },
  { mechanism: PHOTOCHEMICAL, wavelengthNm: [  309,  310], durationS: [  1e-9,    3e4], quantity: J_M2, coefficient: 630,                       ...MEMORY },
  { mechanism: PHOTOCHEMICAL, wavelengthNm: [  310,  311], durationS: [  1e-9,    3e4], quantity: J_M2, coefficient: 1000,                      ...MEMORY },
  { mechanism: PHOTOCHEMICAL, wavelengthNm: [  311,  312], durationS: [  1e-9,    3e4], quantity: J_M2, coefficient: 1600,                      ...MEMORY },
  { mechanism: PHOTOCHEMICAL, wavelengthNm: [  312,  313], durationS: [  1e-9,    3e4], quantity: J_M2, coefficient: 2500,                      ...MEMORY },
  { mechanism: PHOTOCHEMICAL, wavelengthNm: [  313,  314], durationS: [  1e-9,    3e4], quantity: J_M2, coefficient: 4000,                      ...MEMORY },
  { mechanism: PHOTOCHEMICAL, wavelengthNm: [  314,  315], durationS: [  1e-9,    3e4], quantity: J_M2, coefficient: 6300,                      ...MEMORY },
  { mechanism: PHOTOCHEMICAL, wavelengthNm: [  315,  400], durationS: [    10,    3e4], quantity: J_M2, coefficient: 1e4,                       ...MEMORY },
  { mechanism: THERMAL,       wavelengthNm: [  315,  400], durationS: [  1e-9,     10], quantity: J_M2, coefficient: 5.6e3, timeExponent: 0.25, ...SEEN_EQUIVALENT },
];

/** Retina, 400–1400 nm, sources up to α_min. */
// prettier-ignore
export const EYE_RETINA_SMALL_SOURCE: readonly LimitRow[] = [
  { mechanism: PHOTOCHEMICAL, wavelengthNm: [  400,  600], durationS: [    10,    100], quantity: J_M2, coefficient: 100,  factors: ['CB'],                           ...MEMORY, note: 'printed from 10 s; earlier editions start extended sources at 0.7 s' },
  { mechanism: PHOTOCHEMICAL, wavelengthNm: [  400,  600], durationS: [   100,    3e4], quantity: W_M2, coefficient: 1,    factors: ['CB'],                           ...MEMORY },
  { mechanism: THERMAL,       wavelengthNm: [  400,  700], durationS: [    10,    3e4], quantity: W_M2, coefficient: 10,                                              ...MEMORY },
  { mechanism: THERMAL,       wavelengthNm: [  400, 1050], durationS: [ 1e-13,  1e-11], quantity: J_M2, coefficient: 1e-3,                                            ...MEMORY, note: 'no C_A below 10 ps' },
  { mechanism: THERMAL,       wavelengthNm: [  400, 1050], durationS: [ 1e-11,   5e-6], quantity: J_M2, coefficient: 2e-3, factors: ['CA'],                           ...MEMORY },
  { mechanism: THERMAL,       wavelengthNm: [  400, 1050], durationS: [  5e-6,     10], quantity: J_M2, coefficient: 18,   factors: ['CA'],       timeExponent: 0.75, ...MEMORY },
  { mechanism: THERMAL,       wavelengthNm: [  700, 1400], durationS: [    10,    3e4], quantity: W_M2, coefficient: 10,   factors: ['CA', 'CC'],                     ...MEMORY },
  { mechanism: THERMAL,       wavelengthNm: [ 1050, 1400], durationS: [ 1e-13,  1e-11], quantity: J_M2, coefficient: 1e-2, factors: ['CC'],                           ...MEMORY },
  { mechanism: THERMAL,       wavelengthNm: [ 1050, 1400], durationS: [ 1e-11, 1.3e-5], quantity: J_M2, coefficient: 2e-2, factors: ['CC'],                           ...MEMORY },
  { mechanism: THERMAL,       wavelengthNm: [ 1050, 1400], durationS: [1.3e-5,     10], quantity: J_M2, coefficient: 90,   factors: ['CC'],       timeExponent: 0.75, ...MEMORY },
];

/** Retina, 400–1400 nm, sources above α_min. */
// prettier-ignore
export const EYE_RETINA_EXTENDED_SOURCE: readonly LimitRow[] = [
  { mechanism: PHOTOCHEMICAL, wavelengthNm: [  400,  600], durationS: [    10,    100], quantity: J_M2, coefficient: 100,  factors: ['CB'],                                            ...MEMORY, note: 'printed from 10 s; earlier editions start extended sources at 0.7 s' },
  { mechanism: PHOTOCHEMICAL, wavelengthNm: [  400,  600], durationS: [   100,    3e4], quantity: W_M2, coefficient: 1,    factors: ['CB'],                                            ...MEMORY },
  { mechanism: THERMAL,       wavelengthNm: [  400, 1050], durationS: [ 1e-13,  1e-11], quantity: J_M2, coefficient: 1e-3, factors: ['CE'],                                            ...MEMORY, note: 'no C_A below 10 ps' },
  { mechanism: THERMAL,       wavelengthNm: [  400, 1050], durationS: [ 1e-11,   5e-6], quantity: J_M2, coefficient: 2e-3, factors: ['CA', 'CE'],                                      ...MEMORY },
  { mechanism: THERMAL,       wavelengthNm: [  400, 1050], durationS: [  5e-6,     10], quantity: J_M2, coefficient: 18,   factors: ['CA', 'CE'],                  timeExponent: 0.75, ...MEMORY },
  { mechanism: THERMAL,       wavelengthNm: [  400, 1400], durationS: [    10,   'T2'], quantity: J_M2, coefficient: 18,   factors: ['CA', 'CC', 'CE'],            timeExponent: 0.75, ...MEMORY },
  { mechanism: THERMAL,       wavelengthNm: [  400, 1400], durationS: [  'T2',    3e4], quantity: W_M2, coefficient: 18,   factors: ['CA', 'CC', 'CE', 'T2^-1/4'],                     ...MEMORY },
  { mechanism: THERMAL,       wavelengthNm: [ 1050, 1400], durationS: [ 1e-13,  1e-11], quantity: J_M2, coefficient: 1e-2, factors: ['CC', 'CE'],                                      ...MEMORY },
  { mechanism: THERMAL,       wavelengthNm: [ 1050, 1400], durationS: [ 1e-11, 1.3e-5], quantity: J_M2, coefficient: 2e-2, factors: ['CC', 'CE'],                                      ...MEMORY },
  { mechanism: THERMAL,       wavelengthNm: [ 1050, 1400], durationS: [1.3e-5,     10], quantity: J_M2, coefficient: 90,   factors: ['CC', 'CE'],                  timeExponent: 0.75, ...MEMORY },
];

/** Cornea and lens where the retinal limits alone would not protect them. */
// prettier-ignore
export const EYE_ANTERIOR_CAP: readonly SkinReferenceRow[] = [
  { mechanism: CORNEAL, wavelengthNm: [ 1200, 1400], durationS: [  1e-9,    3e4], sameAs: 'skin', ...MEMORY_MEDIUM, note: 'C_C grows steeply here, so the front of the eye needs a limit of its own' },
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
