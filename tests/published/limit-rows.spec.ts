import { describe, expect, it } from 'vitest';

import { RULE_SETS } from '../../shared/hazard/rule-sets';
import type {
  BandEdge,
  DurationRow,
  EyeRow,
  FactorRow,
  FactorSymbol,
  LimitRow,
  Provenance,
  PulseTrainRow,
} from '../../shared/hazard/rule-sets/limit-table';
import type { RuleSet } from '../../shared/hazard/rule-sets/rule-set';
import { dec } from '../support/decimal-model/decimal';
import { scopeOf, type Reading } from '../support/decimal-model/limits';
import { TABLE_ROWS, rowsAt, type CompiledRow, type TableRow } from '../support/decimal-model/rows';

const SAMPLE_ANGLES_MRAD = [2, 4, 20, 60, 150];
const UNIT_TO_J_PER_M2: Record<string, (t: number) => number> = {
  'J/m2': () => 1,
  'J/cm2': () => 1e4,
  'W/m2': (t) => t,
  'W/cm2': (t) => 1e4 * t,
};

const lines = (ruleSet: RuleSet, target: string): readonly TableRow[] =>
  TABLE_ROWS.filter((line) => line.ruleset === ruleSet.id && line.target === target);

/** The line as the decimal model reads it. */
const compiled = (line: TableRow): CompiledRow =>
  rowsAt({ ruleSet: line.ruleset, target: line.target }, line.lambda_nm[0]).find(
    (row) => row.expr === line.expr && row.t_s[0] === line.t_s[0] && row.hazard === line.hazard,
  )!;

/** Edges and inside of a band: the start, the end just before the next band, and between. */
function samples([from, to]: readonly [number, number]): number[] {
  const before = to * (1 - 2 ** -52);
  return [from, from + (to - from) / 3, Math.sqrt(from * to), before];
}

function readings(line: TableRow): Reading[] {
  const angles = line.target === 'eye-extended' ? SAMPLE_ANGLES_MRAD : [0];
  return samples(line.lambda_nm).flatMap((wavelengthNm) =>
    samples(line.t_s).flatMap((durationS) =>
      angles.map((alpha) => ({
        ruleSet: line.ruleset,
        wavelengthNm,
        durationS,
        source: { x: dec(alpha), y: dec(alpha) },
      })),
    ),
  );
}

/** A factor row of the engine, evaluated as its type says. */
function factorValue(rows: readonly FactorRow[], wavelengthNm: number): number {
  const row = rows.find(
    ({ wavelengthNm: [from, to] }) => wavelengthNm >= from && wavelengthNm < to,
  );
  if (!row) return 1;
  const decades = (row.decadesPerNm ?? 0) * (wavelengthNm - (row.originNm ?? 0));
  return (row.plus ?? 0) + row.coefficient * 10 ** decades;
}

function symbolValue(symbol: FactorSymbol, ruleSet: RuleSet, reading: Reading): number {
  if (symbol === 'CE') return scopeOf(reading)('CE').toNumber();
  if (symbol === 'T2^-1/4') return scopeOf(reading)('T2').pow(-0.25).toNumber();
  return factorValue(ruleSet.factors[symbol], reading.wavelengthNm);
}

/** A limit row of the engine, evaluated as its type says, J/m². */
function rowValue(row: LimitRow, ruleSet: RuleSet, reading: Reading): number {
  const { durationS } = reading;
  const power = row.timeExponent ? durationS ** row.timeExponent : 1;
  const factors = (row.factors ?? []).map((symbol) => symbolValue(symbol, ruleSet, reading));
  const product = factors.reduce((a, b) => a * b, (row.plus ?? 0) + row.coefficient * power);
  return product * UNIT_TO_J_PER_M2[row.quantity]!(durationS);
}

function edgeS(edge: BandEdge, ruleSet: RuleSet, reading: Reading): number {
  if (edge === 'T2') return scopeOf(reading)('T2').toNumber();
  return edge === 'T1' ? factorValue(ruleSet.factors.T1, reading.wavelengthNm) : edge;
}

/** Whether a row holds at a reading: up to a break time inclusive, as "t <= T2" is printed. */
function holds(row: EyeRow, ruleSet: RuleSet, reading: Reading): boolean {
  const [from, to] = row.durationS;
  const t = reading.durationS;
  const begun = typeof from === 'number' ? t >= from : t > edgeS(from, ruleSet, reading);
  const open = typeof to === 'number' ? t < to : t <= edgeS(to, ruleSet, reading);
  return begun && (open || t === 30_000);
}

