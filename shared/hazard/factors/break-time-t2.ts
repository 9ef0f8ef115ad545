import { ALPHA_MIN_MRAD, meanInside, type ApparentSource } from './apparent-source';

/** Above this angle T_2 no longer grows, mrad. */
export const T2_LARGEST_MRAD = 100;

/**
 * T_2, beyond which a longer exposure needs no lower irradiance, s.
 *
 * @param source angles of the source, mrad, 0 or more; an oblong one takes the mean of its axes,
 * each put inside [1.5, 100] mrad.
 * @returns seconds, from 10 to 100.
 * @source eu-2006-25:2.5
 * @example breakTimeT2({ xMrad: 20, yMrad: 20 }) // 15.41
 */
export function breakTimeT2(source: ApparentSource): number {
  const alphaMrad = meanInside(source, T2_LARGEST_MRAD);
  if (alphaMrad <= ALPHA_MIN_MRAD) return 10;
  return 10 * 10 ** ((alphaMrad - ALPHA_MIN_MRAD) / 98.5);
}
