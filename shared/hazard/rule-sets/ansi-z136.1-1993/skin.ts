import type { LimitRow } from '../limit-table';

// ANSI Z136.1-1993, exposure limits of the skin. Bands top to bottom as printed; how bands end: ../limit-table.ts.
const THERMAL = 'thermal';
const PHOTOCHEMICAL = 'photochemical';
const J_CM2 = 'J/cm2';
const W_CM2 = 'W/cm2';

const MEMORY = { source: 'ansi-z136.1-1993:limits', confidence: 'memory-high' } as const;
const MEMORY_MEDIUM = { source: 'ansi-z136.1-1993:limits', confidence: 'memory-medium' } as const;

/** Skin, 180 nm – 1 mm. */
// prettier-ignore
export const SKIN: readonly LimitRow[] = [
  { mechanism: PHOTOCHEMICAL, wavelengthNm: [  180,  302], durationS: [  1e-9,    3e4], quantity: J_CM2, coefficient: 3e-3,                                      ...MEMORY },
  { mechanism: THERMAL,       wavelengthNm: [  180,  400], durationS: [  1e-9,     10], quantity: J_CM2, coefficient: 0.56,                  timeExponent: 0.25, ...MEMORY },
  { mechanism: PHOTOCHEMICAL, wavelengthNm: [  302,  315], durationS: [  1e-9,    3e4], quantity: J_CM2, coefficient: 1e-4, factors: ['C2'],                     ...MEMORY_MEDIUM, note: 'printed as one line a nanometer, 303–314 nm' },
  { mechanism: PHOTOCHEMICAL, wavelengthNm: [  315,  400], durationS: [    10,   1000], quantity: J_CM2, coefficient: 1,                                         ...MEMORY },
  { mechanism: PHOTOCHEMICAL, wavelengthNm: [  315,  400], durationS: [  1000,    3e4], quantity: W_CM2, coefficient: 1e-3,                                      ...MEMORY },
  { mechanism: THERMAL,       wavelengthNm: [  400, 1400], durationS: [  1e-9,   1e-7], quantity: J_CM2, coefficient: 2e-2, factors: ['CA'],                     ...MEMORY },
  { mechanism: THERMAL,       wavelengthNm: [  400, 1400], durationS: [  1e-7,     10], quantity: J_CM2, coefficient: 1.1,  factors: ['CA'], timeExponent: 0.25, ...MEMORY },
  { mechanism: THERMAL,       wavelengthNm: [  400, 1400], durationS: [    10,    3e4], quantity: W_CM2, coefficient: 0.2,  factors: ['CA'],                     ...MEMORY },
  { mechanism: THERMAL,       wavelengthNm: [ 1400, 1500], durationS: [  1e-9,  0.001], quantity: J_CM2, coefficient: 0.1,                                       ...MEMORY },
  { mechanism: THERMAL,       wavelengthNm: [ 1400, 1500], durationS: [ 0.001,     10], quantity: J_CM2, coefficient: 0.56,                  timeExponent: 0.25, ...MEMORY },
  { mechanism: THERMAL,       wavelengthNm: [ 1400,  1e6], durationS: [    10,    3e4], quantity: W_CM2, coefficient: 0.1,                                       ...MEMORY },
  { mechanism: THERMAL,       wavelengthNm: [ 1500, 1800], durationS: [  1e-9,     10], quantity: J_CM2, coefficient: 1,                                         ...MEMORY },
  { mechanism: THERMAL,       wavelengthNm: [ 1800, 2600], durationS: [  1e-9,  0.001], quantity: J_CM2, coefficient: 0.1,                                       ...MEMORY },
  { mechanism: THERMAL,       wavelengthNm: [ 1800, 2600], durationS: [ 0.001,     10], quantity: J_CM2, coefficient: 0.56,                  timeExponent: 0.25, ...MEMORY },
  { mechanism: THERMAL,       wavelengthNm: [ 2600,  1e6], durationS: [  1e-9,   1e-7], quantity: J_CM2, coefficient: 1e-2,                                      ...MEMORY },
  { mechanism: THERMAL,       wavelengthNm: [ 2600,  1e6], durationS: [  1e-7,     10], quantity: J_CM2, coefficient: 0.56,                  timeExponent: 0.25, ...MEMORY },
];
