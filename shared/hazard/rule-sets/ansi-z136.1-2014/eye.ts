import type { LimitRow } from '../limit-table';

// ANSI Z136.1-2014, exposure limits of the eye. Bands top to bottom as printed; how bands end: ../limit-table.ts.
const THERMAL = 'thermal';
const PHOTOCHEMICAL = 'photochemical';
const CORNEAL = 'corneal';
const J_CM2 = 'J/cm2';
const W_CM2 = 'W/cm2';

const MEMORY = { source: 'ansi-z136.1-2014:5', confidence: 'memory-high' } as const;
const ONE_NS_RULE = { source: 'ansi-z136.1:1-ns-rule', confidence: 'memory-low' } as const;
const MEMORY_MEDIUM = { source: 'ansi-z136.1-2014:5', confidence: 'memory-medium' } as const;
const MEMORY_LOW = { source: 'ansi-z136.1-2014:5', confidence: 'memory-low' } as const;

/** Cornea and lens, 180–400 nm. */
// prettier-ignore
export const EYE_ULTRAVIOLET: readonly LimitRow[] = [
  { mechanism: PHOTOCHEMICAL, wavelengthNm: [  180,  302], durationS: [  1e-9,    3e4], quantity: J_CM2, coefficient: 3e-3,                                       ...MEMORY },
  { mechanism: CORNEAL,       wavelengthNm: [  180,  400], durationS: [ 1e-13,   1e-9], quantity: W_CM2, coefficient: 3.1e6,                                      ...ONE_NS_RULE,   note: 'irradiance of the 1 ns limit' },
  { mechanism: THERMAL,       wavelengthNm: [  180,  400], durationS: [  1e-9,     10], quantity: J_CM2, coefficient: 0.56,                   timeExponent: 0.25, ...MEMORY,        note: 'dual limit with the photochemical rows' },
  { mechanism: PHOTOCHEMICAL, wavelengthNm: [  302,  315], durationS: [  1e-9,    3e4], quantity: J_CM2, coefficient: 1e-4,  factors: ['C2'],                     ...MEMORY_MEDIUM, note: '2007 prints one line a nanometer, 303–314 nm; the formula is recalled for 2014' },
  { mechanism: PHOTOCHEMICAL, wavelengthNm: [  315,  400], durationS: [    10,    3e4], quantity: J_CM2, coefficient: 1,                                          ...MEMORY },
];

/** Retina, 400–1400 nm, sources up to α_min. */
// prettier-ignore
export const EYE_RETINA_SMALL_SOURCE: readonly LimitRow[] = [
  { mechanism: PHOTOCHEMICAL, wavelengthNm: [  400,  600], durationS: [    10,    100], quantity: J_CM2, coefficient: 1e-2,   factors: ['CB'],                     ...MEMORY, note: 'printed for extended sources as a radiance' },
  { mechanism: PHOTOCHEMICAL, wavelengthNm: [  400,  600], durationS: [   100,    3e4], quantity: W_CM2, coefficient: 1e-4,   factors: ['CB'],                     ...MEMORY },
  { mechanism: THERMAL,       wavelengthNm: [  400,  700], durationS: [    10,    3e4], quantity: W_CM2, coefficient: 1e-3,                                        ...MEMORY },
  { mechanism: THERMAL,       wavelengthNm: [  400, 1050], durationS: [ 1e-13,  1e-11], quantity: J_CM2, coefficient: 1.0e-7,                                      ...MEMORY },
  { mechanism: THERMAL,       wavelengthNm: [  400, 1050], durationS: [ 1e-11,   5e-6], quantity: J_CM2, coefficient: 2.0e-7, factors: ['CA'],                     ...MEMORY },
  { mechanism: THERMAL,       wavelengthNm: [  400, 1050], durationS: [  5e-6,     10], quantity: J_CM2, coefficient: 1.8e-3, factors: ['CA'], timeExponent: 0.75, ...MEMORY },
  { mechanism: THERMAL,       wavelengthNm: [  700, 1050], durationS: [    10,    3e4], quantity: W_CM2, coefficient: 1e-3,   factors: ['CA'],                     ...MEMORY },
  { mechanism: THERMAL,       wavelengthNm: [ 1050, 1400], durationS: [ 1e-13,  1e-11], quantity: J_CM2, coefficient: 1.0e-6, factors: ['CC'],                     ...MEMORY },
  { mechanism: THERMAL,       wavelengthNm: [ 1050, 1400], durationS: [ 1e-11, 1.3e-5], quantity: J_CM2, coefficient: 2.0e-6, factors: ['CC'],                     ...MEMORY },
  { mechanism: THERMAL,       wavelengthNm: [ 1050, 1400], durationS: [1.3e-5,     10], quantity: J_CM2, coefficient: 9.0e-3, factors: ['CC'], timeExponent: 0.75, ...MEMORY },
  { mechanism: THERMAL,       wavelengthNm: [ 1050, 1400], durationS: [    10,    3e4], quantity: W_CM2, coefficient: 5e-3,   factors: ['CC'],                     ...MEMORY },
];

