import { printLimit } from '../limits/print-limit';
import type { ReadingPoint } from '../limits/row-reading';
import type { LimitCandidate } from '../pulses/limit-candidates';
import type { FactorSymbols } from '../rule-sets/rule-set';

/** A candidate as plain mathematics, in J/m² per exposure or pulse: `0.02*C_C*C_P/n_g`. */
export function printCandidate(
  { row, durationS, train, sharedBySymbol }: LimitCandidate,
  point: ReadingPoint,
  symbols: FactorSymbols,
): string {
  const limit = printLimit(row, point, durationS, symbols);
  const factor = train === undefined ? '' : `*${symbols.CP}`;
  const share = sharedBySymbol === '' ? '' : `/${sharedBySymbol}`;
  return limit + factor + share;
}
