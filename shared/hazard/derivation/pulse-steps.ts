import { factorValue } from '../factors/factor-value';
import { burstDuration } from '../pulses/emission-timing';
import { countingTime, type LimitCandidate, type LimitSituation } from '../pulses/limit-candidates';
import type { PulsedEmission } from '../pulses/pulse-groups';
import type { RuleSet } from '../rule-sets/rule-set';
import { printFactor, writeT2 } from './factor-steps';
import type { StepWriter } from './step-writer';

/** N, n_g and C_P, as far as the candidate has them. */
export function writePulses(
  writer: StepWriter,
  ruleSet: RuleSet,
  situation: LimitSituation,
  candidate: LimitCandidate,
): void {
  const { emission } = situation;
  if (emission.mode !== 'repetitive' && emission.mode !== 'burst') return;
  knowRates(writer, emission);
  if (candidate.sharedBySymbol === 'N') {
    writer.write({
      symbol: 'N',
      what: 'Pulses within the exposure',
      formula: pulsesFormula(emission, 'T'),
      value: candidate.sharedBy,
      unit: '1',
      source: 'engine:reading',
    });
  } else if (candidate.sharedBySymbol === 'n_b' && emission.mode === 'burst') {
    writer.write({
      symbol: 't_b',
      what: 'Duration of a burst',
      formula: '(n_b-1)/f_i+t_p',
      value: burstDuration(emission),
      unit: 's',
      source: 'engine:reading',
    });
  }
  if (candidate.train !== undefined) {
    if (candidate.sharedBySymbol === 'n_g') writeGroup(writer, situation, emission, candidate);
    writeTrain(writer, ruleSet, situation, candidate);
  }
}

function knowRates(writer: StepWriter, emission: PulsedEmission): void {
  writer.know('t_p', emission.pulseDurationS);
  if (emission.mode === 'repetitive') {
    writer.know('f', emission.repetitionRateHz);
  } else {
    writer.know('n_b', emission.pulsesPerBurst);
    writer.know('f_i', emission.intraBurstRateHz);
    writer.know('f_b', emission.burstRateHz);
  }
}

function pulsesFormula(emission: PulsedEmission, time: string): string {
  return emission.mode === 'repetitive' ? `max(1,f*${time})` : `n_b*max(1,f_b*${time})`;
}

function writeGroup(
  writer: StepWriter,
  { point, exposureS }: LimitSituation,
  emission: PulsedEmission,
  { durationS, sharedBy }: LimitCandidate,
): void {
  const { ti } = point.band;
  if (ti === undefined) return;
  const tiS = factorValue(ti, point.wavelengthNm);
  writer.write({
    symbol: 'T_i',
    what: 'Time within which pulses count as one',
    formula: printFactor(ti),
    value: tiS,
    unit: 's',
    source: ti.source,
  });
  writer.write({
    symbol: 'W',
    what: 'The same within the exposure',
    formula: 'min(T_i,T)',
    value: Math.min(tiS, exposureS),
    unit: 's',
    source: 'engine:reading',
  });
  writer.write({
    symbol: 'n_g',
    what: 'Pulses that count as one',
    formula: groupFormula(emission, durationS),
    value: sharedBy,
    unit: '1',
    source: 'engine:reading',
  });
}

function groupFormula(emission: PulsedEmission, windowS: number): string {
  if (emission.mode === 'repetitive') return 'ceil(W*f-1e-9)';
  return windowS * emission.burstRateHz > 1 + 1e-9
    ? 'n_b*ceil(W*f_b-1e-9)'
    : 'min(n_b,ceil(W*f_i-1e-9))';
}

function writeTrain(
  writer: StepWriter,
  ruleSet: RuleSet,
  situation: LimitSituation,
  { train, sharedBySymbol }: LimitCandidate,
): void {
  const { emission } = situation;
  if (train === undefined || emission.mode === 'cw' || emission.mode === 'single') return;
  const { symbols } = ruleSet.factors;
  const isByT2 = countingTime(situation) < situation.exposureS;
  if (isByT2) writeT2(writer, ruleSet, situation);
  const count = pulsesFormula(emission, isByT2 ? symbols.T2 : 'T');
  writer.write({
    symbol: 'N_P',
    what: sharedBySymbol === 'n_g' ? 'Groups of pulses that count' : 'Pulses that count',
    formula: sharedBySymbol === 'n_g' ? `max(1,${count}/n_g)` : count,
    value: train.pulses,
    unit: '1',
    source: 'engine:reading',
  });
  const { branch } = train;
  const reduction = branch?.coefficient === 1 ? 'N_P^-0.25' : `${branch?.coefficient}*N_P^-0.25`;
  writer.write({
    symbol: symbols.CP,
    what:
      branch === undefined
        ? 'Pulse-train factor; no branch of the rule applies'
        : 'Pulse-train factor',
    formula: branch === undefined ? '1' : `min(1,max(${reduction},${branch.floor}))`,
    value: train.factor,
    unit: '1',
    source: branch?.source ?? situation.point.band.pulseTrain[0]?.source ?? 'engine:reading',
  });
}
