import type { DiffusePath } from '../case';
import type { ApparentSource } from '../factors/apparent-source';

/** A matt surface that sends light back, in meters. */
export interface DiffuseField {
  readonly kind: 'surface';
  /** Radiance of unit power over the spot's area, times the cosine of the viewing angle, 1/sr. */
  readonly strength: number;
  /** Width of the lit spot; 0 when it is far smaller than any distance. */
  readonly spotM: number;
  readonly cosine: number;
}

/** The nearest distance at which a surface is looked at, m. */
export const NEAREST_VIEW_M = 0.1;

/** The surface of a path. */
export function diffuseField(path: DiffusePath): DiffuseField {
  const cosine = Math.cos((path.angleDeg * Math.PI) / 180);
  return {
    kind: 'surface',
    strength: (path.reflectance * cosine) / Math.PI,
    spotM: (path.spotMm ?? 0) * 1e-3,
    cosine,
  };
}

/** What unit power gives at a distance, 1/m²: a disc that sends light by the cosine law. */
export function diffuseExposure({ strength, spotM }: DiffuseField, distanceM: number): number {
  return strength / (distanceM * distanceM + (spotM * spotM) / 4);
}

/** The angles that the spot subtends, mrad: foreshortened in one axis. */
export function spotSource({ spotM, cosine }: DiffuseField, distanceM: number): ApparentSource {
  const yMrad = (spotM / distanceM) * 1e3;
  return { xMrad: yMrad * cosine, yMrad };
}
