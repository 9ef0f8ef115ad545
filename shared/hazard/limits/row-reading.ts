import { isExtended, type ApparentSource } from '../factors/apparent-source';
import { breakTimeT2 } from '../factors/break-time-t2';
import { correctionFactorCE } from '../factors/correction-factor-ce';
import { durationRowAt, durationValue, factorValue } from '../factors/factor-value';
import { power } from '../numeric/power';
import type { BandEdge, Band } from '../rule-sets/limit-table';
import { LONGEST_S, type CompiledRow, type WavelengthBand } from './compiled-rule-set';

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

/** The rows of the table that fits the source. */
export function rowsFor(point: ReadingPoint): readonly CompiledRow[] {
  return point.band.isRetinal && isExtended(point.source)
    ? point.band.extendedSource
    : point.band.smallSource;
}

/** Whether the row holds at a duration of the tables. */
export function appliesAt(row: CompiledRow, point: ReadingPoint, durationS: number): boolean {
  const { from, to } = row;
  if (typeof from === 'number' && typeof to === 'number') {
    const isInside = durationS >= from && (durationS < to || (row.endIncluded && durationS === to));
    return (
      isInside &&
      (row.printed.sourceMrad === undefined || fitsSource(row.printed.sourceMrad, point))
    );
  }
  return beginsBefore(from, point, durationS) && endsAfter(row, to, point, durationS);
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
  for (const factor of row.wavelengthFactors) limit *= factorValue(factor, point.wavelengthNm);
  if (point.band.isRetinal) limit *= sourceFactor(row, point, t);
  return durationS < t ? (limit * durationS) / t : limit;
}

/** C_E, T_2 and the limiting cone of a retinal row; 1 for a small source. */
function sourceFactor(row: CompiledRow, point: ReadingPoint, durationS: number): number {
  let factor = 1;
  if (row.growsWithSource) factor *= correctionFactorCE(point.source, alphaMax(point, durationS));
  if (row.hasT2) factor *= power(breakTimeT2(point.source), -0.25);
  if (row.mechanism === 'photochemical') factor *= coneFactor(point, durationS);
  return factor;
}

/** α_max at a duration, mrad. */
export function alphaMax(point: ReadingPoint, durationS: number): number {
  const row = durationRowAt(point.band.alphaMax, point.wavelengthNm, durationS);
  return row === undefined ? Infinity : durationValue(row, durationS);
}

/** γ_ph at a duration, mrad; infinite where the edition has none. */
export function gammaPh(point: ReadingPoint, durationS: number): number {
  const row = durationRowAt(point.band.gammaPh, point.wavelengthNm, durationS);
  return row === undefined ? Infinity : durationValue(row, durationS);
}

/**
 * How much of the source lies outside the cone γ_ph. The limit holds for the part inside; the
 * exposure that is compared is of the whole source, so the limit grows instead.
 */
export function coneFactor(point: ReadingPoint, durationS: number): number {
  const { xMrad, yMrad } = point.source;
  if (xMrad === 0 && yMrad === 0) return 1;
  const gammaMrad = gammaPh(point, durationS);
  return Math.max(1, xMrad / gammaMrad) * Math.max(1, yMrad / gammaMrad);
}

/** A band edge in seconds. */
export function edgeS(edge: BandEdge, point: ReadingPoint): number {
  if (typeof edge === 'number') return edge;
  if (edge === 'T2') return breakTimeT2(point.source);
  return point.band.t1 === undefined ? Infinity : factorValue(point.band.t1, point.wavelengthNm);
}

function beginsBefore(from: BandEdge, point: ReadingPoint, durationS: number): boolean {
  return typeof from === 'number' ? durationS >= from : durationS > edgeS(from, point);
}

function endsAfter(
  row: CompiledRow,
  to: BandEdge,
  point: ReadingPoint,
  durationS: number,
): boolean {
  if (typeof to !== 'number') return durationS <= edgeS(to, point);
  return durationS < to || (row.endIncluded && durationS === to);
}

function fitsSource([above, below]: Band, { source }: ReadingPoint): boolean {
  const alphaMrad = (source.xMrad + source.yMrad) / 2;
  return alphaMrad > above && alphaMrad < below;
}
