import { Dec, ONE, dec, maxOf, minOf } from './decimal';
import type { Scope } from './expression';
import { hasTarget, rowsAt, shortestDurationS, type CompiledRow, type RuleSetId } from './rows';

export type Side = 'eye' | 'skin';

/** Angular subtense of the apparent source in both axes, mrad; zero for a small source. */
export interface Source {
  readonly x: Dec;
  readonly y: Dec;
}

export const SMALL: Source = { x: dec(0), y: dec(0) };

/** Everything a row's expression may refer to. */
export interface Reading {
  readonly ruleSet: RuleSetId;
  readonly wavelengthNm: number;
  readonly durationS: number;
  readonly source: Source;
}

/** One limit of the tables at one duration. */
export interface TableLimit {
  readonly hazard: 'thermal' | 'photochemical' | 'corneal';
  readonly radiantExposure: Dec;
  readonly apertureMm: Dec;
}

const ALPHA_MIN = dec('1.5');

/** Other names of the same factor, tried in this order. */
const FACTOR_NAMES: Record<string, readonly string[]> = {
  CA: ['C_A'],
  C4: ['C4'],
  CB: ['C_B'],
  C3: ['C3'],
  CC: ['C_C'],
  C7: ['C7'],
  T1: ['T1uv', 'T1'],
};

/** C_A, C_B and C_C are one where the table has no line for them. */
const ONE_WHEN_ABSENT = new Set(['CA', 'C4', 'CB', 'C3', 'CC', 'C7']);

export function factor(name: string, reading: Reading): Dec | undefined {
  for (const tableName of FACTOR_NAMES[name] ?? [name]) {
    const key = { ruleSet: reading.ruleSet, target: `factor:${tableName}` };
    const row = rowsAt(key, reading.wavelengthNm)[0];
    if (row) return row.value(scopeOf(reading));
  }
  return ONE_WHEN_ABSENT.has(name) ? ONE : undefined;
}

/** The scope in which the expressions of the tables are evaluated. */
export function scopeOf(reading: Reading, extra: Record<string, Dec> = {}): Scope {
  return (name) => {
    const given = extra[name];
    if (given) return given;
    switch (name) {
      case 'lam':
        return dec(reading.wavelengthNm);
      case 't':
        return dec(reading.durationS);
      case 'alpha':
        return meanInside(reading);
      case 'CE':
      case 'C6':
        return extendedFactor(reading);
      default: {
        const value = factor(name, reading);
        if (!value) throw new Error(`${reading.ruleSet} has no ${name}`);
        return value;
      }
    }
  };
}

export function alphaMax(reading: Reading): Dec {
  const row = rowsAt({ ruleSet: reading.ruleSet, target: 'factor:alpha_max' }, 550)[0]!;
  return row.value((name) => {
    if (name !== 't') throw new Error(`alpha_max depends on ${name}`);
    return dec(reading.durationS);
  });
}

/** The mean of the axes, each put inside [alpha_min, alpha_max]. */
function meanInside(reading: Reading): Dec {
  const top = alphaMax(reading);
  const inside = (a: Dec): Dec => maxOf([ALPHA_MIN, minOf([a, top])]);
  return inside(reading.source.x).add(inside(reading.source.y)).div(2);
}

/** C_E of the whole source, oblong or not, in the open field of view. */
function extendedFactor(reading: Reading): Dec {
  const top = alphaMax(reading);
  const beyond = (a: Dec): Dec => maxOf([ONE, a.div(top)]);
  return meanInside(reading)
    .div(ALPHA_MIN)
    .mul(beyond(reading.source.x))
    .mul(beyond(reading.source.y));
}

export function isExtended(source: Source): boolean {
  return source.x.gt(ALPHA_MIN) || source.y.gt(ALPHA_MIN);
}

const onRetina = (wavelengthNm: number): boolean => wavelengthNm >= 400 && wavelengthNm < 1400;

export function apertureMm(side: Side, reading: Reading): Dec {
  const key = { ruleSet: reading.ruleSet, target: `aperture:${side}` };
  const first = rowsAt(key, reading.wavelengthNm, reading.durationS)[0];
  const row = first ?? rowsAt(key, reading.wavelengthNm, 1e-9)[0]!;
  return row.value(scopeOf(reading));
}

