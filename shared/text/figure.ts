const PREFIXES: readonly (readonly [factor: number, prefix: string])[] = [
  [1e12, 'T'],
  [1e9, 'G'],
  [1e6, 'M'],
  [1e3, 'k'],
  [1, ''],
  [1e-3, 'm'],
  [1e-6, 'µ'],
  [1e-9, 'n'],
  [1e-12, 'p'],
];
const SMALLEST = [1e-15, 'f'] as const;
/** Units that take an SI prefix; the others already have theirs. */
const PREFIXABLE: readonly string[] = ['W', 'J', 's', 'Hz', 'm'];

/**
 * A number for a sentence: four significant digits, nearest, with its unit when one is given:
 * "1.699 mm", "0.002 J" as "2 mJ". Not for limits or distances, which are rounded to the safe side.
 */
export function figure(value: number, unit = ''): string {
  if (value === 0 || !Number.isFinite(value)) return join(String(value), unit);
  if (!PREFIXABLE.includes(unit)) return join(digits(value), unit);
  const size = Math.abs(Number(value.toPrecision(4))) * (1 + 1e-12);
  // Above a kilosecond the prefix would be strange: 30,000 s.
  if (unit === 's' && size >= 1) return join(digits(value), unit);
  const [factor, prefix] = PREFIXES.find(([step]) => size >= step) ?? SMALLEST;
  return join(digits(value / factor), prefix + unit);
}

function digits(value: number): string {
  const rounded = Number(value.toPrecision(4));
  const size = Math.abs(rounded);
  if (size >= 1e7 || size < 1e-4) return String(rounded);
  const [whole = '', fraction] = String(rounded).split('.');
  const grouped = size >= 1e4 ? whole.replace(/\B(?=(\d{3})+$)/g, ',') : whole;
  return fraction ? `${grouped}.${fraction}` : grouped;
}

function join(text: string, unit: string): string {
  return unit ? `${text} ${unit}` : text;
}