/** Retina, 400–1400 nm, sources above α_min. */
// prettier-ignore
export const EYE_RETINA_EXTENDED_SOURCE: readonly LimitRow[] = [
  { mechanism: PHOTOCHEMICAL, wavelengthNm: [  400,  600], durationS: [   0.7,    100], quantity: J_CM2, coefficient: 1e-2,   factors: ['CB'],                                      ...MEMORY, note: 'printed for extended sources as a radiance' },
  { mechanism: PHOTOCHEMICAL, wavelengthNm: [  400,  600], durationS: [   100,    3e4], quantity: W_CM2, coefficient: 1e-4,   factors: ['CB'],                                      ...MEMORY },
  { mechanism: THERMAL,       wavelengthNm: [  400, 1050], durationS: [ 1e-13,  1e-11], quantity: J_CM2, coefficient: 1.0e-7, factors: ['CE'],                                      ...MEMORY },
  { mechanism: THERMAL,       wavelengthNm: [  400, 1050], durationS: [ 1e-11,   5e-6], quantity: J_CM2, coefficient: 2.0e-7, factors: ['CA', 'CE'],                                ...MEMORY },
  { mechanism: THERMAL,       wavelengthNm: [  400, 1050], durationS: [  5e-6,     10], quantity: J_CM2, coefficient: 1.8e-3, factors: ['CA', 'CE'],            timeExponent: 0.75, ...MEMORY },
  { mechanism: THERMAL,       wavelengthNm: [  400, 1050], durationS: [    10,   'T2'], quantity: J_CM2, coefficient: 1.8e-3, factors: ['CA', 'CE'],            timeExponent: 0.75, ...MEMORY },
  { mechanism: THERMAL,       wavelengthNm: [  400, 1050], durationS: [  'T2',    3e4], quantity: W_CM2, coefficient: 1.8e-3, factors: ['CA', 'CE', 'T2^-1/4'],                     ...MEMORY },
  { mechanism: THERMAL,       wavelengthNm: [ 1050, 1400], durationS: [ 1e-13,  1e-11], quantity: J_CM2, coefficient: 1.0e-6, factors: ['CC', 'CE'],                                ...MEMORY },
  { mechanism: THERMAL,       wavelengthNm: [ 1050, 1400], durationS: [ 1e-11, 1.3e-5], quantity: J_CM2, coefficient: 2.0e-6, factors: ['CC', 'CE'],                                ...MEMORY },
  { mechanism: THERMAL,       wavelengthNm: [ 1050, 1400], durationS: [1.3e-5,     10], quantity: J_CM2, coefficient: 9.0e-3, factors: ['CC', 'CE'],            timeExponent: 0.75, ...MEMORY },
  { mechanism: THERMAL,       wavelengthNm: [ 1050, 1400], durationS: [    10,   'T2'], quantity: J_CM2, coefficient: 9.0e-3, factors: ['CC', 'CE'],            timeExponent: 0.75, ...MEMORY },
  { mechanism: THERMAL,       wavelengthNm: [ 1050, 1400], durationS: [  'T2',    3e4], quantity: W_CM2, coefficient: 9.0e-3, factors: ['CC', 'CE', 'T2^-1/4'],                     ...MEMORY },
];

