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
  if (beams.length === 1) return largestRatio(beams[0] as readonly TissueShare[]);
  const sums = new Map<Tissue, number>();
  for (const shares of beams) {
    const ofBeam = new Map<Tissue, number>();
    for (const { tissue, ratio } of shares) {
      ofBeam.set(tissue, Math.max(ratio, ofBeam.get(tissue) ?? 0));
    }
    for (const [tissue, ratio] of ofBeam) sums.set(tissue, (sums.get(tissue) ?? 0) + ratio);
  }
  return Math.max(0, ...sums.values());
}

/** The largest share of a beam. */
export function largestRatio(shares: readonly TissueShare[]): number {
  let largest = 0;
  for (const { ratio } of shares) if (ratio > largest) largest = ratio;
  return largest;
}
