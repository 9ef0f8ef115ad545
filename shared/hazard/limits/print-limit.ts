import type { FactorSymbol, LimitRow } from '../rule-sets/limit-table';
import type { FactorSymbols } from '../rule-sets/rule-set';
import type { CompiledRow } from './compiled-rule-set';

/** How a row is read. */
export interface WayOfReading {
  /** Below the shortest duration t_0 of the tables: its irradiance is kept. */
  readonly isHeld: boolean;
  /** The source is larger than the cone γ_ph of the photochemical limit. */
  readonly isConed: boolean;
  readonly symbols: FactorSymbols;
}

/**
 * A row as plain mathematics, in J/m² over the duration: `18*C_A*t^0.75`. What it says is what
 * `radiantExposureLimit` computes, from the same data.
 */
export function printLimit(
  { printed, isIrradiance }: CompiledRow,
  { isHeld, isConed, symbols }: WayOfReading,
): string {
  const time = isHeld ? 't_0' : 't';
  const parts = [
    ...printedNumber(printed, time),
    ...(printed.factors ?? []).map((symbol) => factorText(symbol, symbols)),
    ...(isIrradiance ? [time] : []),
    ...(isConed ? ['max(1,alpha_x/gamma_ph)', 'max(1,alpha_y/gamma_ph)'] : []),
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
  return [...unit, ...(isOne ? [] : [`${row.coefficient}`]), ...power];
}

function factorText(symbol: FactorSymbol, symbols: FactorSymbols): string {
  return symbol === 'T2^-1/4' ? `${symbols.T2}^-0.25` : symbols[symbol];
}
