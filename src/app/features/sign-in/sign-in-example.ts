import type { ReachDistances } from '@shared/drawing/reach';
import { formatQuantity } from '@shared/model/quantity-format';

/**
 * What the strip beside the sign-in shows: a laser with six visible lines, computed once by the
 * engine and held to it by a test, so that this page need not load the engine.
 */
export const EXAMPLE_REACH = {
  eyeDistanceM: 1507.167,
  skinDistanceM: 167.2376,
  aidedDistanceM: 10_025.65,
} satisfies ReachDistances;

const shown = (distanceM: number) => formatQuantity(distanceM, 'm', 'up').text;

export const EXAMPLE_WORDS =
  `Six visible lines, 5.7 W together: skin ${shown(EXAMPLE_REACH.skinDistanceM)}, ` +
  `eye ${shown(EXAMPLE_REACH.eyeDistanceM)}, with 7 × 50 optics ` +
  `${shown(EXAMPLE_REACH.aidedDistanceM)}. ` +
  'Limits 2006/25/EC, Annex II; 0.25 s eye, 10 s skin.';
