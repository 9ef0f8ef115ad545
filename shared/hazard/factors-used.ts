import { breakTimeT2 } from './factors/break-time-t2';
import { correctionFactorCE } from './factors/correction-factor-ce';
import { factorValue } from './factors/factor-value';
import { alphaMax, coneFactor, edgeS, gammaPh, tabulatedDuration } from './limits/row-reading';
import type { LimitCandidate, LimitSituation } from './pulses/limit-candidates';
import type { Factors } from './result';
import type { RuleSet } from './rule-sets';

/** The numbers that a limit was read with; only those that were used. */
export function factorsOf(
  { pulseTrain }: RuleSet,
  { point }: LimitSituation,
  { row, durationS, rule, sharedBy, train }: LimitCandidate,
): Factors {
  const used: Factors = {};
  const tabulatedS = tabulatedDuration(point, durationS);
  for (const { symbol, row: factor } of row.factors) {
    used[symbol] = factor === undefined ? 1 : factorValue(factor, point.wavelengthNm);
  }
  if (row.growsWithSource) {
    used.alphaMaxMrad = alphaMax(point, tabulatedS);
    used.CE = correctionFactorCE(point.source, used.alphaMaxMrad);
  }
  const isCounted = train !== undefined && pulseTrain.countedWithin === 'T2';
  if (row.hasT2 || row.printed.durationS.includes('T2') || (isCounted && point.band.isRetinal)) {
    used.T2S = breakTimeT2(point.source);
  }
  if (row.printed.durationS.includes('T1')) used.T1S = edgeS('T1', point);
  if (
    row.mechanism === 'photochemical' &&
    point.band.isRetinal &&
    coneFactor(point, tabulatedS) > 1
  ) {
    used.gammaPhMrad = gammaPh(point, tabulatedS);
  }
  if (rule === 'average') used.pulses = sharedBy;
  if (train !== undefined) {
    used.CP = train.factor;
    used.pulses = train.pulses;
    if (sharedBy > 1) used.pulsesInGroup = sharedBy;
  }
  return used;
}
