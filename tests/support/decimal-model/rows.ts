import table from '../../published/limit-rows.json';

import { compileExpression, type Expression } from './expression';

export type RuleSetId =
  | 'icnirp-2013'
  | 'eu-2006-25'
  | 'iec-60825-1-2014'
  | 'ansi-z136.1-2014'
  | 'ansi-z136.1-2007'
  | 'ansi-z136.1-1993';

export const RULE_SET_IDS: readonly RuleSetId[] = [
  'icnirp-2013',
  'eu-2006-25',
  'iec-60825-1-2014',
  'ansi-z136.1-2014',
  'ansi-z136.1-2007',
  'ansi-z136.1-1993',
];

/** One printed line of a limit, factor or aperture table. */
export interface TableRow {
  readonly ruleset: RuleSetId;
  readonly kind: 'limit' | 'factor' | 'aperture';
  readonly target: string;
  readonly hazard: 'thermal' | 'photochemical' | 'corneal' | null;
  readonly lambda_nm: readonly [number, number];
  readonly t_s: readonly [number, number];
  readonly expr: string;
  readonly unit: string;
  readonly source: string;
  readonly confidence: string;
  readonly note?: string;
  readonly aperture?: string;
}

export interface CompiledRow extends TableRow {
  readonly value: Expression;
}

export const TABLE_ROWS = table as unknown as readonly TableRow[];

const compiled = new Map<string, CompiledRow[]>();
for (const row of TABLE_ROWS) {
  const key = `${row.ruleset} ${row.target}`;
  const list = compiled.get(key) ?? [];
  list.push({ ...row, value: compileExpression(row.expr) });
  compiled.set(key, list);
}

const LONGEST_WAVELENGTH_NM = 1e6;
const LONGEST_DURATION_S = 30_000;

/** Bands are half-open; the very last wavelength and duration belong to the last band. */
export function inBand(value: number, band: readonly [number, number], last: number): boolean {
  return value >= band[0] && (value < band[1] || (value === last && band[1] === last));
}

/** The rows of a target at a wavelength, and at a duration where one is given. */
export function rowsAt(
  key: { ruleSet: RuleSetId; target: string },
  wavelengthNm: number,
  durationS?: number,
): CompiledRow[] {
  const rows = compiled.get(`${key.ruleSet} ${key.target}`) ?? [];
  return rows.filter(
    (row) =>
      inBand(wavelengthNm, row.lambda_nm, LONGEST_WAVELENGTH_NM) &&
      (durationS === undefined || inBand(durationS, row.t_s, LONGEST_DURATION_S)),
  );
}

export function hasTarget(ruleSet: RuleSetId, target: string): boolean {
  return compiled.has(`${ruleSet} ${target}`);
}

/** The shortest duration that a rule set tabulates. */
export function shortestDurationS(ruleSet: RuleSetId): number {
  return ruleSet === 'ansi-z136.1-1993' ? 1e-9 : 1e-13;
}
