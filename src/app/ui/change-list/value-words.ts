import { fieldUnit, fieldWords } from './field-words';

/** A stored value as a reader wants it, on one line. */
export function valueWords(value: unknown, path = ''): string {
  if (value === null || value === undefined || value === '') return 'not given';
  if (typeof value === 'boolean') return value ? 'yes' : 'no';
  if (typeof value === 'number') return numberWords(value, fieldUnit(path));
  if (typeof value === 'string') return value;
  if (Array.isArray(value)) {
    return value.length ? value.map((item) => valueWords(item)).join('; ') : 'none';
  }
  if (typeof value === 'object')
    return objectWords(value as Readonly<Record<string, unknown>>, path);
  return String(value);
}

function numberWords(value: number, unit: string): string {
  return unit ? `${value}\u202f${unit}` : String(value);
}

function objectWords(value: Readonly<Record<string, unknown>>, path: string): string {
  // A quantity says its number as typed, and where it is from.
  if (typeof value['value'] === 'number' && typeof value['source'] === 'string') {
    const { value: number, text, source, uncertaintyPct } = value;
    const typed = typeof text === 'string' ? text : numberWords(number, fieldUnit(path));
    const uncertain = typeof uncertaintyPct === 'number' ? `, ±${uncertaintyPct}\u202f%` : '';
    return `${typed} (${source.replace('-', ' ')}${uncertain})`;
  }
  if (typeof value['name'] === 'string') return value['name'];
  return Object.entries(value)
    .filter(([name, part]) => name !== 'id' && part !== undefined && part !== null)
    .map(([name, part]) => `${fieldWords(name)}: ${valueWords(part, name)}`)
    .join(', ');
}
