/** How close a root is taken, relative to itself. */
const RELATIVE_TOLERANCE = 1e-14;
const LARGEST_NUMBER_OF_STEPS = 200;

/** A place where the function has been evaluated. */
interface Point {
  readonly x: number;
  readonly f: number;
}

/**
 * The root of a continuous function in a bracket, by Chandrupatla's method: bisection, with inverse
 * quadratic steps where they are safe.
 *
 * @param f has opposite signs at both ends of the bracket, or is 0 at one.
 * @throws RangeError when the bracket holds no change of sign.
 * @example findRoot((x) => x * x - 2, 1, 2) // 1.414
 */
export function findRoot(f: (x: number) => number, from: number, to: number): number {
  let a: Point = { x: from, f: f(from) };
  let b: Point = { x: to, f: f(to) };
  if (a.f === 0) return a.x;
  if (b.f === 0) return b.x;
  if (!(Math.sign(a.f) * Math.sign(b.f) < 0)) {
    throw new RangeError(`There is no change of sign between ${from} and ${to}`);
  }
  let fraction = 0.5;
  for (let step = 0; step < LARGEST_NUMBER_OF_STEPS; step++) {
    const x = a.x + fraction * (b.x - a.x);
    const next: Point = { x, f: f(x) };
    const isOnSideOfA = Math.sign(next.f) === Math.sign(a.f);
    const c = isOnSideOfA ? a : b;
    if (!isOnSideOfA) b = a;
    a = next;
    const best = Math.abs(a.f) < Math.abs(b.f) ? a : b;
    const tolerance = RELATIVE_TOLERANCE * Math.abs(best.x) + Number.MIN_VALUE;
    const smallest = tolerance / Math.abs(b.x - c.x);
    if (best.f === 0 || smallest > 0.5) return best.x;
    fraction = Math.min(1 - smallest, Math.max(smallest, nextFraction(a, b, c)));
  }
  return Math.abs(a.f) < Math.abs(b.f) ? a.x : b.x;
}

/** The inverse quadratic step where it is safe, half of the bracket otherwise. */
function nextFraction(a: Point, b: Point, c: Point): number {
  const xi = (a.x - b.x) / (c.x - b.x);
  const phi = (a.f - b.f) / (c.f - b.f);
  const isSafe = phi * phi < xi && (1 - phi) * (1 - phi) < 1 - xi;
  if (!isSafe) return 0.5;
  return (
    (a.f / (b.f - a.f)) * (c.f / (b.f - c.f)) +
    ((c.x - a.x) / (b.x - a.x)) * (a.f / (c.f - a.f)) * (b.f / (c.f - b.f))
  );
}
