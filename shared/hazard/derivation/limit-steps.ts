import { ALPHA_MIN_MRAD, isExtended } from '../factors/apparent-source';
import { durationRowAt, durationValue } from '../factors/factor-value';
import { comparableLimit } from '../limit-terms';
import { tabulatedDuration } from '../limits/row-reading';
import type { LimitCandidate, LimitSituation } from '../pulses/limit-candidates';
import type { Mechanism } from '../result';
import type { DurationRow } from '../rule-sets/limit-table';
import type { RuleSet } from '../rule-sets/rule-set';
import type { BeamHazard } from '../side-hazard';
import { printDurationRow, writeFactors } from './factor-steps';
import { printCandidate } from './print-candidate';
import { writePulses } from './pulse-steps';
import type { StepWriter } from './step-writer';

/** The steps from the tables to the governing limit of one beam on one side. */
export function writeLimit(writer: StepWriter, ruleSet: RuleSet, hazard: BeamHazard): void {
  const { situation, candidates, governing } = hazard;
  writeCandidates(writer, ruleSet, situation, candidates);
  writeGoverning(writer, candidates, governing);
  writeAperture(writer, situation, governing);
}

/** Every limit that is considered, with the factors and pulses it is made from. */
export function writeCandidates(
  writer: StepWriter,
  ruleSet: RuleSet,
  situation: LimitSituation,
  candidates: readonly LimitCandidate[],
): void {
  const { point, exposureS } = situation;
  writer.know('lambda', point.wavelengthNm);
  writer.know('T', exposureS);
  writer.know('t_0', point.shortestS);
  if (isExtended(point.source)) {
    writer.know('alpha_x', point.source.xMrad);
    writer.know('alpha_y', point.source.yMrad);
    writer.know('alpha_min', ALPHA_MIN_MRAD);
  }
  candidates.forEach((candidate, i) => {
    writeFactors(writer, ruleSet, situation, candidate);
    writePulses(writer, ruleSet, situation, candidate);
    writer.know('t', candidate.durationS);
    writer.write({
      symbol: `H_${i + 1}`,
      what: LIMITS[candidate.rule][candidate.row.mechanism],
      formula: printCandidate(candidate, point, ruleSet.factors.symbols),
      value: candidate.limit,
      unit: 'J/m2',
      source: (candidate.row.reference ?? candidate.row.printed).source,
    });
  });
}

const LIMITS = {
  continuous: limitsOf('Limit of the whole exposure'),
  'single-pulse': limitsOf('Limit of every single pulse'),
  average: limitsOf('Limit of each pulse by the average rule'),
  'pulse-train': limitsOf('Limit of each pulse of the train'),
} as const;

function limitsOf(what: string): Readonly<Record<Mechanism, string>> {
  return {
    thermal: `${what}, thermal`,
    photochemical: `${what}, photochemical`,
    corneal: `${what}, front of the eye`,
  };
}

/** Which candidate governs: the smallest, or the one that its own exposure exceeds most. */
function writeGoverning(
  writer: StepWriter,
  candidates: readonly LimitCandidate[],
  governing: LimitCandidate,
): void {
  const name = (candidate: LimitCandidate) => `H_${candidates.indexOf(candidate) + 1}`;
  const isOneAperture = candidates.every(({ apertureM }) => apertureM === governing.apertureM);
  const others = candidates.filter((candidate) => candidate !== governing).map(name);
  writer.write({
    symbol: 'H_MPE',
    what: isOneAperture
      ? 'The governing limit is the smallest'
      : 'The governing limit: of limits averaged over apertures of their own, the one whose exposure exceeds it most',
    formula:
      isOneAperture && others.length > 0
        ? `min(${[name(governing), ...others].join(',')})`
        : name(governing),
    value: governing.limit,
    unit: 'J/m2',
    source: 'engine:reading',
  });
  if (governing.rule !== 'continuous') return;
  writer.write({
    symbol: 'E_MPE',
    what: 'The same as a mean irradiance over the exposure',
    formula: 'H_MPE/T',
    value: comparableLimit(governing),
    unit: 'W/m2',
    source: 'engine:reading',
  });
}

/** The limiting aperture of a candidate. */
export function writeAperture(
  writer: StepWriter,
  { point }: LimitSituation,
  { row, durationS }: LimitCandidate,
): void {
  const tabulatedS = tabulatedDuration(point, durationS);
  const aperture = durationRowAt(row.apertures, tabulatedS);
  if (aperture === undefined) return;
  writer.know('t', tabulatedS);
  writer.write({
    symbol: 'D_f',
    what: 'Limiting aperture',
    formula: printAperture(aperture),
    value: durationValue(aperture, tabulatedS) * 1e-3,
    unit: 'm',
    source: aperture.source,
  });
}

const printedApertures = new Map<DurationRow, string>();

function printAperture(row: DurationRow): string {
  let text = printedApertures.get(row);
  if (text === undefined) {
    text = `1e-3*${printDurationRow(row)}`;
    printedApertures.set(row, text);
  }
  return text;
}
