import { axes, type ModelBeam, type ModelCase, type ModelPath } from './case';
import { Dec, ONE, PI, ZERO, dec, maxOf } from './decimal';

/** Widths in both axes, m: 1/e of the peak for a Gaussian, full for a top-hat. */
export type Widths = readonly [Dec, Dec];

export type Growth = 'hyperbolic' | 'linear';

const SQRT2 = new Dec(2).sqrt();
const FIVE_PERCENT = new Dec(20).ln().sqrt();

function widthScale(beam: ModelBeam): Dec {
  return beam.profile !== 'top-hat' && beam.width === '1/e2' ? ONE.div(SQRT2) : ONE;
}

/** How wide the beam is at a distance from the exit, the focus or the fiber's end. */
export function widthsAt(beam: ModelBeam, path: ModelPath, growth: Growth, r: Dec): Widths {
  switch (path.kind) {
    case 'direct':
      return directWidths(beam, growth, r);
    case 'lens': {
      const atLens = axes(path.diameterAtLensMm ?? beam.diameterMm!);
      const wide = (b: number): Dec =>
        dec(b).mul(widthScale(beam)).div(dec(path.focalLengthMm)).mul(r);
      return [wide(atLens[0]), wide(atLens[1])];
    }
    case 'fiber': {
      const wide = fiberWidth(beam, path, r);
      return [wide, wide];
    }
    case 'diffuse':
      throw new Error('a diffuse reflection has no beam width');
  }
}

function fiberWidth(beam: ModelBeam, path: Extract<ModelPath, { kind: 'fiber' }>, r: Dec): Dec {
  if ('numericalAperture' in path) {
    return r.mul(2).mul(dec(path.numericalAperture)).div(FIVE_PERCENT);
  }
  const modeRadiusM = dec(path.modeFieldDiameterUm).div(2e6);
  return SQRT2.mul(r).mul(dec(beam.wavelengthNm)).div(1e9).div(PI.mul(modeRadiusM));
}

function directWidths(beam: ModelBeam, growth: Growth, r: Dec): Widths {
  const scale = widthScale(beam);
  const diameters = axes(beam.diameterMm!);
  const divergences = axes(beam.divergenceMrad!);
  const z = dec(beam.waistDistanceM ?? 0);
  const wide = (axis: 0 | 1): Dec => {
    const d = dec(diameters[axis]).mul(scale).div(1000);
    const phi = dec(divergences[axis]).mul(scale).div(1000);
    if (growth === 'linear') return d.add(phi.mul(r.sub(z).abs().sub(z.abs())));
    const far = r.sub(z).pow(2).sub(z.pow(2));
    return d.pow(2).add(phi.pow(2).mul(far)).sqrt();
  };
  return [wide(0), wide(1)];
}

/** The part of the power that passes a centered circular aperture. */
export function apertureFraction(gaussian: boolean, apertureM: Dec, [x, y]: Widths): Dec {
  if (x.isZero() || y.isZero()) return ONE;
  if (gaussian) return gaussianFraction(apertureM, x, y);
  return ellipseFraction(apertureM, x, y);
}

function gaussianFraction(apertureM: Dec, x: Dec, y: Dec): Dec {
  if (x.eq(y)) return ONE.sub(apertureM.div(x).pow(2).neg().exp());
  return dec(ellipticalGaussian(apertureM.toNumber(), x.toNumber(), y.toNumber()));
}

/**
 * The mean over the elliptical angle, by the trapezoid rule: the integrand is smooth and periodic,
 * so that doubling the points squares the error. Doubles: good to 1e-14 relative.
 */
function ellipticalGaussian(aperture: number, x: number, y: number): number {
  const at = (psi: number): number => {
    const c = x * Math.cos(psi);
    const s = y * Math.sin(psi);
    return -Math.expm1(-(aperture * aperture) / (c * c + s * s));
  };
  let points = 16;
  let previous = 0;
  for (;;) {
    let sum = 0;
    for (let i = 0; i < points; i++) sum += at((Math.PI * (i + 0.5)) / points);
    const mean = sum / points;
    if (Math.abs(mean - previous) <= 1e-15 * mean || points > 1e5) return mean;
    previous = mean;
    points *= 2;
  }
}

/** The overlap of a uniform ellipse with a concentric circle, over the ellipse. */
function ellipseFraction(apertureM: Dec, x: Dec, y: Dec): Dec {
  const [long, short] = x.gte(y) ? [x, y] : [y, x];
  if (apertureM.gte(long)) return ONE;
  if (apertureM.lte(short)) return apertureM.pow(2).div(long.mul(short));
  // Semi-axes a > c > b of ellipse and circle; they cross at x0.
  const [a, b, c] = [long.div(2), short.div(2), apertureM.div(2)];
  const crossing = a
    .pow(2)
    .mul(c.pow(2).sub(b.pow(2)))
    .div(a.pow(2).sub(b.pow(2)))
    .sqrt();
  const ellipsePart = b.div(a).mul(underArc(a, crossing));
  const circlePart = PI.mul(c.pow(2)).div(4).sub(underArc(c, crossing));
  return ellipsePart.add(circlePart).mul(4).div(PI.mul(a).mul(b));
}

/** ∫₀ˣ √(R² − u²) du. */
function underArc(radius: Dec, x: Dec): Dec {
  const height = maxOf([ZERO, radius.pow(2).sub(x.pow(2))]).sqrt();
  const angle = x.div(radius).asin();
  return x.mul(height).add(radius.pow(2).mul(angle)).div(2);
}

export function isGaussian(beam: ModelBeam, path: ModelPath): boolean {
  return path.kind === 'fiber' || beam.profile !== 'top-hat';
}

/** exp(−μ r). */
export function airTransmission(hazardCase: ModelCase, r: Dec): Dec {
  const perKm = hazardCase.air?.attenuationPerKm;
  return perKm === undefined ? ONE : dec(perKm).mul(r).div(1000).neg().exp();
}
