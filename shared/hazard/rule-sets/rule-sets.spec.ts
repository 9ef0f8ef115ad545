import { describe, expect, it } from 'vitest';
import { isExtended } from '../factors/apparent-source';
import { apparentSource, readLimits } from '../limit';
import { bandAt, compiledRuleSet } from '../limits/compiled-rule-set';
import type { Side } from '../result';
import { SOURCES } from '../sources';
import { RULE_SETS, ruleSetById, type RuleSet } from './index';
import type { EyeRow, LimitRow, Provenance } from './limit-table';
import { RULE_SET_IDS } from './rule-set-ids';

const SHORTEST_NM = 180;
const LONGEST_NM = 1e6;
const LONGEST_S = 3e4;

const TABLES = [
  ['eye, small sources', (ruleSet: RuleSet) => ruleSet.eyeSmallSource],
  ['eye, extended sources', (ruleSet: RuleSet) => ruleSet.eyeExtendedSource],
  ['skin', (ruleSet: RuleSet): readonly EyeRow[] => ruleSet.skin],
] as const;

function neighbors(value: number): [below: number, above: number] {
  return [value * (1 - Number.EPSILON), value * (1 + Number.EPSILON)];
}

function provenances({ factors, apertures, ...ruleSet }: RuleSet): Provenance[] {
  const { CA, CB, CC, KL, C2, T1, Ti, alphaMax, gammaPh, CP } = factors;
  return [
    ...[...ruleSet.eyeSmallSource, ...ruleSet.eyeExtendedSource, ...ruleSet.skin],
    ...[CA, CB, CC, KL, C2, T1, Ti].flat(),
    ...[alphaMax, gammaPh, CP, apertures.eye, apertures.skin].flat(),
  ];
}

describe('the list of rule sets', () => {
  it('finds each by its id', () => {
    for (const ruleSet of RULE_SETS) expect(ruleSetById(ruleSet.id)).toBe(ruleSet);
    expect(RULE_SET_IDS).toEqual(RULE_SETS.map(({ id }) => id));
    expect(ruleSetById('none')).toBeUndefined();
  });

  it('names a known successor where an edition is superseded', () => {
    for (const { supersededBy } of RULE_SETS as readonly RuleSet[]) {
      if (supersededBy !== undefined) expect(ruleSetById(supersededBy as unknown)).toBeDefined();
    }
  });
});

describe.each(RULE_SETS as readonly RuleSet[])('the tables of $edition', (ruleSet) => {
  it('name sources that exist', () => {
    for (const { source, seenIn } of provenances(ruleSet)) {
      expect(SOURCES).toHaveProperty([source]);
      if (seenIn !== undefined) expect(SOURCES).toHaveProperty([seenIn]);
    }
  });

  it('say where a number was seen when they claim that it was', () => {
    for (const { source, confidence, seenIn } of provenances(ruleSet)) {
      if (confidence === 'seen-equivalent') expect(seenIn, source).toBeDefined();
    }
  });

  it.each(TABLES)('have no gap: %s', (_, tableOf) => {
    const table = tableOf(ruleSet);
    const edgesNm = [...new Set(table.flatMap(({ wavelengthNm }) => [...wavelengthNm]))];
    for (const nm of [...edgesNm, LONGEST_NM]) {
      for (const wavelengthNm of [nm, ...neighbors(nm)]) {
        if (wavelengthNm < SHORTEST_NM || wavelengthNm > LONGEST_NM) continue;
        expect(uncovered(ruleSet, table, wavelengthNm), `${wavelengthNm} nm`).toEqual([]);
      }
    }
  });

  it.each(TABLES)('never hold two limits of one mechanism, unless in print: %s', (_, tableOf) => {
    const rows = tableOf(ruleSet).filter((row): row is LimitRow => !('sameAs' in row));
    const overlaps = rows.flatMap((row, i) =>
      rows.slice(i + 1).filter((other) => row.mechanism === other.mechanism && overlap(row, other)),
    );
    // The directive prints a cap of 1000 W/m² beside the limit of long exposures.
    const printed = ruleSet.id === 'eu-2006-25' ? [1000] : [];
    expect(overlaps.filter(({ coefficient }) => !printed.includes(coefficient))).toEqual([]);
  });

  it.each(['eye', 'skin'] satisfies Side[])('give every edge to the next band: %s', (side) => {
    const table = compiledRuleSet(ruleSet)[side];
    table.edgesNm.forEach((edgeNm, i) => {
      expect(bandAt(table, edgeNm)).toBe(table.bands[i]);
      const [below, above] = neighbors(edgeNm);
      if (i > 0) expect(bandAt(table, below)).toBe(table.bands[i - 1]);
      expect(bandAt(table, above)).toBe(table.bands[i]);
    });
    expect(bandAt(table, LONGEST_NM)).toBe(table.bands.at(-1));
  });

  it('end each band of duration where the next begins', () => {
    for (const row of ruleSet.skin) {
      const [fromS, toS] = row.durationS;
      if (typeof fromS !== 'number' || typeof toS !== 'number') continue;
      const wavelengthNm = row.wavelengthNm[0];
      const holds = (durationS: number) =>
        readLimits({ ruleSet: ruleSet.id as never, side: 'skin', wavelengthNm, durationS }).some(
          (reading) => reading.row === row,
        );
      expect(holds(fromS)).toBe(true);
      expect(holds(neighbors(toS)[0])).toBe(true);
      expect(holds(toS)).toBe(toS === LONGEST_S);
    }
  });

  it('have an aperture for every limit', () => {
    for (const side of ['eye', 'skin'] as const) {
      for (const band of compiledRuleSet(ruleSet)[side].bands) {
        for (const row of [...band.smallSource.cells, ...band.extendedSource.cells].flatMap(
          (cell) => cell.rows,
        )) {
          expect(row.apertures.length).toBeGreaterThan(0);
          expect(row.apertures.at(-1)?.durationS[1]).toBe(LONGEST_S);
        }
      }
    }
  });
});

