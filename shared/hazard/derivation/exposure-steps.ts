import type { DiffuseField } from '../geometry/diffuse-field';
import type { Path } from '../case';
import type { SceneBeam } from '../scene';
import { opticalDensity, type BeamHazard } from '../side-hazard';
import { writeFraction, writeShape, writeWidths } from './beam-steps';
import type { StepWriter } from './step-writer';

const SOURCE = 'engine:geometry';

/** Where an exposure is looked at. */
export interface Place {
  /** The symbol of the distance and of what is found there. */
  readonly distance: string;
  readonly exposure: string;
  readonly density: string;
  readonly what: string;
  /** Whether the air counts. */
  readonly inAir: boolean;
}

/** The worst accessible place. */
export const WORST: Place = {
  distance: 'r_0',
  exposure: '',
  density: 'OD',
  what: 'The worst accessible exposure',
  inAir: false,
};

/** The place that the case asks for. */
export const ASKED: Place = {
  distance: 'r_at',
  exposure: '_at',
  density: 'OD_at',
  what: 'The exposure at the distance asked for',
  inAir: true,
};

/** The data of the laser and of its path, as far as formulas need them. */
export function writeField(writer: StepWriter, path: Path, sceneBeam: SceneBeam): void {
  const { field, timing } = sceneBeam;
  writer.know(timing.isPulsed ? 'Q' : 'Phi', timing.powerOrEnergy);
  if (field.kind === 'beam') {
    writeShape(writer, path, sceneBeam, field);
  } else if (path.kind === 'diffuse') {
    writer.know('rho', path.reflectance);
    writer.know('theta', path.angleDeg);
    writer.know('s', field.spotM);
  }
}

/** The angles that a lit spot is seen under; they decide its limits. */
export function writeSpot(writer: StepWriter, hazard: BeamHazard, distance: string): void {
  const { source } = hazard.situation.point;
  writer.know(distance, hazard.distanceM);
  writer.write({
    symbol: 'alpha_y',
    what: 'Angle under which the lit spot is seen',
    formula: `1000*s/${distance}`,
    value: source.yMrad,
    unit: 'mrad',
    source: SOURCE,
  });
  writer.write({
    symbol: 'alpha_x',
    what: 'The same in the axis in which it is foreshortened',
    formula: `1000*s*cos(theta*pi/180)/${distance}`,
    value: source.xMrad,
    unit: 'mrad',
    source: SOURCE,
  });
}

/** The steps to an exposure and its optical density. */
export function writeExposure(writer: StepWriter, hazard: BeamHazard, place: Place): void {
  const { sceneBeam, governing, distanceM, exposure, ratio } = hazard;
  const { isPulsed } = sceneBeam.timing;
  const symbol = `${isPulsed ? 'H' : 'E'}${place.exposure}`;
  writer.know(place.distance, distanceM);
  const air = place.inAir ? airFormula(place.distance) : '';
  writer.write({
    symbol,
    what: `${place.what}, averaged over the aperture`,
    formula: `${writeMeanExposure(writer, hazard, governing.apertureM, place.distance)}${air}`,
    value: exposure,
    unit: isPulsed ? 'J/m2' : 'W/m2',
    source: SOURCE,
  });
  writer.write({
    symbol: place.density,
    what: 'Optical density that brings it down to the limit; 0 when it is below',
    formula: `max(0,log10(${symbol}/${isPulsed ? 'H' : 'E'}_MPE))`,
    value: opticalDensity(ratio),
    unit: '1',
    source: SOURCE,
  });
}

/** What the air leaves, as a factor. */
export function airFormula(distance: string): string {
  return `*exp(-mu*${distance})`;
}

/** Writes what the mean over an aperture needs and returns its formula. */
export function writeMeanExposure(
  writer: StepWriter,
  { sceneBeam, distanceM }: BeamHazard,
  apertureM: number,
  distance: string,
): string {
  const { field, timing } = sceneBeam;
  const emitted = timing.isPulsed ? 'Q' : 'Phi';
  if (field.kind === 'surface') return `${emitted}*${diffuseFormula(field, distance)}`;
  writeWidths(writer, field, distanceM, distance);
  writeFraction(writer, field, distanceM, { symbol: 'D_f', apertureM });
  return `${emitted}*eta/(pi*D_f^2/4)`;
}

/** What a matt surface makes of unit power. */
export function diffuseFormula({ spotM }: DiffuseField, distance: string): string {
  const area = spotM > 0 ? `(${distance}^2+s^2/4)` : `${distance}^2`;
  return `rho*cos(theta*pi/180)/(pi*${area})`;
}
