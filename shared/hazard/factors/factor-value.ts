import { power } from '../numeric/power';
import type { Band, DurationRow, FactorRow } from '../rule-sets/limit-table';

/** The longest wavelength of the tables, 1 mm; the last band includes it. */
const LONGEST_NM = 1e6;

/** Whether the wavelength lies in a band. */
export function inBand(wavelengthNm: number, [from, to]: Band): boolean {
  return wavelengthNm >= from && (wavelengthNm < to || (to === LONGEST_NM && wavelengthNm === to));
}

/** The row of a factor that holds at this wavelength; without one the factor is 1. */
export function factorRowAt(
  rows: readonly FactorRow[],
  wavelengthNm: number,
): FactorRow | undefined {
  return rows.find((row) => inBand(wavelengthNm, row.wavelengthNm));
}

/** `plus + coefficient × 10^(decadesPerNm × (λ − originNm))`, the value of a row at a wavelength. */
export function factorValue(row: FactorRow, wavelengthNm: number): number {
  if (row.decadesPerNm === undefined) return row.coefficient;
  const exponent = row.decadesPerNm * (wavelengthNm - (row.originNm ?? 0));
  return (row.plus ?? 0) + row.coefficient * 10 ** exponent;
}

/** The row that holds at a duration. The last duration band includes its end. */
export function durationRowAt(
  rows: readonly DurationRow[],
  durationS: number,
): DurationRow | undefined {
  for (const row of rows) if (durationS < row.durationS[1]) return row;
  return rows.at(-1);
}

/** `coefficient × t^timeExponent`, the value of a row at a duration. */
export function durationValue(
  { coefficient, timeExponent }: DurationRow,
  durationS: number,
): number {
  return timeExponent === undefined ? coefficient : coefficient * power(durationS, timeExponent);
}
