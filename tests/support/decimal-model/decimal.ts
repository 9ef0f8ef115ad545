import { Decimal } from 'decimal.js';

/** 40 digits: thirty more than any comparison with the engine needs. */
export const Dec = Decimal.clone({ precision: 40 });

export type Dec = Decimal;

export const ZERO = new Dec(0);
export const ONE = new Dec(1);
export const PI = Dec.acos(-1);

/** A decimal from the shortest text of a double: what the person typed, not its binary expansion. */
export function dec(value: number | Decimal | string): Dec {
  return new Dec(typeof value === 'number' ? String(value) : value);
}

export function maxOf(values: readonly Dec[]): Dec {
  return values.reduce((a, b) => (b.gt(a) ? b : a), ZERO);
}

export function minOf(values: readonly Dec[]): Dec {
  return values.reduce((a, b) => (b.lt(a) ? b : a));
}
