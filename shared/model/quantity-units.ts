/** What a number measures. */
export type Dimension =
  | 'length'
  | 'power'
  | 'energy'
  | 'time'
  | 'frequency'
  | 'angle'
  | 'irradiance'
  | 'radiant exposure'
  | 'ratio'
  | 'attenuation';

/** A unit as it may be typed: SI value = number × factor × 10^exponent. */
export interface Unit {
  readonly symbol: string;
  readonly dimension: Dimension;
  readonly exponent: number;
  /** 1, except for minutes, hours, days and degrees. */
  readonly factor: number;
  /** The unit that a slip of the shift key turns into this one: MW for mW. Asked about. */
  readonly slipOf?: string;
}

/** A kind of field: what it measures and the unit that its contract name ends in. */
export interface Kind {
  readonly dimension: Dimension;
  /** Unit of the value in the contract, and of a number typed without one. */
  readonly unit: string;
  readonly allowed: string;
  readonly example: string;
  readonly from: 'positive' | 'zero' | 'any';
}

const LENGTHS = 'nm, µm, mm, cm, m, km';

// prettier-ignore
export const KINDS = {
  wavelength: { dimension: 'length', unit: 'nm', allowed: 'nm, µm, mm', example: '532 nm', from: 'positive' },
  power: { dimension: 'power', unit: 'W', allowed: 'nW, µW, mW, W, kW, MW', example: '5 mW', from: 'positive' },
  energy: { dimension: 'energy', unit: 'J', allowed: 'nJ, µJ, mJ, J, kJ', example: '10 mJ', from: 'positive' },
  duration: { dimension: 'time', unit: 's', allowed: 'fs, ps, ns, µs, ms, s, min, h', example: '10 ns', from: 'positive' },
  rate: { dimension: 'frequency', unit: 'Hz', allowed: 'Hz, kHz, MHz, GHz', example: '20 Hz', from: 'positive' },
  diameter: { dimension: 'length', unit: 'mm', allowed: 'µm, mm, cm, m', example: '2.3 mm', from: 'positive' },
  micrometers: { dimension: 'length', unit: 'µm', allowed: 'nm, µm, mm', example: '50 µm', from: 'positive' },
  distance: { dimension: 'length', unit: 'm', allowed: LENGTHS, example: '9.5 m', from: 'positive' },
  position: { dimension: 'length', unit: 'm', allowed: LENGTHS, example: '-0.2 m', from: 'any' },
  divergence: { dimension: 'angle', unit: 'mrad', allowed: 'µrad, mrad, rad, °', example: '1.5 mrad', from: 'positive' },
  degrees: { dimension: 'angle', unit: '°', allowed: '°, mrad, rad', example: '30°', from: 'zero' },
  irradiance: { dimension: 'irradiance', unit: 'W/m²', allowed: 'W/m², W/cm², mW/cm²', example: '25.4 W/m²', from: 'positive' },
  'radiant-exposure': { dimension: 'radiant exposure', unit: 'J/m²', allowed: 'J/m², J/cm², mJ/cm²', example: '30 J/m²', from: 'positive' },
  percent: { dimension: 'ratio', unit: '%', allowed: '%', example: '10 %', from: 'zero' },
  attenuation: { dimension: 'attenuation', unit: '1/km', allowed: '1/km, 1/m', example: '0.1 1/km', from: 'zero' },
} as const satisfies Record<string, Kind>;

export type QuantityKind = keyof typeof KINDS;

export const DIMENSION_WORDS: Readonly<Record<Dimension, string>> = {
  length: 'a length',
  power: 'a power',
  energy: 'an energy',
  time: 'a duration',
  frequency: 'a frequency',
  angle: 'an angle',
  irradiance: 'an irradiance',
  'radiant exposure': 'a radiant exposure',
  ratio: 'a ratio',
  attenuation: 'an attenuation',
};

const PREFIXES: readonly (readonly [prefix: string, exponent: number])[] = [
  ['f', -15],
  ['p', -12],
  ['n', -9],
  ['µ', -6],
  ['m', -3],
  ['', 0],
  ['k', 3],
  ['M', 6],
  ['G', 9],
  ['T', 12],
];

/** The prefix that a slip of the shift key gives, and the one then meant, by base unit. */
const SLIPS: Readonly<Record<string, readonly [typed: string, meant: string]>> = {
  W: ['M', 'm'],
  J: ['M', 'm'],
  m: ['M', 'm'],
  s: ['M', 'm'],
  rad: ['M', 'm'],
  Hz: ['m', 'M'],
};