/** Whether an engine row is the line, or the part of it before or after a break time. */
function belongs(row: EyeRow, line: TableRow): boolean {
  if (row.mechanism !== line.hazard) return false;
  if (row.sourceMrad) return line.note?.includes('extended down to t=1 s') ?? false;
  const [from, to] = row.durationS;
  return (
    row.wavelengthNm[0] === line.lambda_nm[0] &&
    row.wavelengthNm[1] === line.lambda_nm[1] &&
    (typeof from === 'string' || from === line.t_s[0]) &&
    (typeof to === 'string' || to === line.t_s[1]) &&
    (typeof from === 'number' || typeof to === 'number') &&
    'sameAs' in row === (line.expr === 'SKIN')
  );
}

const DOCUMENTS: Record<string, RegExp> = {
  'icnirp-2013': /ICNIRP|^from memory/,
  'eu-2006-25': /2006\/25\/EC|^from memory/,
  'iec-60825-1-2014': /IEC 60825-1:2014|^from memory|BGV B2/,
  'ansi-z136.1-2014': /ANSI|^from memory/,
  'ansi-z136.1-2007': /ANSI|^from memory/,
  'ansi-z136.1-1993': /ANSI|^from memory/,
};

/** What a row says of its origin is what the line says. */
function expectSameOrigin(row: Provenance, line: TableRow): void {
  const place = `${line.ruleset} ${line.target} ${line.expr}`;
  expect(row.confidence, place).toBe(line.confidence);
  expect(line.source, place).toMatch(DOCUMENTS[line.ruleset]!);
  expect(row.source.startsWith(line.ruleset) || row.source.startsWith('ansi-z136.1:'), place).toBe(
    true,
  );
  if (row.seenIn) expect(line.source, place).toMatch(/SEEN/);
}

function expectSameTable(ruleSet: RuleSet, target: string, rows: readonly EyeRow[]): void {
  const own = lines(ruleSet, target);
  const taken = new Set<EyeRow>();
  for (const line of own) {
    const parts = rows.filter((row) => belongs(row, line));
    expect(parts.length, `no row for ${JSON.stringify(line)}`).toBeGreaterThan(0);
    for (const row of parts) {
      taken.add(row);
      if (target !== 'eye-extended' || !shared(line)) expectSameOrigin(row, line);
    }
    expectSameValues(ruleSet, line, parts);
  }
  const extra = rows.filter((row) => !taken.has(row));
  expect(extra, `rows of ${ruleSet.id} ${target} that no line has`).toEqual([]);
}

/** Ultraviolet and far infrared lines are printed once, for sources of every size. */
const shared = (line: TableRow): boolean => line.lambda_nm[1] <= 400 || line.lambda_nm[0] >= 1400;

function expectSameValues(ruleSet: RuleSet, line: TableRow, parts: readonly EyeRow[]): void {
  if (line.expr === 'SKIN') return;
  const printed = compiled(line);
  for (const reading of readings(line)) {
    const there = parts.filter((row) => holds(row, ruleSet, reading)) as LimitRow[];
    const value = Math.min(...there.map((row) => rowValue(row, ruleSet, reading)));
    const expected =
      printed.value(scopeOf(reading)).toNumber() * UNIT_TO_J_PER_M2[line.unit]!(reading.durationS);
    const place = `${line.ruleset} ${line.target} ${line.expr} ${JSON.stringify(reading)}`;
    expect(Math.abs(value / expected - 1), place).toBeLessThan(1e-13);
  }
}

