import type { DurationRow, FactorRow, PulseTrainRow } from '../limit-table';
import type { FactorTable } from '../rule-set';

// Correction factors, break times and the pulse-train factor. Half-open bands.

const SEEN = { source: 'eu-2006-25:2.5', confidence: 'seen', seenIn: 'no-2011:4.5' } as const;
const SEEN_PULSES = { source: 'eu-2006-25:2.6', confidence: 'seen' } as const;
const MEMORY_PULSES = { source: 'eu-2006-25:2.6', confidence: 'memory-high' } as const;

/** C_A, for less absorption by melanin in the near infrared. */
// prettier-ignore
const CA: readonly FactorRow[] = [
  { wavelengthNm: [  180,  700], coefficient: 1, ...SEEN },
  { wavelengthNm: [  700, 1050], coefficient: 1, decadesPerNm: 0.002, originNm: 700, ...SEEN },
  { wavelengthNm: [ 1050, 1400], coefficient: 5, ...SEEN },
];

/** C_B, for less photochemical effect at longer wavelengths. */
// prettier-ignore
const CB: readonly FactorRow[] = [
  { wavelengthNm: [  400,  450], coefficient: 1, ...SEEN },
  { wavelengthNm: [  450,  700], coefficient: 1, decadesPerNm: 0.02, originNm: 450, ...SEEN },
];

/** C_C, for absorption in front of the retina. */
// prettier-ignore
const CC: readonly FactorRow[] = [
  { wavelengthNm: [  700, 1150], coefficient: 1, ...SEEN },
  { wavelengthNm: [ 1150, 1200], coefficient: 1, decadesPerNm: 0.018, originNm: 1150, ...SEEN },
  { wavelengthNm: [ 1200, 1400], coefficient: 8, ...SEEN },
];

/** T_min, within which pulses count as one, s. */
// prettier-ignore
const TI: readonly FactorRow[] = [
  { wavelengthNm: [  315,  400], coefficient: 1e-9, ...SEEN_PULSES },
  { wavelengthNm: [  400, 1050], coefficient: 1.8e-5, ...SEEN_PULSES },
  { wavelengthNm: [ 1050, 1400], coefficient: 5e-5, ...SEEN_PULSES },
  { wavelengthNm: [ 1400, 1500], coefficient: 1e-3, ...SEEN_PULSES },
  { wavelengthNm: [ 1500, 1800], coefficient: 10, ...SEEN_PULSES },
  { wavelengthNm: [ 1800, 2600], coefficient: 1e-3, ...MEMORY_PULSES },
  { wavelengthNm: [ 2600,  1e6], coefficient: 1e-7, ...MEMORY_PULSES },
];

/** α_max, the largest angle that C_E grows with, mrad. */
// prettier-ignore
const ALPHA_MAX: readonly DurationRow[] = [
  { wavelengthNm: [400, 1400], durationS: [  1e-13,     3e4], coefficient: 100, ...SEEN },
];

/** γ_ph, the limiting cone of the photochemical limit, mrad. */
// prettier-ignore
const GAMMA_PH: readonly DurationRow[] = [
  { wavelengthNm: [400, 600], durationS: [0.7, 100], coefficient: 11, ...SEEN },
  { wavelengthNm: [400, 600], durationS: [100, 1e4], coefficient: 1.1, timeExponent: 0.5, ...SEEN },
  { wavelengthNm: [400, 600], durationS: [1e4, 3e4], coefficient: 110, ...SEEN },
];

/** C_P, the pulse-train factor. */
// prettier-ignore
const CP: readonly PulseTrainRow[] = [
  { pulses: 'any', wavelengthNm: [315, 1e6], upToS: 10, coefficient: 1, floor: 0, ...SEEN_PULSES },
];

/** All factors of the edition. */
// prettier-ignore
export const FACTORS: FactorTable = {
  symbols: { CA: 'C_A', CB: 'C_B', CC: 'C_C', CE: 'C_E', CP: 'C_P', KL: 'K_lambda', C2: 'C_2', T1: 'T_1', T2: 'T_2' },
  CA, CB, CC, KL: [], C2: [], T1: [], Ti: TI,
  alphaMax: ALPHA_MAX, gammaPh: GAMMA_PH, hasT2: true, CP,
};
