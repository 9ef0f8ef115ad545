import type { EvaluationResult } from '../hazard/result';
import { formatQuantity } from '../model/quantity-format';

/** A caution that the place gives, with a short head. */
export interface PlaceCaution {
  readonly head: string;
  readonly text: string;
}

/** What a result means where the laser stands. */
export function placeCautions(
  { eye, skin }: EvaluationResult,
  wallDistanceM: number | undefined,
): PlaceCaution[] {
  const cautions: PlaceCaution[] = [];
  const distance = (meters: number) => formatQuantity(meters, 'm', 'up').text;
  if (wallDistanceM !== undefined && eye.hazardDistanceM > wallDistanceM) {
    cautions.push({
      head: 'Beyond the room',
      text:
        `The eye hazard ends at ${distance(eye.hazardDistanceM)}; the wall stands at ` +
        `${formatQuantity(wallDistanceM, 'm', 'nearest').text}. Windows, gaps and open doors count.`,
    });
  }
  if (skin.hazardDistanceM > 0) {
    cautions.push({
      head: 'Skin counts too',
      text:
        `The skin limit is exceeded up to ${distance(skin.hazardDistanceM)}: ` +
        'cover hands near the open beam.',
    });
  }
  return cautions;
}
