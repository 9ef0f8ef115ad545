import { aidedBeam, UNAIDED, type AidedBeam } from '../aided-beam';
import type { BeamShape } from '../geometry/beam-shape';
import { widthAtLimit } from '../geometry/reach';
import { comparableLimit } from '../limit-terms';
import type { Tissue } from '../limits/compiled-rule-set';
import {
  limitCandidates,
  type LimitCandidate,
  type LimitSituation,
} from '../pulses/limit-candidates';

import {
  hasSpot,
  modelExposure,
  situationOf,
  sourceAt,
  type Scene,
  type SceneBeam,
} from '../scene';
import type { BeamHazard, SideHazard } from '../side-hazard';
import { writeFraction, writeWidths } from './beam-steps';
import { airFormula, diffuseFormula } from './exposure-steps';
import { writeAperture, writeCandidates } from './limit-steps';
import type { StepWriter } from './step-writer';

const SOURCE = 'engine:geometry';

/** Whom the steps of a distance are written for. */
export interface DistanceWriters {
  readonly scene: Scene;
  readonly hazard: SideHazard;
  /** One for each beam. */
  readonly beams: readonly StepWriter[];
  readonly all: StepWriter;
}

/** The steps to the hazard distance: solved where there is a formula, checked where there is none. */
export function writeHazardDistance(writers: DistanceWriters): void {
  const { scene, hazard, beams, all } = writers;
  const [only] = hazard.worst;
  const [writer] = beams;
  if (hazard.hazardDistanceM === 0) {
    writeNowhere(all, 'r_H');
    return;
  }
  if (hazard.worst.length === 1 && only !== undefined && writer !== undefined) {
    if (writeClosedForm(writer, scene, only, hazard.hazardDistanceM)) return;
  }
  writeRoot(writers, hazard.hazardDistanceM, 'r_H', 'Hazard distance of all beams together');
  writeCheck(writers, hazard.hazardDistanceM, 'r_H', false);
}

/** The steps to the hazard distance behind the optical aid. */
export function writeAidedDistance(writers: DistanceWriters): void {
  const { hazard, all } = writers;
  const distanceM = hazard.aidedHazardDistanceM;
  if (distanceM === undefined) return;
  if (distanceM === hazard.hazardDistanceM) {
    all.know('r_H', distanceM);
    all.write({
      symbol: 'r_A',
      what: 'Hazard distance with the optical aid: not farther than without',
      formula: 'r_H',
      value: distanceM,
      unit: 'm',
      source: 'engine:aid',
    });
    return;
  }
  writeRoot(writers, distanceM, 'r_A', 'Hazard distance with the optical aid');
  writeCheck(writers, distanceM, 'r_A', true);
}

function writeNowhere(writer: StepWriter, symbol: string): void {
  writer.write({
    symbol,
    what: 'Hazard distance: nowhere above the limit',
    formula: '0',
    value: 0,
    unit: 'm',
    source: SOURCE,
  });
}

function writeRoot(
  { all }: DistanceWriters,
  distanceM: number,
  symbol: string,
  what: string,
): void {
  all.writeNumeric({
    symbol,
    what: `${what}, found as a root; the steps after it put it into the equation`,
    formula: `root(S(${symbol})=1)`,
    value: distanceM,
    unit: 'm',
    source: SOURCE,
  });
}

/** Writes a distance that a formula yields; false when there is none. */
function writeClosedForm(
  writer: StepWriter,
  scene: Scene,
  hazard: BeamHazard,
  distanceM: number,
): boolean {
  const { sceneBeam } = hazard;
  const { field, timing } = sceneBeam;
  if (scene.attenuationPerM > 0 || hasSpot(sceneBeam)) return false;
  if (field.kind === 'beam' && !field.isCircular) return false;
  const candidate = farthestCandidate(scene, hazard, distanceM);
  const limit = writeLimitOf(writer, hazard, candidate);
  const emitted = timing.isPulsed ? 'Q' : 'Phi';
  if (field.kind === 'surface') {
    writer.write({
      symbol: 'r_H',
      what: 'Hazard distance: where the exposure equals the limit',
      formula: `sqrt(${emitted}*rho*cos(theta*pi/180)/(pi*${limit}))`,
      value: distanceM,
      unit: 'm',
      source: SOURCE,
    });
    return true;
  }
  writeWidthAtLimit(writer, scene, { candidate, sceneBeam, shape: field, limit });
  writer.write({
    symbol: 'r_H',
    what: `Hazard distance: where the beam is that wide, ${field.growth} growth`,
    formula: distanceFormula(field),
    value: distanceM,
    unit: 'm',
    source: SOURCE,
  });
  return true;
}

/** Below this the printed `log(1-x)` would lose digits that the engine keeps. */
const SMALL = 0.01;

