import type { LimitRow } from '../limit-table';

// ANSI Z136.1-1993, exposure limits of the eye. Bands top to bottom as printed; how bands end: ../limit-table.ts.
const THERMAL = 'thermal';
const PHOTOCHEMICAL = 'photochemical';
const CORNEAL = 'corneal';
const J_CM2 = 'J/cm2';
const W_CM2 = 'W/cm2';

const MEMORY = { source: 'ansi-z136.1-1993:limits', confidence: 'memory-high' } as const;
const MEMORY_MEDIUM = { source: 'ansi-z136.1-1993:limits', confidence: 'memory-medium' } as const;

/** Cornea and lens, 180–400 nm. */
// prettier-ignore
export const EYE_ULTRAVIOLET: readonly LimitRow[] = [
  { mechanism: PHOTOCHEMICAL, wavelengthNm: [  180,  302], durationS: [  1e-9,    3e4], quantity: J_CM2, coefficient: 3e-3,                                      ...MEMORY },
  { mechanism: THERMAL,       wavelengthNm: [  180,  400], durationS: [  1e-9,     10], quantity: J_CM2, coefficient: 0.56,                  timeExponent: 0.25, ...MEMORY },
  { mechanism: PHOTOCHEMICAL, wavelengthNm: [  302,  315], durationS: [  1e-9,    3e4], quantity: J_CM2, coefficient: 1e-4, factors: ['C2'],                     ...MEMORY_MEDIUM, note: 'printed as one line a nanometer, 303–314 nm' },
  { mechanism: PHOTOCHEMICAL, wavelengthNm: [  315,  400], durationS: [    10,    3e4], quantity: J_CM2, coefficient: 1,                                         ...MEMORY },
];

/** Retina, 400–1400 nm, sources up to α_min. */
// prettier-ignore
export const EYE_RETINA_SMALL_SOURCE: readonly LimitRow[] = [
  { mechanism: PHOTOCHEMICAL, wavelengthNm: [  400,  550], durationS: [    10,    1e4], quantity: J_CM2, coefficient: 1e-2,                                        ...MEMORY },
  { mechanism: THERMAL,       wavelengthNm: [  400,  700], durationS: [  1e-9, 1.8e-5], quantity: J_CM2, coefficient: 5e-7,                                        ...MEMORY },
  { mechanism: THERMAL,       wavelengthNm: [  400,  700], durationS: [1.8e-5,     10], quantity: J_CM2, coefficient: 1.8e-3,                  timeExponent: 0.75, ...MEMORY },
  { mechanism: PHOTOCHEMICAL, wavelengthNm: [  400,  700], durationS: [   1e4,    3e4], quantity: W_CM2, coefficient: 1e-6,   factors: ['CB'],                     ...MEMORY },
  { mechanism: THERMAL,       wavelengthNm: [  550,  700], durationS: [    10,   'T1'], quantity: J_CM2, coefficient: 1.8e-3,                  timeExponent: 0.75, ...MEMORY, note: 'C_B of 1993 starts at 550 nm' },
  { mechanism: THERMAL,       wavelengthNm: [  550,  700], durationS: [  'T1',    1e4], quantity: J_CM2, coefficient: 1e-2,   factors: ['CB'],                     ...MEMORY, note: 'C_B of 1993 starts at 550 nm' },
  { mechanism: THERMAL,       wavelengthNm: [  700, 1050], durationS: [  1e-9, 1.8e-5], quantity: J_CM2, coefficient: 5e-7,   factors: ['CA'],                     ...MEMORY },
  { mechanism: THERMAL,       wavelengthNm: [  700, 1050], durationS: [1.8e-5,   1000], quantity: J_CM2, coefficient: 1.8e-3, factors: ['CA'], timeExponent: 0.75, ...MEMORY },
  { mechanism: THERMAL,       wavelengthNm: [  700, 1050], durationS: [  1000,    3e4], quantity: W_CM2, coefficient: 320e-6, factors: ['CA'],                     ...MEMORY },
  { mechanism: THERMAL,       wavelengthNm: [ 1050, 1400], durationS: [  1e-9,   5e-5], quantity: J_CM2, coefficient: 5e-6,   factors: ['CC'],                     ...MEMORY },
  { mechanism: THERMAL,       wavelengthNm: [ 1050, 1400], durationS: [  5e-5,   1000], quantity: J_CM2, coefficient: 9e-3,   factors: ['CC'], timeExponent: 0.75, ...MEMORY },
  { mechanism: THERMAL,       wavelengthNm: [ 1050, 1400], durationS: [  1000,    3e4], quantity: W_CM2, coefficient: 1.6e-3, factors: ['CC'],                     ...MEMORY },
];