/** Every limit that the tables give at a duration; shorter than the tables: at constant irradiance. */
export function limitsAt(side: Side, reading: Reading): TableLimit[] {
  const shortest = shortestDurationS(reading.ruleSet);
  if (reading.durationS < shortest) {
    const share = dec(reading.durationS).div(dec(shortest));
    return limitsAt(side, { ...reading, durationS: shortest }).map((limit) => ({
      ...limit,
      radiantExposure: limit.radiantExposure.mul(share),
    }));
  }
  return limitRows(side, reading).map((row) => toLimit(row, side, reading));
}

function limitRows(side: Side, reading: Reading): CompiledRow[] {
  const { ruleSet, wavelengthNm, durationS } = reading;
  const extended = side === 'eye' && onRetina(wavelengthNm) && isExtended(reading.source);
  const wide = extended && hasTarget(ruleSet, 'eye-extended');
  const target = side === 'skin' ? 'skin' : wide ? 'eye-extended' : 'eye-point';
  const rows = rowsAt({ ruleSet, target }, wavelengthNm, durationS);
  if (wide && startsEarly(reading)) {
    const dose = rowsAt({ ruleSet, target }, wavelengthNm, 10);
    rows.push(...dose.filter((row) => row.hazard === 'photochemical'));
  }
  return rows;
}

/** IEC's note: for these sources the photochemical dose of 10 s to 100 s counts from 1 s on. */
function startsEarly({ ruleSet, wavelengthNm, durationS, source }: Reading): boolean {
  const alpha = source.x.add(source.y).div(2);
  return (
    ruleSet === 'iec-60825-1-2014' &&
    durationS >= 1 &&
    durationS < 10 &&
    wavelengthNm < 484 &&
    alpha.gt(ALPHA_MIN) &&
    alpha.lt(82)
  );
}

function toLimit(row: CompiledRow, side: Side, reading: Reading): TableLimit {
  const hazard = row.hazard!;
  const anteriorCap = side === 'eye' && onRetina(reading.wavelengthNm) && hazard === 'corneal';
  const apertureSide = anteriorCap ? 'skin' : side;
  return {
    hazard,
    radiantExposure: valueOf(row, reading).mul(sourceFactor(row, side, reading)),
    apertureMm: apertureMm(apertureSide, reading),
  };
}

function valueOf(row: CompiledRow, reading: Reading): Dec {
  if (row.expr === 'SKIN') {
    return minOf(limitsAt('skin', reading).map((limit) => limit.radiantExposure));
  }
  const value = row.value(scopeOf(reading));
  switch (row.unit) {
    case 'J/m2':
      return value;
    case 'J/cm2':
      return value.mul(1e4);
    case 'W/m2':
      return value.mul(dec(reading.durationS));
    case 'W/cm2':
      return value.mul(1e4).mul(dec(reading.durationS));
    default:
      throw new Error(`unknown unit ${row.unit}`);
  }
}

/** What a large source adds to a row that does not name C_E itself. */
function sourceFactor(row: CompiledRow, side: Side, reading: Reading): Dec {
  if (side === 'skin' || !onRetina(reading.wavelengthNm)) return ONE;
  if (row.hazard === 'photochemical') return coneFactor(reading);
  if (row.hazard === 'thermal' && row.target === 'eye-point') return extendedFactor(reading);
  return ONE;
}

/** The photochemical cone: a source larger than gamma_ph counts only by what lies inside it. */
function coneFactor(reading: Reading): Dec {
  const gamma = factor('gamma_ph', reading);
  if (!gamma) return ONE;
  const beyond = (a: Dec): Dec => maxOf([ONE, a.div(gamma)]);
  return beyond(reading.source.x).mul(beyond(reading.source.y));
}

/** T2, with the mean of the axes of an oblong source. */
export function t2(reading: Reading): Dec | undefined {
  const row = rowsAt({ ruleSet: reading.ruleSet, target: 'factor:T2' }, reading.wavelengthNm)[0];
  return row?.value(scopeOf(reading));
}