describe.each(RULE_SETS as readonly RuleSet[])('$edition is transcribed row by row', (ruleSet) => {
  it('limits of the eye, small sources', () => {
    expectSameTable(ruleSet, 'eye-point', ruleSet.eyeSmallSource);
  });

  it('limits of the eye, extended sources', () => {
    if (ruleSet.id === 'ansi-z136.1-1993') expectPointRowsTimesCE(ruleSet);
    else expectSameTable(ruleSet, 'eye-extended', ruleSet.eyeExtendedSource);
  });

  it('limits of the skin', () => {
    expectSameTable(ruleSet, 'skin', ruleSet.skin);
  });

  it('limiting apertures', () => {
    expectSameDurationRows(ruleSet, 'aperture:eye', ruleSet.apertures.eye);
    expectSameDurationRows(ruleSet, 'aperture:skin', ruleSet.apertures.skin);
  });

  it('correction factors and break times', () => {
    for (const [names, rows] of factorTables(ruleSet)) expectSameFactors(ruleSet, names, rows);
  });

  it('the largest angle and the photochemical cone', () => {
    expectSameByDuration(ruleSet, 'factor:alpha_max', ruleSet.factors.alphaMax);
    expectSameByDuration(ruleSet, 'factor:gamma_ph', ruleSet.factors.gammaPh);
    expect(ruleSet.factors.hasT2).toBe(lines(ruleSet, 'factor:T2').length > 0);
  });

  it('the pulse-train factor', () => {
    expectSamePulseTrain(ruleSet);
  });
});

/** ANSI Z136.1-1993 prints no table of extended sources: the thermal limits of the retina take C_E. */
function expectPointRowsTimesCE(ruleSet: RuleSet): void {
  const retinal = (row: EyeRow): boolean =>
    row.wavelengthNm[0] >= 400 && row.wavelengthNm[1] <= 1400 && row.mechanism === 'thermal';
  const withCE = (ruleSet.eyeSmallSource as readonly LimitRow[]).map((row) =>
    retinal(row) ? { ...row, factors: [...(row.factors ?? []), 'CE'] } : row,
  );
  expect(ruleSet.eyeExtendedSource).toEqual(withCE);
}

function expectSameDurationRows(
  ruleSet: RuleSet,
  target: string,
  rows: readonly DurationRow[],
): void {
  const own = lines(ruleSet, target);
  expect(rows.length).toBe(own.length);
  for (const line of own) {
    const row = rows.find(
      ({ wavelengthNm, durationS }) =>
        wavelengthNm[0] === line.lambda_nm[0] &&
        wavelengthNm[1] === line.lambda_nm[1] &&
        startsWithTheTable(ruleSet, durationS[0], line.t_s[0]) &&
        durationS[1] === line.t_s[1],
    );
    if (!row) throw new Error(`no row for ${JSON.stringify(line)}`);
    expectSameOrigin(row, line);
    for (const reading of readings(line)) {
      const value = row.coefficient * reading.durationS ** (row.timeExponent ?? 0);
      const expected = compiled(line).value(scopeOf(reading)).toNumber();
      expect(Math.abs(value / expected - 1), line.expr).toBeLessThan(1e-14);
    }
  }
}

/** An aperture is needed for pulses shorter than the tables, too: the first band may start earlier. */
function startsWithTheTable(ruleSet: RuleSet, fromS: number, printedFromS: number): boolean {
  return fromS === printedFromS || (printedFromS === ruleSet.shortestS && fromS < printedFromS);
}

/** The engine's factor tables and the names that the lines print for them. */
function factorTables({ factors }: RuleSet): [string[], readonly FactorRow[]][] {
  return [
    [['C_A', 'C4'], factors.CA],
    [['C_B', 'C3'], factors.CB],
    [['C_C', 'C7'], factors.CC],
    [['KL'], factors.KL],
    [['Ti'], factors.Ti],
    ...(factors.T1.length > 0 ? [[['T1uv', 'T1'], factors.T1] as [string[], FactorRow[]]] : []),
  ];
}

function expectSameFactors(
  ruleSet: RuleSet,
  names: readonly string[],
  rows: readonly FactorRow[],
): void {
  const own = names.map((name) => lines(ruleSet, `factor:${name}`)).find((list) => list.length > 0);
  expect(rows.length, `${names.join(', ')} of ${ruleSet.id}`).toBe(own?.length ?? 0);
  for (const line of own ?? []) {
    const row = rows.find(
      ({ wavelengthNm: [from, to] }) => from === line.lambda_nm[0] && to === line.lambda_nm[1],
    );
    if (!row) throw new Error(`no row for ${JSON.stringify(line)}`);
    expectSameOrigin(row, line);
    for (const wavelengthNm of samples(line.lambda_nm)) {
      const reading = { ruleSet: line.ruleset, wavelengthNm, durationS: 1, source: NO_SOURCE };
      const expected = compiled(line).value(scopeOf(reading)).toNumber();
      const value = factorValue([row], wavelengthNm);
      expect(Math.abs(value / expected - 1), line.expr).toBeLessThan(1e-13);
    }
  }
}

