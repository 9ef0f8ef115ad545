import {
  DIMENSION_WORDS,
  findUnit,
  KINDS,
  type Kind,
  type QuantityKind,
  type Unit,
  unitOf,
  unitsButForCase,
} from './quantity-units';

/** A quantity as it was understood. */
export interface ReadQuantity {
  readonly ok: true;
  /** In SI: m, W, J, s, Hz, rad, W/m², J/m²; ratios as such. */
  readonly si: number;
  /** In the unit of its kind, which the contract's field name ends in. */
  readonly value: number;
  /** The unit that was typed, or stood beside the field. */
  readonly unit: string;
  /** As typed, unit included. */
  readonly text: string;
}

export interface RefusedQuantity {
  readonly ok: false;
  readonly message: string;
  readonly allowed: string;
}

/** Two readings are possible: the person chooses. */
export interface UnclearQuantity {
  readonly ok: 'ask';
  readonly question: string;
  readonly options: readonly { readonly label: string; readonly reading: ReadQuantity }[];
}

export type QuantityReading = ReadQuantity | RefusedQuantity | UnclearQuantity;

/** A decimal number before it becomes a float: digits × 10^exponent. */
interface Decimal {
  readonly digits: string;
  readonly exponent: number;
}

const SPACES = /[\u00a0\u2007\u2009\u200a\u202f]/g;
const SUPERSCRIPTS = '⁰¹²³⁴⁵⁶⁷⁸⁹';

/**
 * Reads what a person typed: "5 mW", "0.005 W", "5e-3 W", "1,5 mrad", "10.6 µm".
 *
 * @param unit Unit of a number typed without one; the kind's own when left out.
 */
export function parseQuantity(text: string, kind: QuantityKind, unit?: string): QuantityReading {
  const rules: Kind = KINDS[kind];
  const typed = text.replace(SPACES, ' ').trim();
  const refusal = refuseForm(typed, rules);
  if (refusal) return refusal;

  const { number, rest } = splitNumber(typed);
  const decimals = readDecimals(number);
  if (decimals.length === 0) return notANumber(typed, rules);

  const units = readUnits(rest, rules, unit ?? rules.unit);
  if (!Array.isArray(units)) return units;
  const readings = decimals.flatMap((decimal) =>
    units.map((one) => readingOf(decimal, { unit: one, rules, typed, bare: rest === '' })),
  );
  const [first, ...others] = readings;
  if (!first) return notANumber(typed, rules);
  if (first.ok !== true || (others.length === 0 && isExact(rest, units))) return first;
  return ask(
    readings.filter((reading) => reading.ok === true),
    decimals.length > 1
      ? `“${typed}” can be read in two ways. Which one is meant?`
      : `“${typed}” may be a slip of the shift key. Which one is meant?`,
  );
}

function refuseForm(typed: string, rules: Kind): RefusedQuantity | undefined {
  const { allowed, example } = rules;
  const refuse = (message: string): RefusedQuantity => ({ ok: false, message, allowed });
  if (typed === '') return refuse(`Enter a number with its unit, for example ${example}.`);
  const sign = /^[<>≤≥~≈=]+/.exec(typed)?.[0];
  if (sign)
    return refuse(`Leave out “${sign}” and enter the number itself, for example ${example}.`);
  if (/±|\+\/?-/.test(typed)) {
    return refuse('Enter one number here and its uncertainty in its own field.');
  }
  if (/\d\s*[a-zA-Zµμ/²%°]*\s*(?:–|—|\.\.+|…|\bto\b|(?<![eE^])-(?=\s*[\d.]))\s*\d/.test(typed)) {
    return refuse(`Enter one number, not a range, for example ${example}.`);
  }
  return undefined;
}

/** Parts the number from what follows it. */
function splitNumber(typed: string): { number: string; rest: string } {
  const power = String.raw`(?:10(?:\^\(?[-−+]?\d+\)?|[⁻⁺]?[${SUPERSCRIPTS}]+))`;
  const mantissa = String.raw`[-−+]?(?:\d+(?:[ '’]\d{3}(?!\d)|[.,]\d+)*[.,]?|[.,]\d+)`;
  const scientific = String.raw`(?: ?[eE][-−+]?\d+|\s?[×x·*]\s?${power})`;
  const match = new RegExp(`^(?:[-−+]?${power}|${mantissa}${scientific}?)`).exec(typed);
  const number = match?.[0] ?? '';
  // A separator that ends the number belongs to nothing: "5. mW" is 5 mW.
  return { number: number.replace(/,$/, ''), rest: typed.slice(number.length).trim() };
}

