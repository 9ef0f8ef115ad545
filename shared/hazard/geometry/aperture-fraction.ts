import type { BeamProfile } from '../case';
import { periodicMean } from '../numeric/periodic-mean';

/**
 * The part of a beam that passes a centered circular aperture.
 *
 * @param profile Gaussian with 1/e widths, or a uniform ellipse with full widths.
 * @param apertureM diameter of the aperture, m, above 0.
 * @param dx width in x, m, 0 or more.
 * @param dy width in y, m, 0 or more.
 * @returns from 0 to 1.
 * @source engine:geometry
 * @example apertureFraction('gaussian', 0.007, 0.007, 0.007) // 0.6321
 */
export function apertureFraction(
  profile: BeamProfile,
  apertureM: number,
  dx: number,
  dy: number,
): number {
  if (profile === 'top-hat') return uniformEllipseFraction(apertureM, dx, dy);
  if (dx === dy) return -Math.expm1(-((apertureM / dx) ** 2));
  const wide = Math.max(dx, dy);
  const narrow = Math.min(dx, dy);
  return wide > SLENDER * narrow
    ? slenderGaussianFraction(apertureM, wide, narrow)
    : gaussianEllipseFraction(apertureM, wide, narrow);
}

/** From this ratio of the axes on a beam counts as slender. */
const SLENDER = 100;

/**
 * `(2/π) ∫ [1 − exp(−D_f² / (Dx² cos²ψ + Dy² sin²ψ))] dψ` over a quarter turn.
 *
 * With tan ψ = √(Dx/Dy) · tan u the integrand varies evenly with u for unequal axes too, and the
 * trapezoidal rule needs far fewer points.
 */
export function gaussianEllipseFraction(apertureM: number, wide: number, narrow: number): number {
  const ratio = wide / narrow;
  const root = Math.sqrt(ratio);
  const scale = apertureM ** 2 / wide;
  return periodicMean((u) => {
    const sine2 = Math.sin(u) ** 2;
    const cosine2 = 1 - sine2;
    const jacobian = cosine2 + ratio * sine2;
    return (-Math.expm1((-scale * jacobian) / (wide * cosine2 + narrow * sine2)) * root) / jacobian;
  });
}

/** The step in s, small enough for the last digits, and where the tails are below them. */
const STEP = 1 / 8;
const TAIL = 40;

/** No two numbers have a larger logarithm of their ratio than this. */
const LARGEST = 1500;

/**
 * The same with tan ψ = e^s. The integrand keeps its width of a few units of s however slender the
 * beam is, and falls off like e^(−|s|).
 */
export function slenderGaussianFraction(apertureM: number, wide: number, narrow: number): number {
  const last = Math.min(LARGEST, TAIL + Math.log(wide) - Math.log(narrow));
  let sum = 0;
  for (let s = -TAIL; s <= last; s += STEP) {
    const cosine2 = 1 / (1 + Math.exp(2 * s));
    const sine2 = 1 / (1 + Math.exp(-2 * s));
    const width2 = wide ** 2 * cosine2 + narrow ** 2 * sine2;
    sum += -Math.expm1(-(apertureM ** 2) / width2) / (Math.exp(s) + Math.exp(-s));
  }
  return (2 / Math.PI) * STEP * sum;
}

/** The overlap of an ellipse and a circle with one center, over the area of the ellipse. */
function uniformEllipseFraction(apertureM: number, dx: number, dy: number): number {
  const a = Math.max(dx, dy) / 2;
  const b = Math.min(dx, dy) / 2;
  const radius = apertureM / 2;
  if (radius >= a) return 1;
  if (radius <= b) return radius ** 2 / (a * b);
  // The curves cross at (x, y); the overlap is under the ellipse up to x, under the circle beyond.
  const x = a * Math.sqrt(((radius - b) * (radius + b)) / ((a - b) * (a + b)));
  const y = b * Math.sqrt(((a - radius) * (a + radius)) / ((a - b) * (a + b)));
  const underEllipse = (a * b * Math.atan2(x / a, y / b) + x * y) / 2;
  const underCircle = (radius ** 2 * Math.atan2(y, x) - x * y) / 2;
  return (underEllipse + underCircle) / ((Math.PI / 4) * a * b);
}
