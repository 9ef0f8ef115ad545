import type { CompiledRow } from '../limits/compiled-rule-set';
import { printLimit } from '../limits/print-limit';
import { coneFactor, tabulatedDuration, type ReadingPoint } from '../limits/row-reading';
import type { LimitCandidate } from '../pulses/limit-candidates';
import type { FactorSymbols } from '../rule-sets/rule-set';

/** What has been printed of a row; each row is read in a few ways only. */
const printed = new Map<CompiledRow, Map<string, string>>();

/** A candidate as plain mathematics, in J/m² per exposure or pulse: `0.02*C_C*C_P/n_g`. */
export function printCandidate(
  { row, durationS, train, sharedBySymbol }: LimitCandidate,
  point: ReadingPoint,
  symbols: FactorSymbols,
): string {
  const tabulatedS = tabulatedDuration(point, durationS);
  const isHeld = durationS < tabulatedS;
  const isConed =
    row.mechanism === 'photochemical' && point.band.isRetinal && coneFactor(point, tabulatedS) > 1;
  const way = `${train === undefined ? '' : '*'}${sharedBySymbol}${isHeld ? '<' : ''}${isConed ? '>' : ''}`;
  let ways = printed.get(row);
  if (ways === undefined) printed.set(row, (ways = new Map()));
  let text = ways.get(way);
  if (text === undefined) {
    const factor = train === undefined ? '' : `*${symbols.CP}`;
    const share = sharedBySymbol === '' ? '' : `/${sharedBySymbol}`;
    text = printLimit(row, { isHeld, isConed, symbols }) + factor + share;
    ways.set(way, text);
  }
  return text;
}
