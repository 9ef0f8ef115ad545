/** Browser and server may differ in the last digits of a power; beyond this they do not. */
const SAME_WITHIN = 1e-9;

/** The path of the first number in which two results differ; undefined when they agree. */
export function firstDifference(mine: unknown, theirs: unknown, path = ''): string | undefined {
  if (typeof mine === 'number' && typeof theirs === 'number') {
    const size = Math.max(Math.abs(mine), Math.abs(theirs));
    return Math.abs(mine - theirs) <= size * SAME_WITHIN ? undefined : path;
  }
  if (isRecord(mine) && isRecord(theirs)) {
    for (const name of new Set([...Object.keys(mine), ...Object.keys(theirs)])) {
      const found = firstDifference(mine[name], theirs[name], path ? `${path}.${name}` : name);
      if (found !== undefined) return found;
    }
    return undefined;
  }
  // Words may be put differently between two versions of the program; numbers may not.
  const hasNumber = typeof mine === 'number' || typeof theirs === 'number';
  return hasNumber || isRecord(mine) !== isRecord(theirs) ? path : undefined;
}

function isRecord(value: unknown): value is Readonly<Record<string, unknown>> {
  return typeof value === 'object' && value !== null;
}
