import { ALPHA_MIN_MRAD, meanInside, type ApparentSource } from './apparent-source';

/**
 * C_E (IEC: C6), the correction for extended sources, for exposures of the whole source.
 *
 * Beyond α_max it grows with the area of the source, because the exposure that is compared is
 * not limited to the cone α_max. An oblong source takes the mean of its axes.
 *
 * @param source angles of the source, mrad, 0 or more.
 * @param alphaMaxMrad α_max at the duration of the limit, mrad.
 * @returns dimensionless, 1 or more.
 * @source eu-2006-25:2.5
 * @example correctionFactorCE({ xMrad: 20, yMrad: 20 }, 100) // 13.333
 */
export function correctionFactorCE(source: ApparentSource, alphaMaxMrad: number): number {
  return (
    (meanInside(source, alphaMaxMrad) / ALPHA_MIN_MRAD) *
    Math.max(1, source.xMrad / alphaMaxMrad) *
    Math.max(1, source.yMrad / alphaMaxMrad)
  );
}