export const UNITS: readonly Unit[] = [
  ...prefixed('W', 'power'),
  ...prefixed('J', 'energy'),
  ...prefixed('s', 'time'),
  ...prefixed('Hz', 'frequency'),
  ...prefixed('m', 'length'),
  ...prefixed('rad', 'angle'),
  ...perArea('W', 'irradiance'),
  ...perArea('J', 'radiant exposure'),
  plain('cm', 'length', -2),
  plain('Å', 'length', -10),
  { ...plain('min', 'time', 0), factor: 60 },
  { ...plain('h', 'time', 0), factor: 3600 },
  { ...plain('d', 'time', 0), factor: 86_400 },
  { ...plain('°', 'angle', 0), factor: Math.PI / 180 },
  plain('%', 'ratio', -2),
  plain('1/km', 'attenuation', -3),
  plain('1/m', 'attenuation', 0),
];

const BY_SYMBOL = new Map(UNITS.map((unit) => [unit.symbol, unit]));

/** Other spellings of a whole unit. */
const SPELLINGS: Readonly<Record<string, string>> = {
  sec: 's',
  second: 's',
  seconds: 's',
  minute: 'min',
  minutes: 'min',
  hr: 'h',
  hour: 'h',
  hours: 'h',
  day: 'd',
  days: 'd',
  deg: '°',
  degree: '°',
  degrees: '°',
  watt: 'W',
  watts: 'W',
  joule: 'J',
  joules: 'J',
  pct: '%',
  percent: '%',
  micron: 'µm',
  microns: 'µm',
  '1/s': 'Hz',
  's^-1': 'Hz',
  '/km': '1/km',
  'km^-1': '1/km',
  '/m': '1/m',
  'm^-1': '1/m',
};

/** The unit with this symbol; undefined when there is none. */
export function unitOf(symbol: string): Unit | undefined {
  return BY_SYMBOL.get(symbol);
}

/** The unit that `typed` spells, whatever dimension; case counts. */
export function findUnit(typed: string): Unit | undefined {
  const spelled = spell(typed);
  const symbol = SPELLINGS[spelled] ?? spelled;
  return BY_SYMBOL.get(symbol) ?? BY_SYMBOL.get(symbol.replace(/^K/, 'k'));
}

/** Units of one dimension that differ from `typed` in upper and lower case only. */
export function unitsButForCase(typed: string, dimension: Dimension): readonly Unit[] {
  const spelled = spell(typed).toLowerCase();
  return UNITS.filter(
    (unit) => unit.dimension === dimension && unit.symbol.toLowerCase() === spelled,
  );
}

/** One way to write each unit: µ for micro, ² for squared, a slash for per. */
function spell(typed: string): string {
  return typed
    .replace(/[\s\u202f\u2009\u00a0]+/g, ' ')
    .trim()
    .replace(/[uμ](?=W|J|s|m|rad|Hz)/g, 'µ')
    .replace(/[º˚]/g, '°')
    .replace(/⁻¹|\^?\(?[-−]1\)?$/, '^-1')
    .replace(/[ ·*.]?(c?m) ?(?:⁻²|\^?\(?[-−]2\)?)$/, '/$1²')
    .replace(/ ?\/ ?/, '/')
    .replace(/(\/c?m)(?:\^?2|\*\*2)$/, '$1²')
    .replace(/\/sq\.? ?(c?m)$/, '/$1²');
}

function prefixed(base: string, dimension: Dimension): Unit[] {
  const [typed, meant] = SLIPS[base] ?? [];
  return PREFIXES.map(([prefix, exponent]) => ({
    ...plain(prefix + base, dimension, exponent),
    ...(prefix === typed && meant !== undefined ? { slipOf: meant + base } : {}),
  }));
}

function perArea(base: string, dimension: Dimension): Unit[] {
  return PREFIXES.flatMap(([prefix, exponent]) => [
    plain(`${prefix}${base}/m²`, dimension, exponent),
    plain(`${prefix}${base}/cm²`, dimension, exponent + 4),
    plain(`${prefix}${base}/mm²`, dimension, exponent + 6),
  ]);
}

function plain(symbol: string, dimension: Dimension, exponent: number): Unit {
  return { symbol, dimension, exponent, factor: 1 };
}
