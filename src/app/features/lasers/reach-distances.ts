import type { ReachDistances } from '@shared/drawing/reach';
import type { Reach } from '@shared/model/lasers';

/** A sealed reach as the strip draws it, in the laser's room. */
export function reachDistances(
  reach: Reach | undefined,
  wallDistanceM: number | undefined,
): ReachDistances | 'unknown' {
  if (!reach) return 'unknown';
  const { eyeDistanceM, skinDistanceM, aidedDistanceM, lines } = reach;
  return { eyeDistanceM, skinDistanceM, aidedDistanceM, wallDistanceM, lines };
}
