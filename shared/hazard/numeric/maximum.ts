const GOLDEN = (Math.sqrt(5) - 1) / 2;
const STEPS = 80;

/**
 * Where a function is largest: at the best of the points, or between its neighbors, where the
 * golden section looks for a hill.
 *
 * @param points ascending, at least one, close enough that no two hills lie between neighbors.
 */
export function maximum(f: (x: number) => number, points: readonly number[]): number {
  let best = 0;
  let highest = -Infinity;
  points.forEach((point, i) => {
    const value = f(point);
    if (value > highest) [best, highest] = [i, value];
  });
  const at = points[best] as number;
  let low = points[best - 1] ?? at;
  let high = points[best + 1] ?? at;
  for (let step = 0; step < STEPS && high - low > 1e-15 * at; step++) {
    const left = high - GOLDEN * (high - low);
    const right = low + GOLDEN * (high - low);
    if (f(left) >= f(right)) high = right;
    else low = left;
  }
  const top = (low + high) / 2;
  return f(top) > highest ? top : at;
}