function writeWidthAtLimit(
  writer: StepWriter,
  scene: Scene,
  {
    candidate,
    sceneBeam,
    shape,
    limit,
  }: { candidate: LimitCandidate; sceneBeam: SceneBeam; shape: BeamShape; limit: string },
): void {
  const { timing } = sceneBeam;
  const emitted = timing.isPulsed ? 'Q' : 'Phi';
  const { onAxis } = scene.model;
  const query = {
    field: shape,
    onAxis,
    apertureM: candidate.apertureM,
    powerOrEnergy: timing.powerOrEnergy,
    limit: comparableLimit(candidate),
    attenuationPerM: 0,
  };
  const isPeak = onAxis === 'peak' || shape.profile === 'top-hat';
  const fraction = (Math.PI * candidate.apertureM ** 2 * query.limit) / (4 * timing.powerOrEnergy);
  if (!isPeak) {
    writer.write({
      symbol: 'eta_H',
      what: 'Part of the beam through the aperture that makes the limit',
      formula: `pi*D_f^2*${limit}/(4*${emitted})`,
      value: fraction,
      unit: '1',
      source: SOURCE,
    });
  }
  const logarithm = fraction < SMALL ? 'log1p(-eta_H)' : 'log(1-eta_H)';
  writer.write({
    symbol: 'D_H',
    what: 'Width of the beam where the exposure equals the limit',
    formula: isPeak ? `sqrt(4*${emitted}/(pi*${limit}))` : `D_f/sqrt(-${logarithm})`,
    value: widthAtLimit(query, shape.profile),
    unit: 'm',
    source: SOURCE,
  });
}

/** What `distanceOfWidth` computes. */
function distanceFormula(shape: BeamShape): string {
  if (shape.dx === 0) return 'D_H/phi';
  const grown = '(D_H-d)*(D_H+d)';
  if (shape.growth === 'linear') {
    return shape.waistM === 0 ? '(D_H-d)/phi' : 'z+abs(z)+(D_H-d)/phi';
  }
  if (shape.waistM === 0) return `sqrt(${grown})/phi`;
  return shape.waistM > 0
    ? `z+sqrt(z^2+${grown}/phi^2)`
    : `${grown}/phi^2/(sqrt(z^2+${grown}/phi^2)-z)`;
}

/** The candidate that reaches farthest: the one that the exposure equals at the distance. */
function farthestCandidate(
  { model }: Scene,
  { sceneBeam, candidates, governing }: BeamHazard,
  distanceM: number,
): LimitCandidate {
  const ratio = ({ apertureM }: LimitCandidate, limit: number) =>
    modelExposure(sceneBeam, model.onAxis, apertureM, distanceM) / limit;
  return candidates.reduce((farthest, candidate) => {
    const isFarther =
      ratio(candidate, comparableLimit(candidate)) > ratio(farthest, comparableLimit(farthest));
    return isFarther ? candidate : farthest;
  }, governing);
}

/** Makes the limit of a candidate and its aperture known and returns the limit's formula. */
function writeLimitOf(
  writer: StepWriter,
  { situation, candidates, governing, sceneBeam }: BeamHazard,
  candidate: LimitCandidate,
): string {
  writeAperture(writer, situation, candidate);
  const isPulsed = sceneBeam.timing.isPulsed;
  if (candidate === governing) return isPulsed ? 'H_MPE' : 'E_MPE';
  const symbol = `H_${candidates.indexOf(candidate) + 1}`;
  return isPulsed ? symbol : `(${symbol}/T)`;
}

/** One beam's part of a sum, and the candidate that it comes from. */
interface Part {
  readonly beam: number;
  readonly situation: LimitSituation;
  readonly candidates: readonly LimitCandidate[];
  readonly candidate: LimitCandidate;
  readonly ratio: number;
}

/** Puts a distance into the equation: each beam's exposure over its limit, and their sum. */
function writeCheck(
  writers: DistanceWriters,
  distanceM: number,
  distance: string,
  isAided: boolean,
): void {
  const parts = partsOfLargestSum(writers, distanceM, isAided);
  for (const part of parts) {
    writePart(writers, part, { distanceM, distance, isAided });
    writers.all.know(`S_${part.beam + 1}`, part.ratio);
  }
  if (parts.length < 2) return;
  writers.all.write({
    symbol: 'S',
    what: `Sum over the beams that reach the same tissue (${parts[0]?.candidate.row.tissue ?? ''})`,
    formula: parts.map(({ beam }) => `S_${beam + 1}`).join('+'),
    value: parts.reduce((sum, { ratio }) => sum + ratio, 0),
    unit: '1',
    source: 'bgi-832:1',
  });
}

/** The parts of the tissue where the sum is largest. */
function partsOfLargestSum(
  { scene, hazard }: DistanceWriters,
  distanceM: number,
  isAided: boolean,
): Part[] {
  const byTissue = new Map<Tissue, Part[]>();
  scene.beams.forEach((sceneBeam, beam) => {
    const aided = isAided ? aidedBeam(scene, sceneBeam) : UNAIDED;
    const source = sourceAt(sceneBeam, distanceM, aided.magnification);
    const situation = situationOf(scene, hazard.side, sceneBeam, source);
    const candidates = limitCandidates(situation);
    const best = new Map<Tissue, Part>();
    const ratioOf = ratioAt(scene, sceneBeam, distanceM, aided);
    for (const candidate of candidates) {
      const ratio = ratioOf(candidate);
      const { tissue } = candidate.row;
      if (ratio > (best.get(tissue)?.ratio ?? -1)) {
        best.set(tissue, { beam, situation, candidates, candidate, ratio });
      }
    }
    for (const [tissue, part] of best)
      byTissue.set(tissue, [...(byTissue.get(tissue) ?? []), part]);
  });
  const sum = (parts: readonly Part[]) => parts.reduce((total, { ratio }) => total + ratio, 0);
  return [...byTissue.values()].reduce((a, b) => (sum(b) > sum(a) ? b : a), []);
}