/** Every way to read the number: one, or two when a comma may group or part decimals. */
function readDecimals(number: string): Decimal[] {
  const text = number.replace(/−/g, '-').replace(/[’']/g, ' ');
  const power = /^([-+]?)10(?:\^\(?([-+]?\d+)\)?|([⁻⁺]?[⁰¹²³⁴⁵⁶⁷⁸⁹]+))$/.exec(text);
  if (power) return [{ digits: `${power[1]}1`, exponent: exponentOf(power[2] ?? power[3] ?? '') }];
  const parts =
    /^([-+]?[\d ,.]+?)(?: ?[eE]([-+]?\d+)|\s?[×x·*]\s?10(?:\^\(?([-+]?\d+)\)?|([⁻⁺]?[⁰¹²³⁴⁵⁶⁷⁸⁹]+)))?$/.exec(
      text,
    );
  if (!parts) return [];
  const exponent = exponentOf(parts[2] ?? parts[3] ?? parts[4] ?? '0');
  return plainNumbers(parts[1] ?? '').map((plain) => decimalOf(plain, exponent));
}

/** The number with a point for decimals and nothing between groups; two when it is unclear. */
function plainNumbers(text: string): string[] {
  const sign = /^-/.test(text) ? '-' : '';
  const body = text.replace(/^[-+]/, '').trim();
  if (/^\d{1,3}(?: \d{3})+(?:[.,]\d+)?$/.test(body)) {
    return [sign + body.replace(/ /g, '').replace(',', '.')];
  }
  if (body.includes(' ')) return [];
  if (/^(?:\d+\.?\d*|\.\d+)$/.test(body)) return [sign + body];
  if (/^\d{1,3}(?:,\d{3})+\.\d+$/.test(body)) return [sign + body.replace(/,/g, '')];
  if (/^\d{1,3}(?:\.\d{3})+,\d+$/.test(body)) {
    return [sign + body.replace(/\./g, '').replace(',', '.')];
  }
  if (/^\d{1,3}(?:,\d{3}){2,}$/.test(body)) return [sign + body.replace(/,/g, '')];
  if (/^\d{1,3}(?:\.\d{3}){2,}$/.test(body)) return [sign + body.replace(/\./g, '')];
  if (/^[1-9]\d{0,2},\d{3}$/.test(body)) {
    return [sign + body.replace(',', ''), sign + body.replace(',', '.')];
  }
  if (/^\d*,\d+$/.test(body)) return [sign + body.replace(',', '.')];
  return [];
}

function exponentOf(text: string): number {
  const digits = text.replace(/[⁰¹²³⁴⁵⁶⁷⁸⁹]/g, (digit) => String(SUPERSCRIPTS.indexOf(digit)));
  return Number(digits.replace('⁻', '-').replace('⁺', ''));
}

function decimalOf(plain: string, exponent: number): Decimal {
  const [whole = '', decimals = ''] = plain.split('.');
  return { digits: whole + decimals || '0', exponent: exponent - decimals.length };
}

/** The units that `rest` may mean: one; two after a slip of case; or why none. */
function readUnits(rest: string, rules: Kind, bareUnit: string): Unit[] | RefusedQuantity {
  const { allowed, dimension } = rules;
  const exact = rest === '' ? unitOf(bareUnit) : findUnit(rest);
  if (exact?.dimension === dimension) {
    const meant = exact.slipOf === undefined ? undefined : unitOf(exact.slipOf);
    return meant ? [exact, meant] : [exact];
  }
  const close = unitsButForCase(rest, dimension);
  if (close.length > 0) return [...close];
  if (exact) {
    const message = `“${rest}” is ${DIMENSION_WORDS[exact.dimension]}; here stands ${DIMENSION_WORDS[dimension]}.`;
    return { ok: false, message, allowed };
  }
  return { ok: false, message: `“${rest}” is not a unit known here.`, allowed };
}

function isExact(rest: string, units: readonly Unit[]): boolean {
  return units.length === 1 && (rest === '' || findUnit(rest) === units[0]);
}

interface Context {
  readonly unit: Unit;
  readonly rules: Kind;
  readonly typed: string;
  readonly bare: boolean;
}

function readingOf(decimal: Decimal, context: Context): ReadQuantity | RefusedQuantity {
  const { unit, rules, typed, bare } = context;
  const held = unitOf(rules.unit);
  if (!held) throw new RangeError(`Unknown unit ${rules.unit}`);
  const si = scaled(decimal, unit.exponent) * unit.factor;
  // Powers of ten are added before the text becomes a float, so that 1064 nm stays 1064.
  const value =
    unit.factor === held.factor
      ? scaled(decimal, unit.exponent - held.exponent)
      : si / held.factor / 10 ** held.exponent;
  const refuse = (message: string): RefusedQuantity => ({
    ok: false,
    message,
    allowed: rules.allowed,
  });
  const isZero = /^[-+]?0*$/.test(decimal.digits);
  if (!Number.isFinite(si) || !Number.isFinite(value)) return refuse('This number is too large.');
  if ((si === 0 || value === 0) && !isZero) return refuse('This number is too small.');
  if (rules.from === 'positive' && !(value > 0)) return refuse('Enter a number above 0.');
  if (rules.from === 'zero' && !(value >= 0)) return refuse('Enter 0 or a number above 0.');
  const text = bare ? `${typed} ${unit.symbol}` : typed;
  return {
    ok: true,
    si: si === 0 ? 0 : si,
    value: value === 0 ? 0 : value,
    unit: unit.symbol,
    text,
  };
}

function scaled({ digits, exponent }: Decimal, by: number): number {
  return Number(`${digits}e${exponent + by}`);
}

function ask(readings: readonly ReadQuantity[], question: string): UnclearQuantity {
  const options = readings.map((reading) => {
    const label = labelOf(reading);
    return { label, reading: { ...reading, text: label } };
  });
  return { ok: 'ask', question, options };
}

function labelOf({ si, unit }: ReadQuantity): string {
  const one = unitOf(unit);
  const number = one ? si / one.factor / 10 ** one.exponent : si;
  return `${Number(number.toPrecision(12))} ${unit}`;
}

function notANumber(typed: string, rules: Kind): RefusedQuantity {
  const { allowed, example } = rules;
  return {
    ok: false,
    message: `“${typed}” is not a number with a unit; write for example ${example}.`,
    allowed,
  };
}
