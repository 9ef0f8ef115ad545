import type { FactorSymbols } from '../rule-sets/rule-set';
import type { FactorSymbol, LimitRow } from '../rule-sets/limit-table';
import type { CompiledRow } from './compiled-rule-set';
import { coneFactor, tabulatedDuration, type ReadingPoint } from './row-reading';

/**
 * A row as plain mathematics, in J/m² over the duration: `18*C_A*t^0.75`. What it says is what
 * `radiantExposureLimit` computes, from the same data.
 */
export function printLimit(
  row: CompiledRow,
  point: ReadingPoint,
  durationS: number,
  symbols: FactorSymbols,
): string {
  const tabulatedS = tabulatedDuration(point, durationS);
  const isHeld = durationS < tabulatedS;
  const time = isHeld ? 't_0' : 't';
  const parts = [
    ...printedNumber(row.printed, time),
    ...(row.printed.factors ?? []).map((symbol) => factorText(symbol, symbols)),
    ...(row.isIrradiance ? [time] : []),
    ...coneText(row, point, tabulatedS),
  ];
  return parts.join('*') + (isHeld ? '*t/t_0' : '');
}

/** The number that the table prints, turned into SI. */
function printedNumber(row: LimitRow, time: string): string[] {
  const unit = row.quantity.endsWith('cm2') ? ['1e4'] : [];
  const power = row.timeExponent === undefined ? [] : [`${time}^${row.timeExponent}`];
  if (row.plus !== undefined) {
    return [...unit, `(${row.plus}+${[`${row.coefficient}`, ...power].join('*')})`];
  }
  const isOne = row.coefficient === 1 && (row.factors ?? []).length > 0;
  return [...unit, ...(isOne ? [] : [`${row.coefficient}`]), ...power.slice(0, 1)];
}

function factorText(symbol: FactorSymbol, symbols: FactorSymbols): string {
  return symbol === 'T2^-1/4' ? `${symbols.T2}^-0.25` : symbols[symbol];
}

/** The factor for a photochemical limit of a source larger than the cone γ_ph. */
function coneText(row: CompiledRow, point: ReadingPoint, durationS: number): string[] {
  const isLarge = row.mechanism === 'photochemical' && point.band.isRetinal;
  return isLarge && coneFactor(point, durationS) > 1
    ? ['max(1,alpha_x/gamma_ph)', 'max(1,alpha_y/gamma_ph)']
    : [];
}
