import {
  isExtended,
  plainMean,
  SMALL_SOURCE,
  type ApparentSource,
} from '../factors/apparent-source';
import { breakTimeT2 } from '../factors/break-time-t2';
import { correctionFactorCE } from '../factors/correction-factor-ce';
import { durationRowAt, durationValue, factorValue } from '../factors/factor-value';
import { power } from '../numeric/power';
import type { BandEdge, Band } from '../rule-sets/limit-table';
import { cellAt, LONGEST_S, type CompiledRow, type WavelengthBand } from './compiled-rule-set';

/** What a limit is read for. */
export interface ReadingPoint {
  readonly band: WavelengthBand;
  readonly wavelengthNm: number;
  readonly source: ApparentSource;
  /** The shortest duration of the tables, s. */
  readonly shortestS: number;
}

/** The duration at which the tables are read: inside their range. */
export function tabulatedDuration(point: ReadingPoint, durationS: number): number {
  if (durationS < point.shortestS) return point.shortestS;
  return durationS > LONGEST_S ? LONGEST_S : durationS;
}

/** The rows that apply at a duration of the tables, of the table that fits the source. */
export function rowsAt(point: ReadingPoint, tabulatedS: number): readonly CompiledRow[] {
  const { band, source } = point;
  const isByExtent = source !== SMALL_SOURCE && isExtended(source);
  const cell = cellAt(isByExtent ? band.extendedSource : band.smallSource, tabulatedS);
  return cell.isConditional
    ? cell.rows.filter((row) => !row.isConditional || conditionHolds(row, point, tabulatedS))
    : cell.rows;
}

/**
 * The limit of a row as a radiant exposure over the duration, J/m². Below the shortest duration of
 * the tables the irradiance of the shortest one is kept.
 */
export function radiantExposureLimit(
  row: CompiledRow,
  point: ReadingPoint,
  durationS: number,
): number {
  const t = tabulatedDuration(point, durationS);
  let limit = row.coefficient * power(t, row.timeExponent) + row.plus;
  if (row.isIrradiance) limit *= t;
  for (const factor of row.varyingFactors) limit *= factorValue(factor, point.wavelengthNm);
  if (point.source !== SMALL_SOURCE) limit *= sourceFactor(row, point, t);
  return durationS < t ? (limit * durationS) / t : limit;
}

/** C_E, T_2 and the limiting cone of a retinal row; 1 for a small source. */
function sourceFactor(row: CompiledRow, point: ReadingPoint, durationS: number): number {
  if (!point.band.isRetinal) return 1;
  let factor = 1;
  if (row.growsWithSource) factor *= correctionFactorCE(point.source, alphaMax(point, durationS));
  if (row.hasT2) factor *= power(breakTimeT2(point.source), -0.25);
  if (row.mechanism === 'photochemical') factor *= coneFactor(point, durationS);
  return factor;
}

/** α_max at a duration, mrad. */
export function alphaMax(point: ReadingPoint, durationS: number): number {
  const row = durationRowAt(point.band.alphaMax, durationS);
  return row === undefined ? Infinity : durationValue(row, durationS);
}

/** γ_ph at a duration, mrad; infinite where the edition has none. */
export function gammaPh(point: ReadingPoint, durationS: number): number {
  const row = durationRowAt(point.band.gammaPh, durationS);
  return row === undefined ? Infinity : durationValue(row, durationS);
}

/**
 * How much of the source lies outside the cone γ_ph. The limit holds for the part inside; the
 * exposure that is compared is of the whole source, so the limit grows instead.
 */
export function coneFactor(point: ReadingPoint, durationS: number): number {
  const { xMrad, yMrad } = point.source;
  const gammaMrad = gammaPh(point, durationS);
  return Math.max(1, xMrad / gammaMrad) * Math.max(1, yMrad / gammaMrad);
}

/** A band edge in seconds. */
export function edgeS(edge: BandEdge, point: ReadingPoint): number {
  if (typeof edge === 'number') return edge;
  if (edge === 'T2') return breakTimeT2(point.source);
  return point.band.t1 === undefined ? Infinity : factorValue(point.band.t1, point.wavelengthNm);
}

/** Whether a row with a named break time, or for some sources only, holds at a duration. */
function conditionHolds(
  { printed: { durationS, sourceMrad } }: CompiledRow,
  point: ReadingPoint,
  tabulatedS: number,
): boolean {
  const [from, to] = durationS;
  // A break time belongs to the row that ends there.
  if (typeof from === 'string' && tabulatedS <= edgeS(from, point)) return false;
  if (typeof to === 'string' && tabulatedS > edgeS(to, point)) return false;
  return sourceMrad === undefined || fitsSource(sourceMrad, point);
}

function fitsSource([above, below]: Band, { source }: ReadingPoint): boolean {
  const alphaMrad = plainMean(source);
  return alphaMrad > above && alphaMrad < below;
}

/** The limiting aperture of a row at a duration, m. */
export function limitingApertureM(
  { apertures }: CompiledRow,
  point: ReadingPoint,
  durationS: number,
): number {
  const tabulatedS = tabulatedDuration(point, durationS);
  const aperture = durationRowAt(apertures, tabulatedS);
  if (aperture === undefined) throw new RangeError('The tables hold no limiting aperture here.');
  return durationValue(aperture, tabulatedS) * 1e-3;
}
