import type { LimitRow } from '../limit-table';

// IEC 60825-1:2014, exposure limits of the skin. Bands top to bottom as printed; how bands end: ../limit-table.ts.
const THERMAL = 'thermal';
const PHOTOCHEMICAL = 'photochemical';
const CORNEAL = 'corneal';
const J_M2 = 'J/m2';
const W_M2 = 'W/m2';

const SEEN_EQUIVALENT = {
  source: 'iec-60825-1-2014:A.3',
  confidence: 'seen-equivalent',
  seenIn: 'bgi-832:6a',
} as const;
const MEMORY = { source: 'iec-60825-1-2014:A.3', confidence: 'memory-high' } as const;
const MEMORY_DGUV = {
  source: 'iec-60825-1-2014:A.3',
  confidence: 'memory-high',
  seenIn: 'dguv-203-042:annex-6',
} as const;

/** Skin, 180 nm – 1 mm. */
// prettier-ignore
export const SKIN: readonly LimitRow[] = [
  { mechanism: PHOTOCHEMICAL, wavelengthNm: [  180, 302.5], durationS: [  1e-9,    3e4], quantity: J_M2, coefficient: 30,                                                                  ...SEEN_EQUIVALENT },
  { mechanism: CORNEAL,       wavelengthNm: [  180,  400],  durationS: [ 1e-13,   1e-9], quantity: W_M2, coefficient: 3e10,                                                                ...SEEN_EQUIVALENT },
  { mechanism: PHOTOCHEMICAL, wavelengthNm: [302.5,  315],  durationS: [    10,    3e4], quantity: J_M2, coefficient: 1,     factors: ['C2'],                                              ...MEMORY },
  { mechanism: THERMAL,       wavelengthNm: [302.5,  315],  durationS: [  1e-9,   'T1'], quantity: J_M2, coefficient: 5.6e3,                  timeExponent: 0.25,                          ...SEEN_EQUIVALENT, note: 'the lower of C_1 and C_2' },
  { mechanism: THERMAL,       wavelengthNm: [302.5,  315],  durationS: [  'T1',     10], quantity: J_M2, coefficient: 1,     factors: ['C2'],                                              ...SEEN_EQUIVALENT, note: 'the lower of C_1 and C_2' },
  { mechanism: PHOTOCHEMICAL, wavelengthNm: [  315,  400],  durationS: [    10,   1000], quantity: J_M2, coefficient: 1e4,                                                                 ...MEMORY },
  { mechanism: PHOTOCHEMICAL, wavelengthNm: [  315,  400],  durationS: [  1000,    3e4], quantity: W_M2, coefficient: 10,                                                                  ...MEMORY_DGUV },
  { mechanism: THERMAL,       wavelengthNm: [  315,  400],  durationS: [  1e-9,     10], quantity: J_M2, coefficient: 5.6e3,                  timeExponent: 0.25,                          ...SEEN_EQUIVALENT },
  { mechanism: THERMAL,       wavelengthNm: [  400, 1400],  durationS: [ 1e-13,   1e-9], quantity: W_M2, coefficient: 2e11,  factors: ['CA'],                                              ...MEMORY },
  { mechanism: THERMAL,       wavelengthNm: [  400, 1400],  durationS: [  1e-9,   1e-7], quantity: J_M2, coefficient: 200,   factors: ['CA'],                                              ...MEMORY },
  { mechanism: THERMAL,       wavelengthNm: [  400, 1400],  durationS: [  1e-7,     10], quantity: J_M2, coefficient: 1.1e4, factors: ['CA'], timeExponent: 0.25,                          ...MEMORY },
  { mechanism: THERMAL,       wavelengthNm: [  400, 1400],  durationS: [    10,    3e4], quantity: W_M2, coefficient: 2000,  factors: ['CA'],                                              ...MEMORY },
  { mechanism: THERMAL,       wavelengthNm: [ 1400, 1500],  durationS: [ 1e-13,   1e-9], quantity: W_M2, coefficient: 1e12,                                                                ...SEEN_EQUIVALENT },
  { mechanism: THERMAL,       wavelengthNm: [ 1400, 1500],  durationS: [  1e-9,  0.001], quantity: J_M2, coefficient: 1e3,                                                                 ...SEEN_EQUIVALENT },
  { mechanism: THERMAL,       wavelengthNm: [ 1400, 1500],  durationS: [ 0.001,     10], quantity: J_M2, coefficient: 5.6e3,                  timeExponent: 0.25,                          ...SEEN_EQUIVALENT },
  { mechanism: THERMAL,       wavelengthNm: [ 1400,  1e6],  durationS: [    10,    3e4], quantity: W_M2, coefficient: 1000,                                       exposedAreaUpToM2: 0.01, ...MEMORY_DGUV },
  { mechanism: THERMAL,       wavelengthNm: [ 1500, 1800],  durationS: [ 1e-13,   1e-9], quantity: W_M2, coefficient: 1e13,                                                                ...SEEN_EQUIVALENT },
  { mechanism: THERMAL,       wavelengthNm: [ 1500, 1800],  durationS: [  1e-9,     10], quantity: J_M2, coefficient: 1e4,                                                                 ...SEEN_EQUIVALENT },
  { mechanism: THERMAL,       wavelengthNm: [ 1800, 2600],  durationS: [ 1e-13,   1e-9], quantity: W_M2, coefficient: 1e12,                                                                ...SEEN_EQUIVALENT },
  { mechanism: THERMAL,       wavelengthNm: [ 1800, 2600],  durationS: [  1e-9,  0.001], quantity: J_M2, coefficient: 1e3,                                                                 ...SEEN_EQUIVALENT },
  { mechanism: THERMAL,       wavelengthNm: [ 1800, 2600],  durationS: [ 0.001,     10], quantity: J_M2, coefficient: 5.6e3,                  timeExponent: 0.25,                          ...SEEN_EQUIVALENT },
  { mechanism: THERMAL,       wavelengthNm: [ 2600,  1e6],  durationS: [ 1e-13,   1e-9], quantity: W_M2, coefficient: 1e11,                                                                ...SEEN_EQUIVALENT },
  { mechanism: THERMAL,       wavelengthNm: [ 2600,  1e6],  durationS: [  1e-9,   1e-7], quantity: J_M2, coefficient: 100,                                                                 ...SEEN_EQUIVALENT },
  { mechanism: THERMAL,       wavelengthNm: [ 2600,  1e6],  durationS: [  1e-7,     10], quantity: J_M2, coefficient: 5.6e3,                  timeExponent: 0.25,                          ...SEEN_EQUIVALENT },
];
