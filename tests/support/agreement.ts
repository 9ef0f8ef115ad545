import type { Numbers } from './decimal-model/numbers';

/** Densities are compared as they are, everything else relative to the value. */
const TOLERANCES: readonly (readonly [ending: RegExp, tolerance: number])[] = [
  [/opticalDensity$/, 1e-10],
  [/[dD]istance$/, 1e-9],
  [/mpe\.\w+$/, 1e-12],
  [/exposure\.\w+$|at\.\w+$/, 1e-11],
];

/**
 * Where the limit depends on the distance (a lit spot), the worst place is the top of a flat curve:
 * known less well than the ratio there, and with it limit and exposure each for itself.
 */
const FLAT_TOP = 1e-8;

function toleranceOf(key: string, flatTop: boolean): number {
  const found = TOLERANCES.find(([ending]) => ending.test(key));
  if (!found) throw new Error(`no tolerance for ${key}`);
  return flatTop && /^eye\.\d+\.(mpe|exposure)\./.test(key) ? FLAT_TOP : found[1];
}

/** Every number on which the engine and the model differ by more than rounding. */
export function disagreements(engine: Numbers, model: Numbers, flatTop = false): string[] {
  const found: string[] = [];
  for (const key of new Set([...Object.keys(model), ...Object.keys(engine)])) {
    const [actual, expected] = [engine[key], model[key]];
    if (expected === undefined && key.endsWith('limitingAperture')) continue;
    if (actual === undefined || expected === undefined) {
      found.push(`${key}: engine ${actual}, model ${expected}`);
      continue;
    }
    const scale = key.endsWith('opticalDensity') ? 1 : Math.abs(expected);
    if (!(Math.abs(actual - expected) <= toleranceOf(key, flatTop) * scale)) {
      found.push(`${key}: engine ${actual}, model ${expected}`);
    }
  }
  return found;
}
