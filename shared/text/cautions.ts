import { dateWords, type LocalDate } from '../model/local-date';

/** Beside the engine's own cautions: what a whole evaluation and every printed sheet says. */
export const EVALUATION_CAUTIONS: readonly string[] = [
  'High voltage kills. Hazards other than the beam are listed here, not computed.',
  'An evaluation covers the lines, wavelengths and situations that it names, and no others.',
];

export function printedOn(date: LocalDate): string {
  return `Printed data age. Valid as of ${dateWords(date)}; check before use.`;
}

export function emergencyCaution(phone: string): string {
  return `Emergency: call ${phone} now. Do not wait for software.`;
}
