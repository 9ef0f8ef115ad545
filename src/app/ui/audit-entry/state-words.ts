import { EVALUATION_STATE_WORDS } from '@shared/workflow/evaluation-life-cycle';
import { LASER_STATE_WORDS } from '@shared/workflow/laser-life-cycle';

const WORDS: Readonly<Record<string, string>> = { ...LASER_STATE_WORDS, ...EVALUATION_STATE_WORDS };
const OF_LASERS: Readonly<Record<string, string>> = LASER_STATE_WORDS;

/** A state of a record as its chip says it; "withdrawn" is in both life cycles and means the same word. */
export function stateWords(state: string, recordKind: string): string {
  return (recordKind === 'laser' ? OF_LASERS[state] : WORDS[state]) ?? state;
}