/** Exposure of the beam's model over what a candidate allows, in air. */
function ratioAt(
  { model, attenuationPerM }: Scene,
  sceneBeam: SceneBeam,
  distanceM: number,
  { gain, collectingApertureM }: AidedBeam,
): (candidate: LimitCandidate) => number {
  const transmission = Math.exp(-attenuationPerM * distanceM);
  return (candidate) => {
    const gathered = collectingApertureM(candidate.apertureM);
    const exposure = modelExposure(sceneBeam, model.onAxis, gathered, distanceM);
    return (exposure * gain(candidate.apertureM) * transmission) / comparableLimit(candidate);
  };
}

function writePart(
  { scene, hazard, beams }: DistanceWriters,
  { beam, situation, candidates, candidate, ratio }: Part,
  { distanceM, distance, isAided }: { distanceM: number; distance: string; isAided: boolean },
): void {
  const writer = beams[beam];
  const sceneBeam = scene.beams[beam];
  if (writer === undefined || sceneBeam === undefined) return;
  writer.know(distance, distanceM);
  writer.know('mu', scene.attenuationPerM);
  writeCandidates(writer, scene.rules.ruleSet, situation, candidates);
  writeAperture(writer, situation, candidate);
  const gain = isAided ? writeAid(writer, scene, sceneBeam, candidate) : '';
  const exposure = writeModelExposure(writer, scene, sceneBeam, {
    distanceM,
    distance,
    apertureM: aidedAperture(scene, sceneBeam, candidate, isAided),
    isAided: gain !== '',
  });
  const air = scene.attenuationPerM > 0 ? airFormula(distance) : '';
  const time = sceneBeam.timing.isPulsed ? '' : '*T';
  writer.write({
    symbol: scene.beams.length > 1 ? `S_${beam + 1}` : 'S',
    what: `Exposure over limit at ${distance}, ${hazard.side}, ${candidate.row.tissue}`,
    formula: `${exposure}${gain}${air}${time}/H_${candidates.indexOf(candidate) + 1}`,
    value: ratio,
    unit: '1',
    source: SOURCE,
  });
}

function aidedAperture(
  scene: Scene,
  sceneBeam: SceneBeam,
  { apertureM }: LimitCandidate,
  isAided: boolean,
): number {
  return isAided ? aidedBeam(scene, sceneBeam).collectingApertureM(apertureM) : apertureM;
}

/** Writes what the aid gathers; returns what it does to the exposure, '' where it does nothing. */
function writeAid(
  writer: StepWriter,
  scene: Scene,
  sceneBeam: SceneBeam,
  { apertureM }: LimitCandidate,
): string {
  const aided = aidedBeam(scene, sceneBeam);
  if (scene.aid === undefined || aided === UNAIDED) return '';
  writer.know('D_obj', scene.aid.objectiveMm * 1e-3);
  writer.know('M', scene.aid.magnification);
  writer.know('tau', scene.aid.transmission);
  writer.write({
    symbol: 'D_c',
    what: 'What the optical aid gathers from',
    formula: 'min(D_obj,M*D_f)',
    value: aided.collectingApertureM(apertureM),
    unit: 'm',
    source: 'engine:aid',
  });
  writer.write({
    symbol: 'G',
    what: 'Gain of the optical aid for a wide beam',
    formula: 'tau*(D_c/D_f)^2',
    value: aided.gain(apertureM),
    unit: '1',
    source: 'engine:aid',
  });
  return '*G';
}

/** Writes the exposure of the beam's model at a distance and returns its formula. */
function writeModelExposure(
  writer: StepWriter,
  { model }: Scene,
  { field, timing }: SceneBeam,
  {
    distanceM,
    distance,
    apertureM,
    isAided,
  }: { distanceM: number; distance: string; apertureM: number; isAided: boolean },
): string {
  const emitted = timing.isPulsed ? 'Q' : 'Phi';
  if (field.kind === 'surface') return `${emitted}*${diffuseFormula(field, distance)}`;
  writeWidths(writer, field, distanceM, distance);
  if (model.onAxis === 'peak') {
    const area = field.isCircular ? 'D^2' : 'D_x*D_y';
    return `${emitted}*4/(pi*${area})`;
  }
  const symbol = isAided ? 'D_c' : 'D_f';
  writeFraction(writer, field, distanceM, { symbol, apertureM });
  return `${emitted}*eta/(pi*${symbol}^2/4)`;
}