/** Cornea and lens where the retinal limits alone would not protect them. */
// prettier-ignore
export const EYE_ANTERIOR_CAP: readonly LimitRow[] = [
  { mechanism: CORNEAL, wavelengthNm: [ 1200, 1400], durationS: [  1e-9,  0.001], quantity: J_CM2, coefficient: 0.3,  factors: ['KL'],                     aperture: 'skin',            ...MEMORY_LOW },
  { mechanism: CORNEAL, wavelengthNm: [ 1200, 1400], durationS: [ 0.001,      4], quantity: J_CM2, coefficient: 0.56, factors: ['KL'], timeExponent: 0.25, plus: 0.2, aperture: 'skin', ...MEMORY_LOW },
  { mechanism: CORNEAL, wavelengthNm: [ 1200, 1400], durationS: [     4,     10], quantity: J_CM2, coefficient: 1,    factors: ['KL'],                     aperture: 'skin',            ...MEMORY_LOW },
  { mechanism: CORNEAL, wavelengthNm: [ 1200, 1400], durationS: [    10,    3e4], quantity: W_CM2, coefficient: 0.1,  factors: ['KL'],                     aperture: 'skin',            ...MEMORY_LOW },
];

/** Cornea, 1400 nm – 1 mm. */
// prettier-ignore
export const EYE_FAR_INFRARED: readonly LimitRow[] = [
  { mechanism: CORNEAL, wavelengthNm: [ 1400, 1500], durationS: [ 1e-13,   1e-9], quantity: W_CM2, coefficient: 1e8,                                 ...ONE_NS_RULE, note: '1400–1500 nm kept at the value of 2007, which is the careful one' },
  { mechanism: CORNEAL, wavelengthNm: [ 1400, 1500], durationS: [  1e-9,  0.001], quantity: J_CM2, coefficient: 0.3,                                 ...MEMORY_LOW },
  { mechanism: CORNEAL, wavelengthNm: [ 1400, 1500], durationS: [ 0.001,      4], quantity: J_CM2, coefficient: 0.56, timeExponent: 0.25, plus: 0.2, ...MEMORY_LOW },
  { mechanism: CORNEAL, wavelengthNm: [ 1400, 1500], durationS: [     4,     10], quantity: J_CM2, coefficient: 1,                                   ...MEMORY_LOW },
  { mechanism: CORNEAL, wavelengthNm: [ 1400,  1e6], durationS: [    10,    3e4], quantity: W_CM2, coefficient: 0.1,                                 ...MEMORY },
  { mechanism: CORNEAL, wavelengthNm: [ 1500, 1800], durationS: [ 1e-13,   1e-9], quantity: W_CM2, coefficient: 1e9,                                 ...ONE_NS_RULE, note: 'irradiance of the 1 ns limit' },
  { mechanism: CORNEAL, wavelengthNm: [ 1500, 1800], durationS: [  1e-9,     10], quantity: J_CM2, coefficient: 1,                                   ...MEMORY },
  { mechanism: CORNEAL, wavelengthNm: [ 1800, 2600], durationS: [ 1e-13,   1e-9], quantity: W_CM2, coefficient: 1e8,                                 ...ONE_NS_RULE, note: 'irradiance of the 1 ns limit' },
  { mechanism: CORNEAL, wavelengthNm: [ 1800, 2600], durationS: [  1e-9,  0.001], quantity: J_CM2, coefficient: 0.1,                                 ...MEMORY },
  { mechanism: CORNEAL, wavelengthNm: [ 1800, 2600], durationS: [ 0.001,     10], quantity: J_CM2, coefficient: 0.56, timeExponent: 0.25,            ...MEMORY },
  { mechanism: CORNEAL, wavelengthNm: [ 2600,  1e6], durationS: [ 1e-13,   1e-9], quantity: W_CM2, coefficient: 1e7,                                 ...ONE_NS_RULE, note: 'irradiance of the 1 ns limit' },
  { mechanism: CORNEAL, wavelengthNm: [ 2600,  1e6], durationS: [  1e-9,   1e-7], quantity: J_CM2, coefficient: 1e-2,                                ...MEMORY },
  { mechanism: CORNEAL, wavelengthNm: [ 2600,  1e6], durationS: [  1e-7,     10], quantity: J_CM2, coefficient: 0.56, timeExponent: 0.25,            ...MEMORY },
];
