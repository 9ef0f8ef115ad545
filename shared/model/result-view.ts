import type { Beam, HazardCase } from '../hazard/case';
import { evaluate } from '../hazard/evaluate';
import type { BeamExposure, BeamLimit, BeamResult, EvaluationResult, Side } from '../hazard/result';
import { isEvaluated } from './evaluation-case';

/** One line of a case, with its share in the result and with its reach when it is on alone. */
export interface LineView {
  readonly beam: Beam;
  readonly eye: BeamResult;
  readonly skin: BeamResult;
  readonly eyeAloneM: number;
  readonly skinAloneM: number;
}

/** A case with its result, as screen and report lay it out. */
export interface ResultView {
  readonly case: HazardCase;
  readonly result: EvaluationResult;
  readonly lines: readonly LineView[];
}

/** A limit or an exposure in the terms that its line is read in. */
export interface LimitFigure {
  readonly value: number;
  readonly unit: 'W/m²' | 'J/m²';
  /** "per pulse", or empty. */
  readonly per: string;
}

export function resultView(hazardCase: HazardCase, result: EvaluationResult): ResultView {
  const lines = hazardCase.beams.map((beam, index) => {
    const alone = aloneOf(hazardCase, result, beam);
    return {
      beam,
      eye: result.eye.perBeam[index] as BeamResult,
      skin: result.skin.perBeam[index] as BeamResult,
      eyeAloneM: alone.eye.hazardDistanceM,
      skinAloneM: alone.skin.hazardDistanceM,
    };
  });
  return { case: hazardCase, result, lines };
}

function aloneOf(hazardCase: HazardCase, result: EvaluationResult, beam: Beam): EvaluationResult {
  if (hazardCase.beams.length === 1) return result;
  const alone = evaluate({ ...hazardCase, beams: [beam] }, { bare: true });
  // A line of a case that was evaluated is itself a case that can be.
  if (!isEvaluated(alone)) throw new Error('A line of an evaluated case could not be evaluated.');
  return alone;
}

/** The line that asks for the highest optical density; the first of equals. */
export function governingLine(view: ResultView, side: Side): LineView {
  return view.lines.reduce((most, line) =>
    ratioOf(line[side]) > ratioOf(most[side]) ? line : most,
  );
}

/** Exposure divided by limit, which orders lines below the limit too. */
export function ratioOf({ exposure, mpe }: BeamResult): number {
  return exposure.radiantExposureJPerM2 / mpe.radiantExposureJPerM2;
}

/** CW by irradiance, pulses by the radiant exposure of one. */
export function limitFigure(beam: Beam, limit: BeamLimit | BeamExposure): LimitFigure {
  if (beam.emission.mode === 'cw') {
    return { value: limit.irradianceWPerM2, unit: 'W/m²', per: '' };
  }
  const per = beam.emission.mode === 'single' ? '' : 'per pulse';
  return { value: limit.radiantExposureJPerM2, unit: 'J/m²', per };
}

/** Whether every line has the same limit, so that one figure says it for all. */
export function haveOneLimit(view: ResultView, side: Side): boolean {
  const first = view.lines[0]?.[side].mpe;
  return view.lines.every(
    (line) =>
      line[side].mpe.irradianceWPerM2 === first?.irradianceWPerM2 &&
      line[side].mpe.mechanism === first.mechanism,
  );
}

/** Mean power of all lines together; undefined when one of them is a single pulse. */
export function totalPowerW(view: ResultView): number | undefined {
  let sum = 0;
  for (const { beam } of view.lines) {
    const powerW = meanPowerW(beam);
    if (powerW === undefined) return undefined;
    sum += powerW;
  }
  return sum;
}

function meanPowerW({ emission }: Beam): number | undefined {
  switch (emission.mode) {
    case 'cw':
      return emission.powerW;
    case 'single':
      return undefined;
    case 'repetitive':
      return emission.pulseEnergyJ * emission.repetitionRateHz;
    case 'burst':
      return emission.pulseEnergyJ * emission.pulsesPerBurst * emission.burstRateHz;
  }
}

/** The reach of a result, as the strip draws it. */
export function reachOf(view: ResultView, wallDistanceM: number | undefined) {
  const { eye, skin } = view.result;
  return {
    eyeDistanceM: eye.hazardDistanceM,
    skinDistanceM: skin.hazardDistanceM,
    ...(eye.aidedHazardDistanceM === undefined ? {} : { aidedDistanceM: eye.aidedHazardDistanceM }),
    ...(wallDistanceM === undefined ? {} : { wallDistanceM }),
    ...(view.lines.length > 1
      ? {
          lines: view.lines.map(({ beam, eyeAloneM }) => ({
            wavelengthNm: beam.wavelengthNm,
            eyeDistanceM: eyeAloneM,
          })),
        }
      : {}),
  };
}
