import type { Evaluation } from '@shared/model/evaluations';

/** What a signature means, as its heading. */
export const MEANING_WORDS: Readonly<Record<Evaluation['signatures'][number]['meaning'], string>> =
  {
    prepared: 'Prepared',
    reviewed: 'Checked',
    approved: 'Approved',
    'confirmed-unchanged': 'Confirmed unchanged',
    withdrawn: 'Withdrawn',
  };
