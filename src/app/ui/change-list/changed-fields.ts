export interface FieldChange {
  readonly field: string;
  readonly before: unknown;
  readonly after: unknown;
}

/** Fields in which two versions of a record differ, by path; a quantity counts as one field. */
export function changedFields(before: unknown, after: unknown, path = ''): FieldChange[] {
  if (sameValue(before, after)) return [];
  if (Array.isArray(before) && Array.isArray(after)) {
    const length = Math.max(before.length, after.length);
    return Array.from({ length }).flatMap((_, index) =>
      changedFields(before[index], after[index], `${path}[${index}]`),
    );
  }
  if (isRecord(before) && isRecord(after) && !isQuantity(before) && !isQuantity(after)) {
    const names = new Set([...Object.keys(before), ...Object.keys(after)]);
    return [...names].flatMap((name) =>
      changedFields(before[name], after[name], path ? `${path}.${name}` : name),
    );
  }
  return [{ field: path, before, after }];
}

/** Whether two values mean the same; what is absent equals what is undefined or null. */
export function sameValue(a: unknown, b: unknown): boolean {
  return a === b || canonical(a) === canonical(b);
}

function canonical(value: unknown): string {
  return (
    JSON.stringify(value, (_, part: unknown) => {
      if (!isRecord(part)) return part;
      const entries = Object.entries(part).filter(
        ([, item]) => item !== undefined && item !== null,
      );
      return Object.fromEntries(entries.sort(([a], [b]) => (a < b ? -1 : 1)));
    }) ?? 'null'
  );
}

function isRecord(value: unknown): value is Record<string, unknown> {
  return typeof value === 'object' && value !== null && !Array.isArray(value);
}

function isQuantity(value: Record<string, unknown>): boolean {
  return 'value' in value && 'source' in value;
}
