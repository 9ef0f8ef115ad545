import type {
  Beam,
  LensPath,
  MultimodeFiberPath,
  Path,
  PerAxis,
  SingleModeFiberPath,
} from '../case';
import { widthX, widthY, type BeamShape } from '../geometry/beam-shape';
import { apertureMean, apertureArea } from '../geometry/beam-exposure';
import type { SceneBeam } from '../scene';
import type { StepDraft, StepWriter } from './step-writer';

const SOURCE = 'engine:geometry';

/** The axes that a beam is written in: one for both, or two. */
export type Axis = '' | '_x' | '_y';

/** One axis for a circular beam, two for an elliptical one. */
export function axesOf({ isCircular }: BeamShape): readonly Axis[] {
  return isCircular ? [''] : ['_x', '_y'];
}

/** The beam on its path in SI, with 1/e widths. */
export function writeShape(
  writer: StepWriter,
  path: Path,
  { beam }: SceneBeam,
  shape: BeamShape,
): void {
  if (path.kind === 'fiber') {
    if ('numericalAperture' in path) writeMultimodeFiber(writer, path, shape);
    else writeSingleModeFiber(writer, path, shape, beam.wavelengthNm);
  } else if (path.kind === 'lens') {
    writeLens(writer, path, beam, shape);
  } else {
    writeDirect(writer, beam, shape);
  }
}

/** The width of the beam at a distance, as a formula in the symbol of that distance. */
export function widthFormula(shape: BeamShape, axis: Axis, distance: string): string {
  const [d, phi] = [`d${axis}`, `phi${axis}`];
  if (shape.dx === 0 && shape.dy === 0) return `${phi}*${distance}`;
  const isLinear = shape.growth === 'linear';
  if (shape.waistM === 0) {
    return isLinear ? `${d}+${phi}*${distance}` : `sqrt(${d}^2+${phi}^2*${distance}^2)`;
  }
  return isLinear
    ? `${d}+${phi}*(abs(${distance}-z)-abs(z))`
    : `sqrt(${d}^2+${phi}^2*${distance}*(${distance}-2*z))`;
}

/** The widths at a distance, D or D_x and D_y. */
export function writeWidths(
  writer: StepWriter,
  shape: BeamShape,
  distanceM: number,
  distance: string,
): void {
  for (const axis of axesOf(shape)) {
    writer.write({
      symbol: `D${axis}`,
      what: `Width of the beam there${axis === '' ? '' : ` in the ${axis.slice(1)} axis`}`,
      formula: widthFormula(shape, axis, distance),
      value: axis === '_y' ? widthY(shape, distanceM) : widthX(shape, distanceM),
      unit: 'm',
      source: SOURCE,
    });
  }
}

/** Below this the printed `1-exp(-x)` would lose digits that the engine keeps. */
const SMALL = 0.01;

/** η, the part of the beam that passes an aperture with the given symbol. */
export function writeFraction(
  writer: StepWriter,
  shape: BeamShape,
  distanceM: number,
  { symbol, apertureM }: { symbol: string; apertureM: number },
): void {
  const formula = fractionFormula(shape, distanceM, symbol, apertureM);
  const draft: StepDraft = {
    symbol: 'eta',
    what: 'Part of the beam that passes the aperture',
    formula: formula ?? `eta(${symbol},D_x,D_y)`,
    value: apertureMean(shape, apertureM, distanceM) * apertureArea(apertureM),
    unit: '1',
    source: SOURCE,
  };
  if (formula === undefined) writer.writeNumeric(draft);
  else writer.write(draft);
}

/** The formula of a circular beam; an elliptical one is integrated. */
function fractionFormula(
  shape: BeamShape,
  distanceM: number,
  symbol: string,
  apertureM: number,
): string | undefined {
  if (!shape.isCircular) return undefined;
  const width = widthX(shape, distanceM);
  if (width === 0) return '1';
  if (shape.profile === 'top-hat') return `min(1,${symbol}^2/D^2)`;
  return (apertureM / width) ** 2 < SMALL ? `-expm1(-${symbol}^2/D^2)` : `1-exp(-${symbol}^2/D^2)`;
}