const NO_SOURCE = { x: dec(0), y: dec(0) };

/** One printed expression in `t`, several rows of the engine. */
function expectSameByDuration(
  ruleSet: RuleSet,
  target: string,
  rows: readonly DurationRow[],
): void {
  const [line] = lines(ruleSet, target);
  expect(rows.length > 0, `${target} of ${ruleSet.id}`).toBe(line !== undefined);
  if (!line) return;
  for (const row of rows) {
    expect(row.wavelengthNm).toEqual(line.lambda_nm);
    expectSameOrigin(row, line);
    for (const durationS of samples(row.durationS)) {
      const reading = { ruleSet: line.ruleset, wavelengthNm: 550, durationS, source: NO_SOURCE };
      const expected = compiled(line).value(scopeOf(reading)).toNumber();
      const value = row.coefficient * durationS ** (row.timeExponent ?? 0);
      expect(Math.abs(value / expected - 1), `${target} ${durationS}`).toBeLessThan(1e-14);
    }
  }
}

interface TrainPoint {
  readonly pulseS: number;
  readonly exposureS: number;
  readonly pulses: number;
  readonly alpha: number;
  readonly alphaMax: number;
  readonly confinementS: number;
}

/** The branches of the engine's pulse-train factor, evaluated as their type says. */
function trainValue(rows: readonly PulseTrainRow[], point: TrainPoint): number {
  const bound = (edge: number | 'alphaMax'): number =>
    edge === 'alphaMax' ? point.alphaMax : edge;
  const short = point.pulseS <= point.confinementS;
  const row = rows.find(
    (branch) =>
      (branch.pulses === 'any' || (branch.pulses === 'up to Ti') === short) &&
      point.pulseS <= branch.upToS &&
      point.exposureS > (branch.exposureAboveS ?? 0) &&
      point.pulses > (branch.pulsesAbove ?? 0) &&
      (!branch.sourceMrad ||
        (point.alpha > bound(branch.sourceMrad[0]) && point.alpha <= bound(branch.sourceMrad[1]))),
  );
  return row ? Math.min(1, Math.max(row.coefficient * point.pulses ** -0.25, row.floor)) : 1;
}

function trainPoints(): Omit<TrainPoint, 'alphaMax' | 'confinementS'>[] {
  const points = [];
  for (const pulseS of [1e-9, 4.9e-6, 5e-6, 5.1e-6, 7e-4, 0.01, 0.25]) {
    for (const exposureS of [0.1, 0.25, 0.26, 100]) {
      for (const pulses of [1, 41, 600, 601, 626, 24_400, 24_500, 1e7]) {
        for (const alpha of [0, 5, 5.01, 21, 100, 101]) {
          points.push({ pulseS, exposureS, pulses, alpha });
        }
      }
    }
  }
  return points;
}

function expectSamePulseTrain(ruleSet: RuleSet): void {
  const name = ruleSet.id === 'iec-60825-1-2014' ? 'factor:C5' : 'factor:C_P';
  const [line] = lines(ruleSet, name);
  if (!line) throw new Error(`${ruleSet.id} has no ${name}`);
  for (const row of ruleSet.factors.CP) {
    expect(row.wavelengthNm).toEqual(line.lambda_nm);
    expect(row.upToS).toBe(line.t_s[1]);
    expectSameOrigin(row, line);
  }
  for (const point of trainPoints()) {
    const source = { x: dec(point.alpha), y: dec(point.alpha) };
    const reading = { ruleSet: line.ruleset, wavelengthNm: 532, durationS: point.pulseS, source };
    const [alphaMax, confinementS] = ['alpha_max', 'Ti'].map((key) => scopeOf(reading)(key));
    const extra = {
      N: dec(point.pulses),
      T: dec(point.exposureS),
      tp: dec(point.pulseS),
      alpha: dec(point.alpha),
    };
    const expected = Math.min(1, compiled(line).value(scopeOf(reading, extra)).toNumber());
    const value = trainValue(ruleSet.factors.CP, {
      ...point,
      alphaMax: alphaMax!.toNumber(),
      confinementS: confinementS!.toNumber(),
    });
    expect(Math.abs(value / expected - 1), JSON.stringify(point)).toBeLessThan(1e-14);
  }
}
