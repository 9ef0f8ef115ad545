import type { OnAxis } from '../case';
import { apertureFraction } from './aperture-fraction';
import { widthX, widthY, type BeamShape } from './beam-shape';

/** The mean over an aperture of a beam of unit power, 1/m². */
export function apertureMean(shape: BeamShape, apertureM: number, distanceM: number): number {
  const dx = widthX(shape, distanceM);
  const dy = shape.isCircular ? dx : widthY(shape, distanceM);
  const fraction = apertureFraction(shape.profile, apertureM, dx, dy);
  return fraction / apertureArea(apertureM);
}

/** The irradiance on the axis of a beam of unit power, 1/m². */
export function peak(shape: BeamShape, distanceM: number): number {
  return 4 / (Math.PI * widthX(shape, distanceM) * widthY(shape, distanceM));
}

/** Either of them, 1/m². */
export function exposureOfUnitPower(
  shape: BeamShape,
  onAxis: OnAxis,
  apertureM: number,
  distanceM: number,
): number {
  return onAxis === 'peak' ? peak(shape, distanceM) : apertureMean(shape, apertureM, distanceM);
}

/** The area of a circular aperture, m². */
export function apertureArea(apertureM: number): number {
  return (Math.PI / 4) * apertureM * apertureM;
}
