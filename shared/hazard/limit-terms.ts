import type { Tissue } from './limits/compiled-rule-set';
import type { LimitCandidate } from './pulses/limit-candidates';

/** The lowest limit of one tissue over one aperture. */
export interface LimitTerm {
  readonly tissue: Tissue;
  readonly apertureM: number;
  /** W/m² for CW, J/m² per pulse otherwise. */
  readonly limit: number;
}

/** How much of one tissue's limit a beam uses up. */
export interface TissueShare {
  readonly tissue: Tissue;
  readonly ratio: number;
}

/** What a candidate allows in the terms of the emission: W/m² for CW, J/m² per pulse otherwise. */
export function comparableLimit(candidate: LimitCandidate): number {
  return candidate.rule === 'continuous' ? candidate.limit / candidate.durationS : candidate.limit;
}

/** The lowest limit of each tissue and aperture. */
export function limitTerms(candidates: readonly LimitCandidate[]): LimitTerm[] {
  const terms: LimitTerm[] = [];
  for (const candidate of candidates) {
    const limit = comparableLimit(candidate);
    const { apertureM } = candidate;
    const { tissue } = candidate.row;
    const index = terms.findIndex((term) => term.tissue === tissue && term.apertureM === apertureM);
    if (index < 0) terms.push({ tissue, apertureM, limit });
    else if (limit < (terms[index] as LimitTerm).limit) terms[index] = { tissue, apertureM, limit };
  }
  return terms;
}

/** The largest sum of shares over all tissues: beams add up where they reach the same one. */
export function largestTissueSum(beams: readonly (readonly TissueShare[])[]): number {
  const sums = new Map<Tissue, number>();
  for (const shares of beams) {
    for (const [tissue, ratio] of largestPerTissue(shares)) {
      sums.set(tissue, (sums.get(tissue) ?? 0) + ratio);
    }
  }
  return Math.max(0, ...sums.values());
}

/** What governs each tissue: the largest share of a beam. */
export function largestPerTissue(shares: readonly TissueShare[]): Map<Tissue, number> {
  const largest = new Map<Tissue, number>();
  for (const { tissue, ratio } of shares) {
    largest.set(tissue, Math.max(ratio, largest.get(tissue) ?? 0));
  }
  return largest;
}
