/** The angle that the apparent source subtends in both axes, mrad. */
export interface ApparentSource {
  readonly xMrad: number;
  readonly yMrad: number;
}

/** The smallest angle that counts as extended, mrad; the same in every edition. */
export const ALPHA_MIN_MRAD = 1.5;

/** A source that the eye sees as a point. */
export const SMALL_SOURCE: ApparentSource = { xMrad: 0, yMrad: 0 };

/** Whether the tables for extended sources apply. */
export function isExtended(source: ApparentSource): boolean {
  return source.xMrad > ALPHA_MIN_MRAD || source.yMrad > ALPHA_MIN_MRAD;
}

/** The mean of both axes, each put inside [α_min, α_max], mrad. */
export function meanInside(source: ApparentSource, alphaMaxMrad: number): number {
  return (inside(source.xMrad, alphaMaxMrad) + inside(source.yMrad, alphaMaxMrad)) / 2;
}

/** The plain mean of both axes, mrad. */
export function plainMean(source: ApparentSource): number {
  return (source.xMrad + source.yMrad) / 2;
}

function inside(angleMrad: number, alphaMaxMrad: number): number {
  return Math.min(Math.max(angleMrad, ALPHA_MIN_MRAD), alphaMaxMrad);
}
