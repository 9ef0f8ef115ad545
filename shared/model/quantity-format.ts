/** Between a number and its unit: narrow, and never broken. */
export const UNIT_SPACE = '\u202f';

/** Limits are rounded down, distances and optical densities up; what was measured, to the nearest. */
export type Rounding = 'down' | 'up' | 'nearest';

export interface FormattedQuantity {
  readonly number: string;
  /** Empty for a bare number. */
  readonly unit: string;
  /** Number, narrow no-break space, unit. */
  readonly text: string;
}

/** Units that take a prefix, by their own symbol. Others are shown as they are. */
const PREFIXES_OF: Readonly<Record<string, readonly string[]>> = {
  m: ['n', 'µ', 'm', '', 'k'],
  s: ['f', 'p', 'n', 'µ', 'm', ''],
  W: ['f', 'p', 'n', 'µ', 'm', '', 'k', 'M', 'G', 'T'],
  J: ['f', 'p', 'n', 'µ', 'm', '', 'k', 'M'],
  Hz: ['m', '', 'k', 'M', 'G', 'T'],
  'W/m²': ['n', 'µ', 'm', '', 'k', 'M', 'G', 'T'],
  'J/m²': ['n', 'µ', 'm', '', 'k', 'M', 'G', 'T'],
  'W/cm²': ['n', 'µ', 'm', '', 'k', 'M', 'G', 'T'],
  'J/cm²': ['n', 'µ', 'm', '', 'k', 'M', 'G', 'T'],
};

const EXPONENTS: Readonly<Record<string, number>> = {
  f: -15,
  p: -12,
  n: -9,
  µ: -6,
  m: -3,
  '': 0,
  k: 3,
  M: 6,
  G: 9,
  T: 12,
};

/** A positive decimal: 0.d₁d₂d₃… × 10^point. */
interface Digits {
  readonly digits: string;
  readonly point: number;
}

/**
 * Three significant figures with an SI prefix, rounded to the safe side.
 *
 * @param value In `unit`; not negative.
 * @param unit Without prefix: m, W, J, s, Hz, W/m² … Others (nm, mm, mrad, %) get no prefix.
 */
export function formatQuantity(value: number, unit: string, rounding: Rounding): FormattedQuantity {
  if (!Number.isFinite(value)) return join(value > 0 ? '∞' : '–', value > 0 ? unit : '');
  if (value === 0) return join('0', unit);
  const rounded = round(digitsOf(value), 3, rounding);
  return place(rounded, unit, 3);
}

/** The value as it is, to ten significant digits, in the unit that suits it. */
export function formatFull(value: number, unit: string): string {
  if (!Number.isFinite(value) || value === 0) return formatQuantity(value, unit, 'nearest').text;
  const sign = value < 0 ? '−' : '';
  return sign + place(digitsOf(Math.abs(value)), unit, 0).text;
}

/**
 * Text for an input field: exact, with the prefix that suits it; parsed again it gives the same
 * number. `unit` may carry a prefix: nm, mm, mrad stay as they are.
 */
export function formatInput(value: number, unit: string): string {
  if (value === 0) return `0 ${unit}`;
  const [mantissa = '0', exponent = '0'] = Math.abs(value).toExponential().split('e');
  const digits = { digits: mantissa.replace('.', ''), point: Number(exponent) + 1 };
  const shown = place(digits, unit, 0, true);
  return `${value < 0 ? '-' : ''}${shown.number} ${shown.unit}`;
}

/** The value without a prefix, to ten digits: what a field holds, in the unit of its contract. */
export function formatHeld(value: number, unit: string): string {
  if (value === 0) return join('0', unit).text;
  const { digits, point } = digitsOf(Math.abs(value));
  const sign = value < 0 ? '−' : '';
  return sign + placeAt({ digits, point }, unit, { figures: 0, plain: false, exponent: 0 }).text;
}

/** An optical density, rounded up to two decimals. */
export function formatOpticalDensity(density: number, decimals = 2): string {
  if (!Number.isFinite(density)) return '–';
  const scale = 10 ** decimals;
  // Ten digits first: 3.7700000000001 is the noise of a logarithm, not a larger density.
  const scaled = Number((density * scale).toPrecision(10));
  return (Math.ceil(scaled) / scale).toFixed(decimals);
}

/** A wavelength as given, all its digits: nm below 3 µm, µm from there on. */
export function formatWavelength(wavelengthNm: number): FormattedQuantity {
  const exact = (value: number) => String(Number(value.toPrecision(10)));
  return wavelengthNm < 3000
    ? join(exact(wavelengthNm), 'nm')
    : join(exact(wavelengthNm / 1000), 'µm');
}

/** A unit for a screen reader: "W/m²" is "watts per square meter". */
export function spokenUnit(unit: string): string {
  if (unit === '') return '';
  const [over = '', under] = unit.split('/');
  const spoken = spokenPart(over);
  if (under === undefined) return spoken;
  const area = /^(c|m)?m²$/.exec(under);
  if (!area) return `${spoken} per ${spokenPart(under).replace(/s$/, '')}`.trim();
  const length = area[1] === 'c' ? 'centimeter' : area[1] === 'm' ? 'millimeter' : 'meter';
  return `${spoken} per square ${length}`;
}

