/** A form's value without what was left empty: no empty texts, nulls, or objects of nothing. */
export function filled(value: unknown): unknown {
  if (value === '' || value === null || value === undefined) return undefined;
  if (Array.isArray(value)) return value.map(filled);
  if (typeof value !== 'object') return value;
  const entries = Object.entries(value)
    .map(([name, part]) => [name, filled(part)] as const)
    .filter(([, part]) => part !== undefined);
  return entries.length ? Object.fromEntries(entries) : undefined;
}
