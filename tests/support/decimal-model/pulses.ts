import type { Emission } from './case';
import { Dec, ONE, dec, maxOf, minOf } from './decimal';
import { limitsAt, factor, scopeOf, t2, type Reading, type Side, type TableLimit } from './limits';
import { rowsAt, type RuleSetId } from './rows';

export type Rule = 'continuous' | 'single-pulse' | 'average' | 'pulse-train';
export type Tissue = 'cornea' | 'lens' | 'retina-thermal' | 'retina-photochemical' | 'skin';

/** One limit that an emission has to respect: J/m² per pulse, or over the exposure for CW. */
export interface Candidate {
  readonly rule: Rule;
  readonly mechanism: TableLimit['hazard'];
  readonly tissue: Tissue | 'skin-uv';
  readonly apertureMm: Dec;
  readonly limit: Dec;
}

export interface Question {
  readonly side: Side;
  readonly exposureS: number;
  readonly emission: Emission;
  /** Reading without its duration: each rule reads the tables at its own. */
  readonly at: Omit<Reading, 'durationS'>;
}

type Repeated = Extract<Emission, { mode: 'repetitive' | 'burst' }>;

const CEILING_SLACK = 1e-9;

export function candidatesOf(question: Question): Candidate[] {
  const { emission, exposureS } = question;
  switch (emission.mode) {
    case 'cw':
      return read(question, 'continuous', exposureS);
    case 'single':
      return read(question, 'single-pulse', emission.pulseDurationS);
    case 'repetitive':
      return [...singleAndAverage(question, emission), ...train(question, emission)];
    case 'burst':
      return [
        ...singleAndAverage(question, emission),
        ...burstAverage(question, emission),
        ...train(question, emission),
      ];
  }
}

function read(question: Question, rule: Rule, durationS: number, share: Dec = ONE): Candidate[] {
  const limits = limitsAt(question.side, { ...question.at, durationS });
  return limits.map((limit) => ({
    rule,
    mechanism: limit.hazard,
    tissue: tissueOf(question, limit),
    apertureMm: limit.apertureMm,
    limit: limit.radiantExposure.mul(share),
  }));
}

function tissueOf({ side, at }: Question, limit: TableLimit): Candidate['tissue'] {
  if (side === 'skin') return at.wavelengthNm < 315 ? 'skin-uv' : 'skin';
  if (at.wavelengthNm < 315) return 'cornea';
  const retinal = at.wavelengthNm >= 400 && at.wavelengthNm < 1400;
  if (!retinal || limit.hazard === 'corneal') return 'lens';
  return limit.hazard === 'photochemical' ? 'retina-photochemical' : 'retina-thermal';
}

/** Pulses within a time: not rounded, at least one (burst: at least one burst). */
export function pulsesWithin(emission: Repeated, timeS: Dec): Dec {
  if (emission.mode === 'repetitive') {
    return maxOf([ONE, dec(emission.repetitionRateHz).mul(timeS)]);
  }
  const bursts = maxOf([ONE, dec(emission.burstRateHz).mul(timeS)]);
  return bursts.mul(emission.pulsesPerBurst);
}

function singleAndAverage(question: Question, emission: Repeated): Candidate[] {
  const pulses = pulsesWithin(emission, dec(question.exposureS));
  return [
    ...read(question, 'single-pulse', emission.pulseDurationS),
    ...read(question, 'average', question.exposureS, ONE.div(pulses)),
  ];
}

function burstAverage(question: Question, emission: Extract<Emission, { mode: 'burst' }>) {
  const gaps = dec(emission.pulsesPerBurst - 1).div(dec(emission.intraBurstRateHz));
  const burstS = gaps.add(dec(emission.pulseDurationS)).toNumber();
  return read(question, 'average', burstS, ONE.div(emission.pulsesPerBurst));
}

const COUNTED_WITHIN_T2: readonly RuleSetId[] = [
  'icnirp-2013',
  'iec-60825-1-2014',
  'ansi-z136.1-2014',
];

/** The pulse-train rule: thermal additivity, pulses within T_i taken as one. */
function train(question: Question, emission: Repeated): Candidate[] {
  const { at, exposureS } = question;
  const row = reductionRow(question);
  const confinementS = factor('Ti', { ...at, durationS: exposureS });
  if (!row && !confinementS) return [];

  const window = minOf([confinementS ?? dec(0), dec(exposureS)]);
  const grouped = groupSize(emission, window);
  const durationS = grouped ? window.toNumber() : emission.pulseDurationS;
  const size = grouped ?? ONE;
  const pulses = pulsesWithin(emission, countingTime(question)).div(size);
  const reduction = row ? reductionFactor(question, { durationS, pulses, confinementS }) : ONE;
  return read(question, 'pulse-train', durationS, ONE.div(size))
    .filter((candidate) => candidate.mechanism !== 'photochemical')
    .map((candidate) => ({
      ...candidate,
      limit: candidate.limit.mul(isAnteriorCap(question, candidate) ? ONE : reduction),
    }));
}

/** C_P is a rule of the retina between 400 and 1400 nm: the cap of the front of the eye is apart. */
function isAnteriorCap({ side, at }: Question, { mechanism }: Candidate): boolean {
  return (
    side === 'eye' && at.wavelengthNm >= 400 && at.wavelengthNm < 1400 && mechanism === 'corneal'
  );
}

/** The line of C_P; of the skin only where the rule set reduces its limits as well. */
function reductionRow({ side, at }: Question) {
  if (side === 'skin' && at.ruleSet !== 'eu-2006-25') return undefined;
  const name = at.ruleSet === 'iec-60825-1-2014' ? 'factor:C5' : 'factor:C_P';
  return rowsAt({ ruleSet: at.ruleSet, target: name }, at.wavelengthNm)[0];
}

/** How many consecutive pulses fall into one window; nothing when they stand apart. */
function groupSize(emission: Repeated, window: Dec): Dec | undefined {
  const together = (rateHz: number): boolean => ONE.div(dec(rateHz)).lt(window);
  const within = (rateHz: number): Dec => window.mul(dec(rateHz)).sub(CEILING_SLACK).ceil();
  if (emission.mode === 'repetitive') {
    return together(emission.repetitionRateHz) ? within(emission.repetitionRateHz) : undefined;
  }
  const { pulsesPerBurst, intraBurstRateHz, burstRateHz } = emission;
  if (together(burstRateHz)) return within(burstRateHz).mul(pulsesPerBurst);
  if (pulsesPerBurst === 1 || !together(intraBurstRateHz)) return undefined;
  return minOf([dec(pulsesPerBurst), within(intraBurstRateHz)]);
}

function countingTime({ at, exposureS }: Question): Dec {
  const whole = dec(exposureS);
  if (!COUNTED_WITHIN_T2.includes(at.ruleSet)) return whole;
  const limit = t2({ ...at, durationS: exposureS });
  return limit ? minOf([whole, limit]) : whole;
}

interface Train {
  readonly durationS: number;
  readonly pulses: Dec;
  readonly confinementS: Dec | undefined;
}

function reductionFactor(question: Question, { durationS, pulses, confinementS }: Train): Dec {
  const { at, exposureS } = question;
  const row = reductionRow(question)!;
  if (durationS > row.t_s[1]) return ONE;
  const value = row.value(
    scopeOf(
      { ...at, durationS },
      {
        N: pulses,
        T: dec(exposureS),
        tp: dec(durationS),
        alpha: at.source.x.add(at.source.y).div(2),
        ...(confinementS ? { Ti: confinementS } : {}),
      },
    ),
  );
  return minOf([ONE, value]);
}