describe('a break time', () => {
  it('belongs to the row that ends there', () => {
    // T_2 of a source of 100 mrad is 100 s; up to it the limit grows with t^0.75.
    const query = {
      ruleSet: 'eu-2006-25',
      side: 'eye',
      wavelengthNm: 1064,
      sourceMrad: 100,
    } as const;
    const [uncapped] = readLimits({ ...query, durationS: 100 });
    expect(uncapped?.radiantExposureJPerM2).toBeGreaterThan(1000 * 100);
    const longer = readLimits({ ...query, durationS: 100.001 });
    expect(Math.min(...longer.map(({ irradianceWPerM2 }) => irradianceWPerM2))).toBeCloseTo(1000);
  });

  it('of extended sources starts above 1.5 mrad', () => {
    expect(isExtended(apparentSource(1.5))).toBe(false);
    expect(isExtended(apparentSource([1, 1.6]))).toBe(true);
  });
});

/** Durations at which no row of the table holds, between the shortest and the longest. */
function uncovered(ruleSet: RuleSet, table: readonly EyeRow[], wavelengthNm: number): number[] {
  const rows = table.filter(
    ({ wavelengthNm: [from, to] }) =>
      wavelengthNm >= from && (wavelengthNm < to || wavelengthNm === LONGEST_NM),
  );
  const edges = rows.flatMap(({ durationS }) =>
    durationS.filter((edge) => typeof edge === 'number'),
  );
  const durations = [ruleSet.shortestS, ...edges, LONGEST_S].filter((t) => t >= ruleSet.shortestS);
  return durations.filter(
    (t) =>
      !rows.some(({ durationS: [from, to] }) => {
        const begins = typeof from === 'string' || t >= from;
        return begins && (typeof to === 'string' || t < to || to === LONGEST_S);
      }),
  );
}

function overlap(a: LimitRow, b: LimitRow): boolean {
  return (
    isOverlap(a.wavelengthNm, b.wavelengthNm) &&
    isOverlap(a.durationS, b.durationS) &&
    a.sourceMrad === b.sourceMrad
  );
}

function isOverlap(
  [from, to]: readonly [LimitRow['durationS'][0], LimitRow['durationS'][1]],
  [otherFrom, otherTo]: readonly [LimitRow['durationS'][0], LimitRow['durationS'][1]],
): boolean {
  // Rows that share a named break time meet there.
  if (
    (typeof to === 'string' && to === otherFrom) ||
    (typeof from === 'string' && from === otherTo)
  ) {
    return false;
  }
  const low = (edge: number | string) => (typeof edge === 'number' ? edge : 10);
  const high = (edge: number | string) => (typeof edge === 'number' ? edge : 1e4);
  return low(from) < high(otherTo) && low(otherFrom) < high(to);
}
