/** Units that end a field's name, and how they are written. */
const UNITS: readonly (readonly [ending: string, unit: string])[] = [
  ['Mrad', 'mrad'],
  ['Nm', 'nm'],
  ['Mm', 'mm'],
  ['Um', 'µm'],
  ['Hz', 'Hz'],
  ['PerKm', '1/km'],
  ['Pct', '%'],
  ['Deg', '°'],
  ['Bytes', 'bytes'],
  ['W', 'W'],
  ['J', 'J'],
  ['M', 'm'],
  ['S', 's'],
];

/** Endings that say how a value is stored, not what it is. */
const STORAGE = /(?:Ids|Id|At|On)$/;

/** Names that words alone do not make. */
const WORDS: Readonly<Record<string, string>> = {
  m2: 'M²',
  passwordHash: 'password',
};

/** A field's path in the words of the page: `emissions[0].powerW` → "line 1, power". */
export function fieldWords(path: string): string {
  return path
    .split(/\.(?![^[]*\])/)
    .flatMap(segmentWords)
    .join(', ');
}

/** The unit of the number that a field holds; empty for others. */
export function fieldUnit(path: string): string {
  return unitOf(lastName(path))?.[1] ?? '';
}

function segmentWords(segment: string): string[] {
  const match = /^([^[]*)(?:\[(.+)\])?$/.exec(segment);
  const name = match?.[1] ?? segment;
  const index = match?.[2];
  // The number itself of a quantity adds nothing to the quantity's name.
  if (name === 'value') return [];
  const words = nameWords(name);
  if (index === undefined) return [words];
  const one = name === 'emissions' ? 'line' : words.replace(/s$/, '');
  return [/^\d+$/.test(index) ? `${one} ${Number(index) + 1}` : `${one} ${index}`];
}

function nameWords(name: string): string {
  const known = WORDS[name];
  if (known) return known;
  const ending = unitOf(name)?.[0] ?? '';
  return name
    .slice(0, name.length - ending.length)
    .replace(STORAGE, '')
    .replace(/([a-z0-9])([A-Z])/g, '$1 $2')
    .replace(/[-_]/g, ' ')
    .toLowerCase();
}

function lastName(path: string): string {
  const names = path.replace(/\[[^\]]*\]/g, '').split('.');
  const last = names.at(-1) ?? path;
  return last === 'value' ? (names.at(-2) ?? last) : last;
}

function unitOf(name: string): readonly [string, string] | undefined {
  return UNITS.find(([ending]) => name.endsWith(ending) && name.length > ending.length);
}
