import type { Provenance } from '../model/common';

/** Where a number came from, in the words shown beside it. */
export const PROVENANCE_WORDS: Readonly<Record<Provenance, string>> = {
  label: 'label',
  'data-sheet': 'data sheet',
  measured: 'measured',
  estimated: 'estimated',
};
