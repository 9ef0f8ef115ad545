import { SMALL_SOURCE, type ApparentSource } from './factors/apparent-source';
import type { PerAxis } from './case';
import {
  bandAt,
  compiledRuleSet,
  type CompiledRow,
  type CompiledRuleSet,
} from './limits/compiled-rule-set';
import {
  limitingApertureM,
  radiantExposureLimit,
  rowsAt,
  tabulatedDuration,
  type ReadingPoint,
} from './limits/row-reading';
import type { Mechanism, Side } from './result';
import { ruleSetById, type RuleSetId } from './rule-sets';
import type { LimitRow } from './rule-sets/limit-table';

/** Which limit is wanted. */
export interface LimitQuery {
  readonly ruleSet: RuleSetId;
  readonly side: Side;
  /** From 180 to 1 000 000 nm. */
  readonly wavelengthNm: number;
  /** Above 0 and up to 30 000 s. */
  readonly durationS: number;
  /** Angle of the apparent source, mrad; without it the source is small. */
  readonly sourceMrad?: PerAxis;
}

/** One limit as read from its table. */
export interface LimitReading {
  readonly mechanism: Mechanism;
  /** Over the duration, J/m². */
  readonly radiantExposureJPerM2: number;
  /** The same as a mean irradiance, W/m². */
  readonly irradianceWPerM2: number;
  readonly limitingApertureMm: number;
  /** The printed row. */
  readonly row: LimitRow;
}

/**
 * Every limit that applies, in the order of the table.
 *
 * @throws RangeError when wavelength or duration are outside the tables, or the rule set is unknown.
 */
export function readLimits(query: LimitQuery): LimitReading[] {
  const point = readingPoint(query);
  const tabulatedS = tabulatedDuration(point, query.durationS);
  return rowsAt(point, tabulatedS).map((row) => toReading(row, point, query.durationS));
}

/**
 * The governing limit: of those that apply, the one with the smallest radiant exposure.
 *
 * @throws RangeError when wavelength or duration are outside the tables, or the rule set is unknown.
 * @example exposureLimit({ ruleSet: 'ansi-z136.1-2014', side: 'eye', wavelengthNm: 532, durationS: 0.25 }).radiantExposureJPerM2 // 6.364
 */
export function exposureLimit(query: LimitQuery): LimitReading {
  const point = readingPoint(query);
  const tabulatedS = tabulatedDuration(point, query.durationS);
  let governing: CompiledRow | undefined;
  let lowest = Infinity;
  for (const row of rowsAt(point, tabulatedS)) {
    const limit = radiantExposureLimit(row, point, query.durationS);
    if (limit < lowest) {
      lowest = limit;
      governing = row;
    }
  }
  if (governing === undefined) throw new RangeError('The tables hold no limit here.');
  return toReading(governing, point, query.durationS);
}

/** Where a limit is read. */
export function pointAt(
  { ruleSet, eye, skin }: CompiledRuleSet,
  side: Side,
  wavelengthNm: number,
  source: ApparentSource,
): ReadingPoint {
  const band = bandAt(side === 'eye' ? eye : skin, wavelengthNm);
  return { band, wavelengthNm, source, shortestS: ruleSet.shortestS };
}

/** One number or two as the angles of a source. */
export function apparentSource(sourceMrad: PerAxis | undefined): ApparentSource {
  if (sourceMrad === undefined) return SMALL_SOURCE;
  if (typeof sourceMrad === 'number') return { xMrad: sourceMrad, yMrad: sourceMrad };
  return { xMrad: sourceMrad[0], yMrad: sourceMrad[1] };
}

function readingPoint(query: LimitQuery): ReadingPoint {
  const { wavelengthNm, durationS } = query;
  const ruleSet = ruleSetById(query.ruleSet as unknown);
  if (ruleSet === undefined) throw new RangeError(`There is no rule set ${query.ruleSet}`);
  if (!(wavelengthNm >= 180 && wavelengthNm <= 1e6)) {
    throw new RangeError(`Limit: wavelength ${wavelengthNm} nm is outside 180–1 000 000 nm`);
  }
  if (!(durationS > 0 && durationS <= 3e4)) {
    throw new RangeError(`Limit: duration ${durationS} s is outside (0, 30 000] s`);
  }
  return pointAt(
    compiledRuleSet(ruleSet),
    query.side,
    wavelengthNm,
    apparentSource(query.sourceMrad),
  );
}

function toReading(row: CompiledRow, point: ReadingPoint, durationS: number): LimitReading {
  const radiantExposureJPerM2 = radiantExposureLimit(row, point, durationS);
  return {
    mechanism: row.mechanism,
    radiantExposureJPerM2,
    irradianceWPerM2: radiantExposureJPerM2 / durationS,
    limitingApertureMm: limitingApertureM(row, point, durationS) * 1e3,
    row: row.printed,
  };
}