function writeDirect(writer: StepWriter, beam: Beam, shape: BeamShape): void {
  const { conversion, what } = widthConversion(beam);
  for (const axis of axesOf(shape)) {
    knowAxis(writer, 'd_0', axis, beam.diameterMm ?? 0);
    knowAxis(writer, 'phi_0', axis, beam.divergenceMrad ?? 0);
    writer.write({
      symbol: `d${axis}`,
      what: `Diameter at the exit${what}`,
      formula: `1e-3*d_0${axis}${conversion}`,
      value: axis === '_y' ? shape.dy : shape.dx,
      unit: 'm',
      source: SOURCE,
    });
    writer.write({
      symbol: `phi${axis}`,
      what: `Full divergence${what}`,
      formula: `1e-3*phi_0${axis}${conversion}`,
      value: axis === '_y' ? shape.phiy : shape.phix,
      unit: 'rad',
      source: SOURCE,
    });
  }
  writer.know('z', shape.waistM);
}

/** What turns the given widths of a beam into 1/e widths. */
function widthConversion({ profile, width }: Beam): { conversion: string; what: string } {
  return profile !== 'top-hat' && width === '1/e2'
    ? { conversion: '/sqrt(2)', what: ' at the 1/e points, from the 1/e² width of a Gaussian' }
    : { conversion: '', what: '' };
}

function knowAxis(writer: StepWriter, symbol: string, axis: Axis, value: PerAxis): void {
  const ofAxis = typeof value === 'number' ? value : value[axis === '_y' ? 1 : 0];
  writer.know(`${symbol}${axis}`, ofAxis);
}

function writeMultimodeFiber(
  writer: StepWriter,
  { numericalAperture }: MultimodeFiberPath,
  shape: BeamShape,
): void {
  writer.know('NA', numericalAperture);
  writer.write({
    symbol: 'phi',
    what: 'Full divergence at the 1/e points behind a multimode fiber, taken as a point; assumed: NA is the half-angle, as a slope, at the 5 % point of a Gaussian',
    formula: '2*NA/sqrt(log(20))',
    value: shape.phix,
    unit: 'rad',
    source: SOURCE,
  });
}

function writeSingleModeFiber(
  writer: StepWriter,
  { modeFieldDiameterUm }: SingleModeFiberPath,
  shape: BeamShape,
  wavelengthNm: number,
): void {
  writer.know('lambda', wavelengthNm);
  writer.know('w_0', modeFieldDiameterUm / 2);
  writer.write({
    symbol: 'phi',
    what: 'Full divergence at the 1/e points behind a single-mode fiber; assumed: a Gaussian whose 1/e² radius is half the mode-field diameter',
    formula: 'sqrt(2)*lambda*1e-9/(pi*w_0*1e-6)',
    value: shape.phix,
    unit: 'rad',
    source: SOURCE,
  });
}

function writeLens(
  writer: StepWriter,
  { focalLengthMm, diameterAtLensMm }: LensPath,
  beam: Beam,
  shape: BeamShape,
): void {
  const { conversion, what } = widthConversion(beam);
  writer.know('f_L', focalLengthMm);
  for (const axis of axesOf(shape)) {
    const phi = axis === '_y' ? shape.phiy : shape.phix;
    knowAxis(writer, 'b_0', axis, diameterAtLensMm ?? beam.diameterMm ?? 0);
    writer.write({
      symbol: `b${axis}`,
      what: `Width of the beam at the lens${what}`,
      formula: `b_0${axis}${conversion}`,
      value: phi * focalLengthMm,
      unit: 'mm',
      source: SOURCE,
    });
    writer.write({
      symbol: `phi${axis}`,
      what: 'Full divergence beyond the focus, taken as a point',
      formula: `b${axis}/f_L`,
      value: phi,
      unit: 'rad',
      source: SOURCE,
    });
  }
}
