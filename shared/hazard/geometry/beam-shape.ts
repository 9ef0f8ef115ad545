import type { Beam, BeamGrowth, BeamProfile, Path, PerAxis } from '../case';

/** A beam along its path, in meters and radians, with 1/e widths of a Gaussian. */
export interface BeamShape {
  readonly kind: 'beam';
  /** Width at distance 0. */
  readonly dx: number;
  readonly dy: number;
  /** Full divergence. */
  readonly phix: number;
  readonly phiy: number;
  /** Where the waist lies. */
  readonly waistM: number;
  readonly growth: BeamGrowth;
  readonly profile: BeamProfile;
  readonly isCircular: boolean;
}

/** The NA of a multimode fiber is a slope at the 5 % point: the 1/e half-width over it. */
const FIVE_PERCENT_TO_ONE_OVER_E = 1 / Math.sqrt(Math.log(20));

/** The beam on every path but the diffuse one. */
export function beamShape(beam: Beam, path: Path, growth: BeamGrowth): BeamShape {
  switch (path.kind) {
    case 'fiber':
      return cone(fiberDivergence(path, beam.wavelengthNm), 'gaussian');
    case 'lens': {
      const width = path.diameterAtLensMm ?? beam.diameterMm ?? 0;
      const [bx, by] = oneOverEWidths(beam, width);
      const profile = beam.profile ?? 'gaussian';
      return cone([bx / path.focalLengthMm, by / path.focalLengthMm], profile);
    }
    default:
      return directBeam(beam, growth);
  }
}

/** Beam width in one axis, m. */
export function beamWidth(
  { waistM, growth }: BeamShape,
  diameterM: number,
  divergenceRad: number,
  distanceM: number,
): number {
  if (growth === 'linear') {
    return diameterM + divergenceRad * (Math.abs(distanceM - waistM) - Math.abs(waistM));
  }
  const grown = divergenceRad * divergenceRad * distanceM * (distanceM - 2 * waistM);
  return Math.sqrt(diameterM * diameterM + grown);
}

/** Width in the x axis, m. */
export function widthX(shape: BeamShape, distanceM: number): number {
  return beamWidth(shape, shape.dx, shape.phix, distanceM);
}

/** Width in the y axis, m. */
export function widthY(shape: BeamShape, distanceM: number): number {
  return beamWidth(shape, shape.dy, shape.phiy, distanceM);
}

/** One number or two as widths at the 1/e points; a top-hat has one width only. */
export function oneOverEWidths(
  { width, profile }: Pick<Beam, 'width' | 'profile'>,
  value: PerAxis,
): [x: number, y: number] {
  const factor = profile !== 'top-hat' && width === '1/e2' ? Math.SQRT1_2 : 1;
  return typeof value === 'number'
    ? [value * factor, value * factor]
    : [value[0] * factor, value[1] * factor];
}

/** Full divergence of the 1/e cone behind a fiber, rad. */
function fiberDivergence(
  path: Extract<Path, { kind: 'fiber' }>,
  wavelengthNm: number,
): [x: number, y: number] {
  const divergence =
    'numericalAperture' in path
      ? 2 * path.numericalAperture * FIVE_PERCENT_TO_ONE_OVER_E
      : (Math.SQRT2 * wavelengthNm * 1e-9) / ((Math.PI * path.modeFieldDiameterUm * 1e-6) / 2);
  return [divergence, divergence];
}

/** A beam from a point: both growths are the same. */
function cone([phix, phiy]: readonly [number, number], profile: BeamProfile): BeamShape {
  return {
    kind: 'beam',
    dx: 0,
    dy: 0,
    phix,
    phiy,
    waistM: 0,
    growth: 'linear',
    profile,
    isCircular: phix === phiy,
  };
}

function directBeam(beam: Beam, growth: BeamGrowth): BeamShape {
  const [dx, dy] = oneOverEWidths(beam, beam.diameterMm ?? 0);
  const [phix, phiy] = oneOverEWidths(beam, beam.divergenceMrad ?? 0);
  return {
    kind: 'beam',
    dx: dx * 1e-3,
    dy: dy * 1e-3,
    phix: phix * 1e-3,
    phiy: phiy * 1e-3,
    waistM: beam.waistDistanceM ?? 0,
    growth,
    profile: beam.profile ?? 'gaussian',
    isCircular: dx === dy && phix === phiy,
  };
}