/** Retina, 400–1400 nm, sources above α_min. */
// prettier-ignore
export const EYE_RETINA_EXTENDED_SOURCE: readonly LimitRow[] = [
  { mechanism: PHOTOCHEMICAL, wavelengthNm: [  400,  550], durationS: [    10,    1e4], quantity: J_CM2, coefficient: 1e-2,                                              ...MEMORY },
  { mechanism: THERMAL,       wavelengthNm: [  400,  700], durationS: [  1e-9, 1.8e-5], quantity: J_CM2, coefficient: 5e-7,   factors: ['CE'],                           ...MEMORY },
  { mechanism: THERMAL,       wavelengthNm: [  400,  700], durationS: [1.8e-5,     10], quantity: J_CM2, coefficient: 1.8e-3, factors: ['CE'],       timeExponent: 0.75, ...MEMORY },
  { mechanism: PHOTOCHEMICAL, wavelengthNm: [  400,  700], durationS: [   1e4,    3e4], quantity: W_CM2, coefficient: 1e-6,   factors: ['CB'],                           ...MEMORY },
  { mechanism: THERMAL,       wavelengthNm: [  550,  700], durationS: [    10,   'T1'], quantity: J_CM2, coefficient: 1.8e-3, factors: ['CE'],       timeExponent: 0.75, ...MEMORY, note: 'C_B of 1993 starts at 550 nm' },
  { mechanism: THERMAL,       wavelengthNm: [  550,  700], durationS: [  'T1',    1e4], quantity: J_CM2, coefficient: 1e-2,   factors: ['CB', 'CE'],                     ...MEMORY, note: 'C_B of 1993 starts at 550 nm' },
  { mechanism: THERMAL,       wavelengthNm: [  700, 1050], durationS: [  1e-9, 1.8e-5], quantity: J_CM2, coefficient: 5e-7,   factors: ['CA', 'CE'],                     ...MEMORY },
  { mechanism: THERMAL,       wavelengthNm: [  700, 1050], durationS: [1.8e-5,   1000], quantity: J_CM2, coefficient: 1.8e-3, factors: ['CA', 'CE'], timeExponent: 0.75, ...MEMORY },
  { mechanism: THERMAL,       wavelengthNm: [  700, 1050], durationS: [  1000,    3e4], quantity: W_CM2, coefficient: 320e-6, factors: ['CA', 'CE'],                     ...MEMORY },
  { mechanism: THERMAL,       wavelengthNm: [ 1050, 1400], durationS: [  1e-9,   5e-5], quantity: J_CM2, coefficient: 5e-6,   factors: ['CC', 'CE'],                     ...MEMORY },
  { mechanism: THERMAL,       wavelengthNm: [ 1050, 1400], durationS: [  5e-5,   1000], quantity: J_CM2, coefficient: 9e-3,   factors: ['CC', 'CE'], timeExponent: 0.75, ...MEMORY },
  { mechanism: THERMAL,       wavelengthNm: [ 1050, 1400], durationS: [  1000,    3e4], quantity: W_CM2, coefficient: 1.6e-3, factors: ['CC', 'CE'],                     ...MEMORY },
];

/** Cornea, 1400 nm – 1 mm. */
// prettier-ignore
export const EYE_FAR_INFRARED: readonly LimitRow[] = [
  { mechanism: CORNEAL, wavelengthNm: [ 1400, 1500], durationS: [  1e-9,  0.001], quantity: J_CM2, coefficient: 0.1,                      ...MEMORY },
  { mechanism: CORNEAL, wavelengthNm: [ 1400, 1500], durationS: [ 0.001,     10], quantity: J_CM2, coefficient: 0.56, timeExponent: 0.25, ...MEMORY },
  { mechanism: CORNEAL, wavelengthNm: [ 1400,  1e6], durationS: [    10,    3e4], quantity: W_CM2, coefficient: 0.1,                      ...MEMORY },
  { mechanism: CORNEAL, wavelengthNm: [ 1500, 1800], durationS: [  1e-9,     10], quantity: J_CM2, coefficient: 1,                        ...MEMORY },
  { mechanism: CORNEAL, wavelengthNm: [ 1800, 2600], durationS: [  1e-9,  0.001], quantity: J_CM2, coefficient: 0.1,                      ...MEMORY },
  { mechanism: CORNEAL, wavelengthNm: [ 1800, 2600], durationS: [ 0.001,     10], quantity: J_CM2, coefficient: 0.56, timeExponent: 0.25, ...MEMORY },
  { mechanism: CORNEAL, wavelengthNm: [ 2600,  1e6], durationS: [  1e-9,   1e-7], quantity: J_CM2, coefficient: 1e-2,                     ...MEMORY },
  { mechanism: CORNEAL, wavelengthNm: [ 2600,  1e6], durationS: [  1e-7,     10], quantity: J_CM2, coefficient: 0.56, timeExponent: 0.25, ...MEMORY },
];
