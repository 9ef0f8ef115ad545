import { formatQuantity, spokenUnit } from '../model/quantity-format';

/** How far a laser reaches, as an evaluation says. */
export interface ReachDistances {
  /** All beams together; 0 when nowhere above the limit. */
  readonly eyeDistanceM: number;
  readonly skinDistanceM: number;
  readonly aidedDistanceM?: number | undefined;
  /** The longest free line in the room from this aperture. */
  readonly wallDistanceM?: number | undefined;
  /** Each line alone, for the ticks in the eye lane. */
  readonly lines?: readonly { readonly wavelengthNm: number; readonly eyeDistanceM: number }[];
  /** The sealed eye distance, when today's differs. */
  readonly sealedEyeDistanceM?: number | undefined;
  readonly eyeBandM?: readonly [low: number, high: number] | undefined;
  /** "7 × 50 optics". */
  readonly aidName?: string | undefined;
}

/** `unknown`: not evaluated, never drawn as zero. */
export type Reach = ReachDistances | 'unknown' | 'loading';

export type ReachSide = 'skin' | 'eye' | 'aided';

/** The strip in words: its accessible name. */
export function reachName(subject: string, reach: Reach): string {
  if (reach === 'loading') return `Reach of ${subject}: being read`;
  if (reach === 'unknown') return `Reach of ${subject}: not evaluated`;
  const { skinDistanceM, eyeDistanceM, aidedDistanceM, wallDistanceM, aidName } = reach;
  const parts = [
    ...(skinDistanceM > 0 ? [`skin ${spokenDistance(skinDistanceM)}`] : []),
    ...(eyeDistanceM > 0 ? [`eye ${spokenDistance(eyeDistanceM)}`] : []),
    ...(isAidShown(reach)
      ? [`with ${aidName ?? 'viewing aids'} ${spokenDistance(aidedDistanceM ?? 0)}`]
      : []),
  ];
  const hazard = parts.length > 0 ? parts.join(', ') : 'nowhere above the limit';
  const wall =
    wallDistanceM === undefined ? '' : `; wall of the room at ${spokenDistance(wallDistanceM)}`;
  return `Reach of ${subject}: ${hazard}${wall}`;
}

/** A distance in words, rounded up: "1.51 kilometers". */
export function spokenDistance(distanceM: number): string {
  const { number, unit } = formatQuantity(distanceM, 'm', 'up');
  return `${number} ${spokenUnit(unit)}`;
}

/** Glass that adds less than 2 % is not drawn. */
export function isAidShown({ eyeDistanceM, aidedDistanceM }: ReachDistances): boolean {
  return aidedDistanceM !== undefined && aidedDistanceM > eyeDistanceM * 1.02;
}
