import type { Signature } from '../model/evaluations';
import { dateWords, type LocalDate } from '../model/local-date';

/** What is signed: which evaluation, made with which edition. */
export interface Signed {
  readonly number: number;
  readonly tag: string;
  readonly edition: string;
  /** Next review, where the signature sets one. */
  readonly reviewOn?: LocalDate | undefined;
}

/** The sentence under a signature, complete in itself: it is read years later. */
export function statementOf(meaning: Signature['meaning'], signed: Signed): string {
  const which = `evaluation ${signed.number} of laser ${signed.tag}, made with ${signed.edition}`;
  const until = signed.reviewOn ? ` It is reviewed by ${dateWords(signed.reviewOn)}.` : '';
  switch (meaning) {
    case 'prepared':
      return `I have prepared ${which}. The inputs are those of the laser's record, with their units and sources, and every line and activity is answered.`;
    case 'reviewed':
      return `I have checked ${which}: its inputs, assumptions and results. I am not its author.`;
    case 'approved':
      return `I approve ${which}. I have read its assumptions, its conditions and its cautions.${until}`;
    case 'confirmed-unchanged':
      return `I confirm ${which}: the inputs equal the sealed ones, and the results computed anew are equal.${until}`;
    case 'withdrawn':
      return `I withdraw ${which}, because it is wrong.`;
  }
}
