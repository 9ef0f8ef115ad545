import { ALPHA_MIN_MRAD, isExtended, meanInside } from '../factors/apparent-source';
import { breakTimeT2, T2_LARGEST_MRAD } from '../factors/break-time-t2';
import { correctionFactorCE } from '../factors/correction-factor-ce';
import { durationRowAt, durationValue, factorValue } from '../factors/factor-value';
import type { PrintedFactor } from '../limits/compiled-rule-set';
import { alphaMax, coneFactor, tabulatedDuration } from '../limits/row-reading';
import type { LimitCandidate, LimitSituation } from '../pulses/limit-candidates';
import type { DurationRow, FactorRow } from '../rule-sets/limit-table';
import type { RuleSet } from '../rule-sets/rule-set';
import type { StepWriter } from './step-writer';

/** The factors of a candidate's row. */
export function writeFactors(
  writer: StepWriter,
  ruleSet: RuleSet,
  situation: LimitSituation,
  candidate: LimitCandidate,
): void {
  const { row } = candidate;
  for (const factor of row.factors) writeWavelengthFactor(writer, ruleSet, situation, factor);
  if (row.growsWithSource) writeCE(writer, ruleSet, situation, candidate);
  if (row.hasT2 || row.printed.durationS.includes('T2')) writeT2(writer, ruleSet, situation);
  if (row.printed.durationS.includes('T1')) writeT1(writer, ruleSet, situation);
  const isConed = row.mechanism === 'photochemical' && situation.point.band.isRetinal;
  const tabulatedS = tabulatedDuration(situation.point, candidate.durationS);
  if (isConed && coneFactor(situation.point, tabulatedS) > 1) {
    writeAngle(writer, situation.point.band.gammaPh, tabulatedS, {
      symbol: 'gamma_ph',
      what: 'Limiting cone of the photochemical limit, smaller than the source',
    });
  }
}

function writeWavelengthFactor(
  writer: StepWriter,
  { factors }: RuleSet,
  { point }: LimitSituation,
  { symbol, row }: PrintedFactor,
): void {
  writer.write({
    symbol: factors.symbols[symbol],
    what: FACTORS[symbol],
    // Why: a factor without a row at this wavelength is 1.
    formula: row === undefined ? '1' : printFactor(row),
    value: row === undefined ? 1 : factorValue(row, point.wavelengthNm),
    unit: '1',
    source: row === undefined ? 'engine:reading' : row.source,
  });
}

const FACTORS = {
  CA: 'Factor for absorption by melanin',
  CB: 'Factor for the photochemical effect',
  CC: 'Factor for absorption in front of the retina',
  KL: 'Factor for cornea and lens',
  C2: 'Factor for ultraviolet',
} as const;

function writeT1(writer: StepWriter, { factors }: RuleSet, { point }: LimitSituation): void {
  const { t1 } = point.band;
  if (t1 === undefined) return;
  writer.write({
    symbol: factors.symbols.T1,
    what: 'Break time',
    formula: printFactor(t1),
    value: factorValue(t1, point.wavelengthNm),
    unit: 's',
    source: t1.source,
  });
}

const printedFactors = new Map<FactorRow, string>();

/** `8+10^(0.04*(lambda-1250))`, from the same row as the number. */
export function printFactor(row: FactorRow): string {
  let text = printedFactors.get(row);
  if (text === undefined) {
    text = factorText(row);
    printedFactors.set(row, text);
  }
  return text;
}

function factorText({ coefficient, decadesPerNm, originNm, plus }: FactorRow): string {
  if (decadesPerNm === undefined) return `${coefficient}`;
  const difference =
    decadesPerNm < 0
      ? `${-decadesPerNm}*(${originNm}-lambda)`
      : `${decadesPerNm}*(lambda-${originNm})`;
  const power = `${coefficient === 1 ? '' : `${coefficient}*`}10^(${difference})`;
  return plus === undefined ? power : `${plus}+${power}`;
}