const SPOKEN_UNITS: Readonly<Record<string, string>> = {
  m: 'meters',
  s: 'seconds',
  W: 'watts',
  J: 'joules',
  Hz: 'hertz',
  rad: 'radians',
  min: 'minutes',
  h: 'hours',
  d: 'days',
  '°': 'degrees',
  '%': 'percent',
};

const SPOKEN_PREFIXES: Readonly<Record<string, string>> = {
  f: 'femto',
  p: 'pico',
  n: 'nano',
  µ: 'micro',
  m: 'milli',
  c: 'centi',
  k: 'kilo',
  M: 'mega',
  G: 'giga',
  T: 'tera',
};

function spokenPart(symbol: string): string {
  const whole = SPOKEN_UNITS[symbol];
  if (whole) return whole;
  const prefix = SPOKEN_PREFIXES[symbol.charAt(0)];
  const base = SPOKEN_UNITS[symbol.slice(1)];
  return prefix && base ? prefix + base : symbol;
}

/** Ten significant digits: what lies beyond is noise of the solver, not distance. */
function digitsOf(value: number): Digits {
  const [mantissa = '0', exponent = '0'] = value.toExponential(9).split('e');
  return {
    digits: mantissa.replace('.', '').replace(/0+$/, ''),
    point: Number(exponent) + 1,
  };
}

function round({ digits, point }: Digits, figures: number, rounding: Rounding): Digits {
  const head = digits.slice(0, figures).padEnd(figures, '0');
  const tail = digits.slice(figures);
  const up = rounding === 'up' ? /[1-9]/.test(tail) : rounding === 'nearest' && /^[5-9]/.test(tail);
  if (!up) return { digits: head, point };
  const next = String(Number(head) + 1);
  return next.length > figures
    ? { digits: next.slice(0, figures), point: point + 1 }
    : { digits: next.padStart(figures, '0'), point };
}

/** Puts the point by the prefix that leaves one to three digits before it. */
function place(shown: Digits, unit: string, figures: number, plain = false): FormattedQuantity {
  const prefixes = PREFIXES_OF[unit];
  // The quarter of a second of the blink is known as 0.25 s, not as 250 ms.
  const prefixless = !prefixes || (unit === 's' && shown.point === 0);
  const chosen = prefixless ? { prefix: '', exponent: 0 } : prefixFor(shown.point, prefixes);
  const symbol = isDecimal(shown.point - chosen.exponent) ? chosen.prefix + unit : unit;
  return placeAt(shown, symbol, { figures, plain, exponent: chosen.exponent });
}

interface Placing {
  readonly figures: number;
  /** Without groups and with "e" for powers of ten, as an input field takes it. */
  readonly plain: boolean;
  /** Power of ten that the unit's prefix stands for. */
  readonly exponent: number;
}

function placeAt({ digits, point }: Digits, symbol: string, placing: Placing): FormattedQuantity {
  const { figures, plain, exponent } = placing;
  const padded = digits.padEnd(figures, '0');
  const at = point - exponent;
  if (!isDecimal(at)) return join(withPoint(padded, 1) + power(point - 1, plain), symbol);
  const number = withPoint(padded, at);
  return join(plain ? number : grouped(number), symbol);
}

/** Whether a number with its point there is read easily without a power of ten. */
function isDecimal(at: number): boolean {
  return at <= 7 && at >= -3;
}

function prefixFor(point: number, prefixes: readonly string[]) {
  const candidates = prefixes.map((prefix) => ({ prefix, exponent: EXPONENTS[prefix] ?? 0 }));
  const fitting = candidates.filter(({ exponent }) => exponent < point).at(-1);
  return fitting ?? candidates[0] ?? { prefix: '', exponent: 0 };
}

/** "151" with the point after the first digit: 1.51. */
function withPoint(digits: string, at: number): string {
  if (at <= 0) return `0.${'0'.repeat(-at)}${digits}`;
  if (at >= digits.length) return digits.padEnd(at, '0');
  return `${digits.slice(0, at)}.${digits.slice(at)}`;
}

/** Five digits and more in groups of three: 30 000. */
function grouped(number: string): string {
  const [whole = '', decimals] = number.split('.');
  if (whole.length < 5) return number;
  const groups = whole.replace(/(?<=\d)(?=(?:\d{3})+$)/g, UNIT_SPACE);
  return decimals === undefined ? groups : `${groups}.${decimals}`;
}

function power(exponent: number, plain: boolean): string {
  if (plain) return `e${exponent}`;
  const digits = String(Math.abs(exponent)).replace(/\d/g, (d) => '⁰¹²³⁴⁵⁶⁷⁸⁹'.charAt(Number(d)));
  return `×10${exponent < 0 ? '⁻' : ''}${digits}`;
}

function join(number: string, unit: string): FormattedQuantity {
  const text = unit === '' ? number : number + (unit === '°' ? '' : UNIT_SPACE) + unit;
  return { number, unit, text };
}
