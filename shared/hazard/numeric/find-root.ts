/** How close a root is taken, relative to itself. */
const RELATIVE_TOLERANCE = 1e-14;
const LARGEST_NUMBER_OF_STEPS = 200;

/**
 * The root of a continuous function in a bracket, by Chandrupatla's method: bisection, with inverse
 * quadratic steps where they are safe.
 *
 * @param f has opposite signs at both ends of the bracket, or is 0 at one.
 * @throws RangeError when the bracket holds no change of sign.
 * @example findRoot((x) => x * x - 2, 1, 2) // 1.414
 */
export function findRoot(f: (x: number) => number, from: number, to: number): number {
  let [a, b] = [from, to];
  let [fa, fb] = [f(a), f(b)];
  if (fa === 0) return a;
  if (fb === 0) return b;
  if (!(Math.sign(fa) * Math.sign(fb) < 0)) {
    throw new RangeError(`There is no change of sign between ${from} and ${to}`);
  }
  let [c, fc] = [a, fa];
  let fraction = 0.5;
  for (let step = 0; step < LARGEST_NUMBER_OF_STEPS; step++) {
    const x = a + fraction * (b - a);
    const fx = f(x);
    if (Math.sign(fx) === Math.sign(fa)) [c, fc] = [a, fa];
    else [c, b, fc, fb] = [b, a, fb, fa];
    [a, fa] = [x, fx];
    const best = Math.abs(fa) < Math.abs(fb) ? a : b;
    const tolerance = RELATIVE_TOLERANCE * Math.abs(best) + Number.MIN_VALUE;
    const limit = tolerance / Math.abs(b - c);
    if (fa === 0 || fb === 0 || limit > 0.5) return best;
    fraction = Math.min(1 - limit, Math.max(limit, nextFraction(a, b, c, fa, fb, fc)));
  }
  return Math.abs(fa) < Math.abs(fb) ? a : b;
}

/** The inverse quadratic step where it is safe, half of the bracket otherwise. */
function nextFraction(a: number, b: number, c: number, fa: number, fb: number, fc: number): number {
  const xi = (a - b) / (c - b);
  const phi = (fa - fb) / (fc - fb);
  const isSafe = phi * phi < xi && (1 - phi) * (1 - phi) < 1 - xi;
  if (!isSafe) return 0.5;
  return (
    (fa / (fb - fa)) * (fc / (fb - fc)) + ((c - a) / (b - a)) * (fa / (fc - fa)) * (fb / (fc - fb))
  );
}