/** An angle that depends on the duration. */
function writeAngle(
  writer: StepWriter,
  rows: readonly DurationRow[],
  durationS: number,
  { symbol, what }: { symbol: string; what: string },
): void {
  const row = durationRowAt(rows, durationS);
  if (row === undefined) return;
  writer.know('t', durationS);
  writer.write({
    symbol,
    what,
    formula: printDurationRow(row),
    value: durationValue(row, durationS),
    unit: 'mrad',
    source: row.source,
  });
}

/** C_E with the mean angle and α_max that it is made from. */
function writeCE(
  writer: StepWriter,
  ruleSet: RuleSet,
  { point }: LimitSituation,
  { durationS }: LimitCandidate,
): void {
  const tabulatedS = tabulatedDuration(point, durationS);
  const largest = alphaMax(point, tabulatedS);
  const { CE } = ruleSet.factors.symbols;
  const source = point.band.alphaMax[0]?.source ?? 'engine:reading';
  writeAngle(writer, point.band.alphaMax, tabulatedS, {
    symbol: 'alpha_max',
    what: 'Largest angle that the factor for extended sources grows with',
  });
  writer.write({
    symbol: 'alpha',
    what: 'Mean angle of the source, each axis inside [alpha_min, alpha_max]',
    formula: '(min(max(alpha_x,alpha_min),alpha_max)+min(max(alpha_y,alpha_min),alpha_max))/2',
    value: meanInside(point.source, largest),
    unit: 'mrad',
    source: 'engine:reading',
  });
  const value = correctionFactorCE(point.source, largest);
  writer.write({
    symbol: CE,
    what: 'Factor for extended sources, for the exposure of the whole source',
    formula: 'alpha/alpha_min*max(1,alpha_x/alpha_max)*max(1,alpha_y/alpha_max)',
    value,
    unit: '1',
    source,
  });
  if (point.source.xMrad > largest || point.source.yMrad > largest) {
    writeConeForm(writer, point.source, largest, CE);
  }
}

/** The other way to print C_E: with the exposure taken inside the cone α_max. Same ratio. */
function writeConeForm(
  writer: StepWriter,
  source: LimitSituation['point']['source'],
  alphaMaxMrad: number,
  symbol: string,
): void {
  writer.write({
    symbol: `${symbol}_cone`,
    what: 'The same factor where the exposure is taken inside the cone alpha_max only',
    formula: 'alpha/alpha_min',
    value: meanInside(source, alphaMaxMrad) / ALPHA_MIN_MRAD,
    unit: '1',
    source: 'engine:reading',
  });
  writer.write({
    symbol: 'k_cone',
    what: 'Part of the exposure inside that cone; divided by it, both forms give the same ratio',
    formula: 'min(1,alpha_max/alpha_x)*min(1,alpha_max/alpha_y)',
    value: Math.min(1, alphaMaxMrad / source.xMrad) * Math.min(1, alphaMaxMrad / source.yMrad),
    unit: '1',
    source: 'engine:reading',
  });
}

/** T_2 of the source. */
export function writeT2(writer: StepWriter, ruleSet: RuleSet, { point }: LimitSituation): void {
  const { T2 } = ruleSet.factors.symbols;
  const source = point.band.alphaMax[0]?.source ?? 'engine:reading';
  const isByAngle = isExtended(point.source);
  if (isByAngle) {
    writer.write({
      symbol: 'alpha_m',
      what: 'Mean angle of the source, each axis inside [alpha_min, 100 mrad]',
      formula: '(min(max(alpha_x,alpha_min),100)+min(max(alpha_y,alpha_min),100))/2',
      value: meanInside(point.source, T2_LARGEST_MRAD),
      unit: 'mrad',
      source: 'engine:reading',
    });
  }
  writer.write({
    symbol: T2,
    what: 'Break time of the source',
    formula: isByAngle ? '10*10^((alpha_m-alpha_min)/98.5)' : '10',
    value: breakTimeT2(point.source),
    unit: 's',
    source,
  });
}

/** `200*t^0.5`, from the same row as the number. */
export function printDurationRow({ coefficient, timeExponent }: DurationRow): string {
  return timeExponent === undefined ? `${coefficient}` : `${coefficient}*t^${timeExponent}`;
}
