import type { LimitRow } from '../limit-table';

// Directive 2006/25/EC, exposure limits of the skin. Bands top to bottom as printed; how bands end: ../limit-table.ts.
const THERMAL = 'thermal';
const PHOTOCHEMICAL = 'photochemical';
const CORNEAL = 'corneal';
const J_M2 = 'J/m2';
const W_M2 = 'W/m2';

const SEEN_EQUIVALENT = {
  source: 'eu-2006-25:2.4',
  confidence: 'seen-equivalent',
  seenIn: 'bgi-832:6a',
} as const;
const MEMORY = { source: 'eu-2006-25:2.4', confidence: 'memory-high' } as const;
const SEEN_EQUIVALENT_TEXT = {
  source: 'eu-2006-25:2.4',
  confidence: 'seen-equivalent',
  seenIn: 'training-text:p104',
} as const;
const MEMORY_DGUV = {
  source: 'eu-2006-25:2.4',
  confidence: 'memory-high',
  seenIn: 'dguv-203-042:annex-6',
} as const;

/** Skin, 180 nm – 1 mm. */
// prettier-ignore
export const SKIN: readonly LimitRow[] = [
  { mechanism: PHOTOCHEMICAL, wavelengthNm: [  180,  303], durationS: [  1e-9,    3e4], quantity: J_M2, coefficient: 30,                                                                  ...SEEN_EQUIVALENT,      note: 'printed for 180–302 nm; taken up to the line of 303 nm' },
  { mechanism: THERMAL,       wavelengthNm: [  180,  315], durationS: [  1e-9,     10], quantity: J_M2, coefficient: 5.6e3,                  timeExponent: 0.25,                          ...MEMORY,               note: 'dual limit with the photochemical rows' },
  { mechanism: CORNEAL,       wavelengthNm: [  180,  400], durationS: [ 1e-13,   1e-9], quantity: W_M2, coefficient: 3e10,                                                                ...SEEN_EQUIVALENT },
  { mechanism: PHOTOCHEMICAL, wavelengthNm: [  303,  304], durationS: [  1e-9,    3e4], quantity: J_M2, coefficient: 40,                                                                  ...MEMORY },
  { mechanism: PHOTOCHEMICAL, wavelengthNm: [  304,  305], durationS: [  1e-9,    3e4], quantity: J_M2, coefficient: 60,                                                                  ...MEMORY },
  { mechanism: PHOTOCHEMICAL, wavelengthNm: [  305,  306], durationS: [  1e-9,    3e4], quantity: J_M2, coefficient: 100,                                                                 ...MEMORY },
  { mechanism: PHOTOCHEMICAL, wavelengthNm: [  306,  307], durationS: [  1e-9,    3e4], quantity: J_M2, coefficient: 160,                                                                 ...MEMORY },
  { mechanism: PHOTOCHEMICAL, wavelengthNm: [  307,  308], durationS: [  1e-9,    3e4], quantity: J_M2, coefficient: 250,                                                                 ...MEMORY },
  { mechanism: PHOTOCHEMICAL, wavelengthNm: [  308,  309], durationS: [  1e-9,    3e4], quantity: J_M2, coefficient: 400,                                                                 ...MEMORY },
  { mechanism: PHOTOCHEMICAL, wavelengthNm: [  309,  310], durationS: [  1e-9,    3e4], quantity: J_M2, coefficient: 630,                                                                 ...MEMORY },
  { mechanism: PHOTOCHEMICAL, wavelengthNm: [  310,  311], durationS: [  1e-9,    3e4], quantity: J_M2, coefficient: 1000,                                                                ...MEMORY },
  { mechanism: PHOTOCHEMICAL, wavelengthNm: [  311,  312], durationS: [  1e-9,    3e4], quantity: J_M2, coefficient: 1600,                                                                ...MEMORY },
  { mechanism: PHOTOCHEMICAL, wavelengthNm: [  312,  313], durationS: [  1e-9,    3e4], quantity: J_M2, coefficient: 2500,                                                                ...MEMORY },
  { mechanism: PHOTOCHEMICAL, wavelengthNm: [  313,  314], durationS: [  1e-9,    3e4], quantity: J_M2, coefficient: 4000,                                                                ...MEMORY },
  { mechanism: PHOTOCHEMICAL, wavelengthNm: [  314,  315], durationS: [  1e-9,    3e4], quantity: J_M2, coefficient: 6300,                                                                ...MEMORY },
  { mechanism: PHOTOCHEMICAL, wavelengthNm: [  315,  400], durationS: [    10,    3e4], quantity: J_M2, coefficient: 1e4,                                                                 ...MEMORY },
  { mechanism: THERMAL,       wavelengthNm: [  315,  400], durationS: [  1e-9,     10], quantity: J_M2, coefficient: 5.6e3,                  timeExponent: 0.25,                          ...SEEN_EQUIVALENT },
  { mechanism: THERMAL,       wavelengthNm: [  400,  700], durationS: [ 1e-13,   1e-9], quantity: W_M2, coefficient: 2e11,                                                                ...MEMORY },
  { mechanism: THERMAL,       wavelengthNm: [  400, 1400], durationS: [  1e-9,   1e-7], quantity: J_M2, coefficient: 200,   factors: ['CA'],                                              ...MEMORY },
  { mechanism: THERMAL,       wavelengthNm: [  400, 1400], durationS: [  1e-7,     10], quantity: J_M2, coefficient: 1.1e4, factors: ['CA'], timeExponent: 0.25,                          ...MEMORY },
  { mechanism: THERMAL,       wavelengthNm: [  400, 1400], durationS: [    10,    3e4], quantity: W_M2, coefficient: 2e3,   factors: ['CA'],                                              ...SEEN_EQUIVALENT_TEXT },
  { mechanism: THERMAL,       wavelengthNm: [  700, 1400], durationS: [ 1e-13,   1e-9], quantity: W_M2, coefficient: 2e11,  factors: ['CA'],                                              ...MEMORY },
  { mechanism: THERMAL,       wavelengthNm: [ 1400, 1500], durationS: [ 1e-13,   1e-9], quantity: W_M2, coefficient: 1e12,                                                                ...SEEN_EQUIVALENT },
  { mechanism: THERMAL,       wavelengthNm: [ 1400, 1500], durationS: [  1e-9,  0.001], quantity: J_M2, coefficient: 1e3,                                                                 ...SEEN_EQUIVALENT },
  { mechanism: THERMAL,       wavelengthNm: [ 1400, 1500], durationS: [ 0.001,     10], quantity: J_M2, coefficient: 5.6e3,                  timeExponent: 0.25,                          ...SEEN_EQUIVALENT },
  { mechanism: THERMAL,       wavelengthNm: [ 1400,  1e6], durationS: [    10,    3e4], quantity: W_M2, coefficient: 1000,                                       exposedAreaUpToM2: 0.01, ...MEMORY_DGUV },
  { mechanism: THERMAL,       wavelengthNm: [ 1500, 1800], durationS: [ 1e-13,   1e-9], quantity: W_M2, coefficient: 1e13,                                                                ...SEEN_EQUIVALENT },
  { mechanism: THERMAL,       wavelengthNm: [ 1500, 1800], durationS: [  1e-9,     10], quantity: J_M2, coefficient: 1e4,                                                                 ...SEEN_EQUIVALENT },
  { mechanism: THERMAL,       wavelengthNm: [ 1800, 2600], durationS: [ 1e-13,   1e-9], quantity: W_M2, coefficient: 1e12,                                                                ...SEEN_EQUIVALENT },
  { mechanism: THERMAL,       wavelengthNm: [ 1800, 2600], durationS: [  1e-9,  0.001], quantity: J_M2, coefficient: 1e3,                                                                 ...SEEN_EQUIVALENT },
  { mechanism: THERMAL,       wavelengthNm: [ 1800, 2600], durationS: [ 0.001,     10], quantity: J_M2, coefficient: 5.6e3,                  timeExponent: 0.25,                          ...SEEN_EQUIVALENT },
  { mechanism: THERMAL,       wavelengthNm: [ 2600,  1e6], durationS: [ 1e-13,   1e-9], quantity: W_M2, coefficient: 1e11,                                                                ...SEEN_EQUIVALENT },
  { mechanism: THERMAL,       wavelengthNm: [ 2600,  1e6], durationS: [  1e-9,   1e-7], quantity: J_M2, coefficient: 100,                                                                 ...SEEN_EQUIVALENT },
  { mechanism: THERMAL,       wavelengthNm: [ 2600,  1e6], durationS: [  1e-7,     10], quantity: J_M2, coefficient: 5.6e3,                  timeExponent: 0.25,                          ...SEEN_EQUIVALENT },
];
