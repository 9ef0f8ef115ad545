import { power } from '../numeric/power';
import type { PulseTrainRow } from '../rule-sets/limit-table';
import { inBand } from './factor-value';

/** What the branch of a pulse-train factor is chosen by. */
export interface PulseTrain {
  readonly wavelengthNm: number;
  readonly pulseS: number;
  /** Whether the pulse is not longer than T_i, or a group of pulses that counts as one. */
  readonly upToTi: boolean;
  readonly exposureS: number;
  /** Plain mean of the axes of the source, mrad. */
  readonly sourceMrad: number;
  /** α_max at the pulse duration, mrad. */
  readonly alphaMaxMrad: number;
}

/** The branch that applies to N pulses; without one the factor is 1. */
export function pulseTrainRow(
  rows: readonly PulseTrainRow[],
  train: PulseTrain,
  pulses: number,
): PulseTrainRow | undefined {
  return rows.find((row) => {
    if (!inBand(train.wavelengthNm, row.wavelengthNm) || train.pulseS > row.upToS) return false;
    if (row.pulses !== 'any' && (row.pulses === 'up to Ti') !== train.upToTi) return false;
    if (row.exposureAboveS !== undefined && !(train.exposureS > row.exposureAboveS)) return false;
    if (row.pulsesAbove !== undefined && !(pulses > row.pulsesAbove)) return false;
    return row.sourceMrad === undefined || isSourceInside(row.sourceMrad, train);
  });
}

/**
 * C_P (IEC: C5) of a branch: `min(1, max(coefficient × N^(-1/4), floor))`.
 *
 * @param row the branch, undefined where none applies.
 * @param pulses N, 1 or more.
 * @returns dimensionless, above 0 and up to 1.
 * @source iec-60825-1-2014:pulses
 * @example pulseTrainFactor({ coefficient: 5, floor: 0.4 }, 10000) // 0.5
 */
export function pulseTrainFactor(
  row: Pick<PulseTrainRow, 'coefficient' | 'floor'> | undefined,
  pulses: number,
): number {
  if (row === undefined) return 1;
  return Math.min(1, Math.max(row.coefficient * power(pulses, -0.25), row.floor));
}

function isSourceInside(
  [above, upTo]: NonNullable<PulseTrainRow['sourceMrad']>,
  { sourceMrad, alphaMaxMrad }: PulseTrain,
): boolean {
  const from = above === 'alphaMax' ? alphaMaxMrad : above;
  const to = upTo === 'alphaMax' ? alphaMaxMrad : upTo;
  return sourceMrad > from && sourceMrad <= to;
}
