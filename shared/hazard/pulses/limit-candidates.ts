import type { Emission } from '../case';
import { plainMean } from '../factors/apparent-source';
import { breakTimeT2 } from '../factors/break-time-t2';
import { factorValue } from '../factors/factor-value';
import { pulseTrainFactor, pulseTrainRow } from '../factors/pulse-train-factor';
import type { CompiledRow } from '../limits/compiled-rule-set';
import {
  alphaMax,
  limitingApertureM,
  radiantExposureLimit,
  rowsAt,
  tabulatedDuration,
  type ReadingPoint,
} from '../limits/row-reading';
import type { LimitRule } from '../result';
import type { PulseTrainRow } from '../rule-sets/limit-table';
import type { PulseTrainRule } from '../rule-sets/rule-set';
import { burstDuration } from './emission-timing';
import { pulseGroup, pulsesWithin, type PulsedEmission } from './pulse-groups';

/** One limit that the emission has to keep, in the terms of one exposure or one pulse. */
export interface LimitCandidate {
  readonly rule: LimitRule;
  readonly row: CompiledRow;
  /** The duration that the row is read at, s. */
  readonly durationS: number;
  /** What the candidate allows: CW over the exposure, pulsed per pulse, J/m². */
  readonly limit: number;
  readonly apertureM: number;
  /** Pulses that share the row's limit, and their symbol. */
  readonly sharedBy: number;
  readonly sharedBySymbol: '' | 'N' | 'n_b' | 'n_g';
  readonly train: TrainReading | undefined;
}

/** How the pulse-train rule was read. */
export interface TrainReading {
  /** C_P. */
  readonly factor: number;
  /** N, groups counted as one. */
  readonly pulses: number;
  readonly branch: PulseTrainRow | undefined;
}

/** What decides the limits of one beam on one side. */
export interface LimitSituation {
  readonly point: ReadingPoint;
  readonly emission: Emission;
  readonly exposureS: number;
  readonly trainRule: PulseTrainRule;
  readonly hasT2: boolean;
}

/** A rule and the duration at which it reads the limits. */
interface RuleReading {
  readonly rule: LimitRule;
  readonly durationS: number;
  readonly sharedBy: number;
  readonly sharedBySymbol: LimitCandidate['sharedBySymbol'];
}

/** Every limit that the emission has to keep; the order decides between equals. */
export function limitCandidates(situation: LimitSituation): LimitCandidate[] {
  const { point, emission, exposureS } = situation;
  const candidates: LimitCandidate[] = [];
  if (emission.mode === 'cw') {
    addRows(candidates, point, alone('continuous', exposureS));
    return candidates;
  }
  addRows(candidates, point, alone('single-pulse', emission.pulseDurationS));
  if (emission.mode === 'single') return candidates;
  addRows(candidates, point, {
    rule: 'average',
    durationS: exposureS,
    sharedBy: pulsesWithin(emission, exposureS),
    sharedBySymbol: 'N',
  });
  if (emission.mode === 'burst') {
    addRows(candidates, point, {
      rule: 'average',
      durationS: burstDuration(emission),
      sharedBy: emission.pulsesPerBurst,
      sharedBySymbol: 'n_b',
    });
  }
  addTrain(candidates, situation, emission);
  return candidates;
}

function alone(rule: LimitRule, durationS: number): RuleReading {
  return { rule, durationS, sharedBy: 1, sharedBySymbol: '' };
}

function addRows(
  candidates: LimitCandidate[],
  point: ReadingPoint,
  { rule, durationS, sharedBy, sharedBySymbol }: RuleReading,
): void {
  const tabulatedS = tabulatedDuration(point, durationS);
  for (const row of rowsAt(point, tabulatedS)) {
    candidates.push({
      rule,
      row,
      durationS,
      limit: radiantExposureLimit(row, point, durationS) / sharedBy,
      apertureM: limitingApertureM(row, point, durationS),
      sharedBy,
      sharedBySymbol,
      train: undefined,
    });
  }
}

/**
 * The pulse-train rule: every pulse, or group of pulses that counts as one, times C_P. It covers
 * thermal limits; those of the front of the eye in 1200–1400 nm are not reduced by C_P.
 */
function addTrain(
  candidates: LimitCandidate[],
  situation: LimitSituation,
  emission: PulsedEmission,
): void {
  const { point, exposureS } = situation;
  const { ti, pulseTrain } = point.band;
  const tiS = ti === undefined ? 0 : factorValue(ti, point.wavelengthNm);
  const group = pulseGroup(emission, Math.min(tiS, exposureS));
  if (group.pulses === 1 && pulseTrain.length === 0) return;
  const pulses = Math.max(1, pulsesWithin(emission, countingTime(situation)) / group.pulses);
  const train = trainReading(situation, group.durationS, group.durationS <= tiS, pulses);
  const tabulatedS = tabulatedDuration(point, group.durationS);
  for (const row of rowsAt(point, tabulatedS)) {
    if (row.mechanism === 'photochemical') continue;
    const rowLimit = radiantExposureLimit(row, point, group.durationS);
    const factor = row.isAnteriorCap ? 1 : train.factor;
    candidates.push({
      rule: 'pulse-train',
      row,
      durationS: group.durationS,
      limit: (rowLimit * factor) / group.pulses,
      apertureM: limitingApertureM(row, point, group.durationS),
      sharedBy: group.pulses,
      sharedBySymbol: group.pulses > 1 ? 'n_g' : '',
      train: row.isAnteriorCap ? { factor, pulses, branch: undefined } : train,
    });
  }
}

/** What the pulse-train rule counts within: the exposure, or T_2 when the edition says so and it is shorter; s. */
export function countingTime({ point, exposureS, trainRule, hasT2 }: LimitSituation): number {
  const isShortened = trainRule.countedWithin === 'T2' && hasT2 && point.band.isRetinal;
  return isShortened ? Math.min(exposureS, breakTimeT2(point.source)) : exposureS;
}

function trainReading(
  { point, exposureS }: LimitSituation,
  pulseS: number,
  upToTi: boolean,
  pulses: number,
): TrainReading {
  const train = {
    wavelengthNm: point.wavelengthNm,
    pulseS,
    upToTi,
    exposureS,
    sourceMrad: plainMean(point.source),
    alphaMaxMrad: alphaMax(point, pulseS),
  };
  const branch = pulseTrainRow(point.band.pulseTrain, train, pulses);
  return { factor: pulseTrainFactor(branch, pulses), pulses, branch };
}
