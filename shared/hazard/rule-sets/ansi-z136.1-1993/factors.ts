import type { DurationRow, FactorRow, PulseTrainRow } from '../limit-table';
import type { FactorTable } from '../rule-set';

// Correction factors, break times and the pulse-train factor. Half-open bands.

const MEMORY = { source: 'ansi-z136.1-1993:factors', confidence: 'memory-high' } as const;
const MEMORY_MEDIUM = { source: 'ansi-z136.1-1993:factors', confidence: 'memory-medium' } as const;

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
  { wavelengthNm: [  400,  550], coefficient: 1, ...MEMORY },
  { wavelengthNm: [  550,  700], coefficient: 1, decadesPerNm: 0.015, originNm: 550, ...MEMORY },
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

/** T_1, where thermal and photochemical limit cross, s. */
// prettier-ignore
const T1: readonly FactorRow[] = [
  { wavelengthNm: [  550,  700], coefficient: 10, decadesPerNm: 0.02, originNm: 550, ...MEMORY },
];

/** T_min, within which pulses count as one, s. */
// prettier-ignore
const TI: readonly FactorRow[] = [
  { wavelengthNm: [  400, 1050], coefficient: 1.8e-5, ...MEMORY_MEDIUM },
  { wavelengthNm: [ 1050, 1400], coefficient: 5e-5, ...MEMORY_MEDIUM },
];

/** α_max, the largest angle that C_E grows with, mrad. */
// prettier-ignore
const ALPHA_MAX: readonly DurationRow[] = [
  { wavelengthNm: [400, 1400], durationS: [  1e-13,     3e4], coefficient: 100, ...MEMORY },
];

/** C_P, the pulse-train factor. */
// prettier-ignore
const CP: readonly PulseTrainRow[] = [
  { pulses: 'any', wavelengthNm: [180, 1e6], upToS: 3e4, coefficient: 1, floor: 0, ...MEMORY },
];

/** All factors of the edition. */
// prettier-ignore
export const FACTORS: FactorTable = {
  symbols: { CA: 'C_A', CB: 'C_B', CC: 'C_C', CE: 'C_E', CP: 'C_P', KL: 'K_lambda', C2: 'C_2', T1: 'T_1', T2: 'T_2' },
  CA, CB, CC, KL: [], C2, T1, Ti: TI,
  alphaMax: ALPHA_MAX, gammaPh: [], hasT2: false, CP,
};
