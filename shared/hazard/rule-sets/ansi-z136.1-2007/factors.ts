import type { DurationRow, FactorRow, PulseTrainRow } from '../limit-table';
import type { FactorTable } from '../rule-set';

// Correction factors, break times and the pulse-train factor. Half-open bands.

const MEMORY = { source: 'ansi-z136.1-2007:6', confidence: 'memory-high' } as const;
const MEMORY_MEDIUM = { source: 'ansi-z136.1-2007:6', confidence: 'memory-medium' } as const;
const SEEN_EQUIVALENT = {
  source: 'ansi-z136.1-2007:6',
  confidence: 'seen-equivalent',
  seenIn: 'bgi-832:4',
} as const;
const SEEN_EQUIVALENT_CONE = {
  source: 'ansi-z136.1-2007:6',
  confidence: 'seen-equivalent',
  seenIn: 'bgi-832:p27',
} as const;

/** C_A, for less absorption by melanin in the near infrared. */
// prettier-ignore
const CA: readonly FactorRow[] = [
  { wavelengthNm: [  180,  700], coefficient: 1, ...MEMORY },
  { wavelengthNm: [  700, 1050], coefficient: 1, decadesPerNm: 0.002, originNm: 700, ...MEMORY },
  { wavelengthNm: [ 1050, 1400], coefficient: 5, ...MEMORY },
];

/** C_B, for less photochemical effect at longer wavelengths. */
// prettier-ignore
const CB: readonly FactorRow[] = [
  { wavelengthNm: [  400,  450], coefficient: 1, ...MEMORY },
  { wavelengthNm: [  450,  600], coefficient: 1, decadesPerNm: 0.02, originNm: 450, ...MEMORY },
];

/** C_C, for absorption in front of the retina. */
// prettier-ignore
const CC: readonly FactorRow[] = [
  { wavelengthNm: [  700, 1150], coefficient: 1, ...MEMORY },
  { wavelengthNm: [ 1150, 1200], coefficient: 1, decadesPerNm: 0.018, originNm: 1150, ...MEMORY },
  { wavelengthNm: [ 1200, 1400], coefficient: 8, ...MEMORY },
];

/** C_2, the growth of the photochemical limit of ultraviolet. */
// prettier-ignore
const C2: readonly FactorRow[] = [
  { wavelengthNm: [  302,  315], coefficient: 1, decadesPerNm: 0.2, originNm: 295, ...MEMORY_MEDIUM },
];

/** T_min, within which pulses count as one, s. */
// prettier-ignore
const TI: readonly FactorRow[] = [
  { wavelengthNm: [  400, 1050], coefficient: 1.8e-5, ...SEEN_EQUIVALENT },
  { wavelengthNm: [ 1050, 1400], coefficient: 5e-5, ...SEEN_EQUIVALENT },
  { wavelengthNm: [ 1400, 1500], coefficient: 1e-3, ...SEEN_EQUIVALENT },
  { wavelengthNm: [ 1500, 1800], coefficient: 10, ...SEEN_EQUIVALENT },
  { wavelengthNm: [ 1800, 2600], coefficient: 1e-3, ...MEMORY },
  { wavelengthNm: [ 2600,  1e6], coefficient: 1e-7, ...MEMORY },
];

/** α_max, the largest angle that C_E grows with, mrad. */
// prettier-ignore
const ALPHA_MAX: readonly DurationRow[] = [
  { wavelengthNm: [400, 1400], durationS: [  1e-13,     3e4], coefficient: 100, ...MEMORY },
];

/** γ_ph, the limiting cone of the photochemical limit, mrad. */
// prettier-ignore
const GAMMA_PH: readonly DurationRow[] = [
  { wavelengthNm: [400, 600], durationS: [0.7, 100], coefficient: 11, ...SEEN_EQUIVALENT_CONE },
  { wavelengthNm: [400, 600], durationS: [100, 1e4], coefficient: 1.1, timeExponent: 0.5, ...SEEN_EQUIVALENT_CONE },
  { wavelengthNm: [400, 600], durationS: [1e4, 3e4], coefficient: 110, ...SEEN_EQUIVALENT_CONE },
];

/** C_P, the pulse-train factor. */
// prettier-ignore
const CP: readonly PulseTrainRow[] = [
  { pulses: 'any', wavelengthNm: [400, 1e6], upToS: 10, coefficient: 1, floor: 0, ...MEMORY },
];

/** All factors of the edition. */
// prettier-ignore
export const FACTORS: FactorTable = {
  symbols: { CA: 'C_A', CB: 'C_B', CC: 'C_C', CE: 'C_E', CP: 'C_P', KL: 'K_lambda', C2: 'C_2', T1: 'T_1', T2: 'T_2' },
  CA, CB, CC, KL: [], C2, T1: [], Ti: TI,
  alphaMax: ALPHA_MAX, gammaPh: GAMMA_PH, hasT2: true, CP,
};
