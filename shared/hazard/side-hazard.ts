import type { ApparentSource } from './factors/apparent-source';
import { aidedBeam, UNAIDED, type AidedBeam } from './aided-beam';
import { reach } from './geometry/reach';
import {
  comparableLimit,
  largestTissueSum,
  limitTerms,
  type LimitTerm,
  type TissueShare,
} from './limit-terms';
import { largestReach, spread } from './numeric/largest-reach';
import { maximum } from './numeric/maximum';
import {
  limitCandidates,
  type LimitCandidate,
  type LimitSituation,
} from './pulses/limit-candidates';
import type { Side } from './result';
import {
  hasSpot,
  meanExposure,
  modelExposure,
  situationOf,
  sourceAt,
  worstPlaceM,
  type Scene,
  type SceneBeam,
} from './scene';
import { spotBreakpoints } from './spot-breakpoints';

/** One beam against the limits of one side, at one distance. */
export interface BeamHazard {
  readonly sceneBeam: SceneBeam;
  readonly situation: LimitSituation;
  readonly candidates: readonly LimitCandidate[];
  /** The candidate that the exposure exceeds most, or comes closest to. */
  readonly governing: LimitCandidate;
  readonly distanceM: number;
  /** Averaged over the aperture of the governing candidate: W/m² for CW, J/m² otherwise. */
  readonly exposure: number;
  /** What is left of the beam in air. */
  readonly transmission: number;
  /** Exposure over limit. */
  readonly ratio: number;
}

/** All beams of a scene against the limits of one side. */
export interface SideHazard {
  readonly side: Side;
  /** At the worst accessible place. */
  readonly worst: readonly BeamHazard[];
  /** At the distance of the case's `at`. */
  readonly at: readonly BeamHazard[] | undefined;
  readonly hazardDistanceM: number;
  readonly aidedHazardDistanceM: number | undefined;
}

/** Computes everything about one side. */
export function sideHazard(scene: Scene, side: Side): SideHazard {
  const worst = scene.beams.map((beam) => worstBeamHazard(scene, side, beam));
  const atM = scene.hazardCase.at?.distanceM;
  const hazardDistanceM = reachOfSide(scene, side, worst);
  return {
    side,
    worst,
    at: atM === undefined ? undefined : worst.map((hazard) => hazardAt(scene, side, hazard, atM)),
    hazardDistanceM,
    aidedHazardDistanceM:
      scene.aid === undefined || side === 'skin'
        ? undefined
        : Math.max(hazardDistanceM, aidedHazardDistance(scene)),
  };
}

/** Limits of a beam whose source is seen from a distance, against the exposure there. */
function beamHazard(
  situation: LimitSituation,
  sceneBeam: SceneBeam,
  distanceM: number,
  transmission: number,
): BeamHazard {
  const candidates = limitCandidates(situation);
  let governing = candidates[0] as LimitCandidate;
  let exposure = 0;
  let ratio = -1;
  for (const candidate of candidates) {
    const ofCandidate = meanExposure(sceneBeam, candidate.apertureM, distanceM) * transmission;
    const ratioOfCandidate = ofCandidate / comparableLimit(candidate);
    if (ratioOfCandidate > ratio) {
      governing = candidate;
      exposure = ofCandidate;
      ratio = ratioOfCandidate;
    }
  }
  return {
    sceneBeam,
    situation,
    candidates,
    governing,
    distanceM,
    exposure,
    transmission,
    ratio,
  };
}

/** How much of each tissue's limits the beam uses up, candidate by candidate. */
export function sharesOf({
  sceneBeam,
  candidates,
  distanceM,
  transmission,
}: BeamHazard): TissueShare[] {
  return candidates.map((candidate) => ({
    tissue: candidate.row.tissue,
    ratio:
      (meanExposure(sceneBeam, candidate.apertureM, distanceM) * transmission) /
      comparableLimit(candidate),
  }));
}

function worstBeamHazard(scene: Scene, side: Side, sceneBeam: SceneBeam): BeamHazard {
  const distanceM = hasSpot(sceneBeam)
    ? worstDistanceOfSpot(scene, side, sceneBeam)
    : worstPlaceM(sceneBeam);
  const source = sourceAt(sceneBeam, distanceM);
  return beamHazard(situationOf(scene, side, sceneBeam, source), sceneBeam, distanceM, 1);
}

function hazardAt(
  scene: Scene,
  side: Side,
  { sceneBeam, situation }: BeamHazard,
  distanceM: number,
): BeamHazard {
  const there = hasSpot(sceneBeam)
    ? situationOf(scene, side, sceneBeam, sourceAt(sceneBeam, distanceM))
    : situation;
  const transmission = Math.exp(-scene.attenuationPerM * distanceM);
  return beamHazard(there, sceneBeam, distanceM, transmission);
}

/** Where exposure over limit is largest, from the nearest viewing distance on, m. */
function worstDistanceOfSpot(scene: Scene, side: Side, sceneBeam: SceneBeam): number {
  const nearestM = worstPlaceM(sceneBeam);
  const edges = spotBreakpoints(scene, side, sceneBeam, 1).filter((edge) => edge > nearestM);
  const stretches = [nearestM, ...edges.sort((a, b) => a - b)];
  const last = stretches.at(-1) as number;
  // Beyond the last breakpoint the source is small and the ratio only falls.
  stretches.push(4 * last);
  const ratio = (distanceM: number) => {
    const situation = situationOf(scene, side, sceneBeam, sourceAt(sceneBeam, distanceM));
    return beamHazard(situation, sceneBeam, distanceM, 1).ratio;
  };
  const points = stretches.flatMap((from, i) => {
    const to = stretches[i + 1];
    return to === undefined ? [] : [maximum(ratio, spread(from, to))];
  });
  return points.reduce((best, point) => (ratio(point) > ratio(best) ? point : best), nearestM);
}

/**
 * The largest distance at which the beams of a scene reach a limit of a side, m; 0 when nowhere.
 *
 * @param worst the limits of the same beams at their worst places.
 */
export function reachOfSide(scene: Scene, side: Side, worst: readonly BeamHazard[]): number {
  const { beams } = scene;
  const [only] = beams;
  if (beams.length === 1 && only !== undefined && !hasSpot(only)) {
    return reachOfBeam(scene, only, (worst[0] as BeamHazard).candidates, UNAIDED);
  }
  const fixed = worst.map(({ sceneBeam, candidates }) =>
    hasSpot(sceneBeam) ? undefined : limitTerms(candidates),
  );
  const breakpoints = beams.flatMap((sceneBeam) => breakpointsOf(scene, side, sceneBeam, 1));
  return largestReach((distanceM) => {
    const shares = beams.map((sceneBeam, i) => {
      const terms = fixed[i] ?? termsAt(scene, side, sceneBeam, sourceAt(sceneBeam, distanceM));
      return modelShares(scene, sceneBeam, terms, distanceM);
    });
    return largestTissueSum(shares);
  }, breakpoints);
}

/** The reach of one beam whose limits do not depend on distance, m. */
function reachOfBeam(
  scene: Scene,
  { field, timing }: SceneBeam,
  candidates: readonly LimitCandidate[],
  { gain, collectingApertureM }: AidedBeam,
): number {
  let farthest = 0;
  for (const candidate of candidates) {
    const { apertureM } = candidate;
    const limit = comparableLimit(candidate);
    if (isUndercut(candidate, limit, candidates)) continue;
    const distanceM = reach({
      field,
      onAxis: scene.model.onAxis,
      apertureM: collectingApertureM(apertureM),
      powerOrEnergy: timing.powerOrEnergy * gain(apertureM),
      limit,
      attenuationPerM: scene.attenuationPerM,
    });
    if (distanceM > farthest) farthest = distanceM;
  }
  return farthest;
}

/** Whether another candidate over the same aperture allows less; it reaches farther then. */
function isUndercut(
  { apertureM }: LimitCandidate,
  limit: number,
  candidates: readonly LimitCandidate[],
): boolean {
  for (const other of candidates) {
    if (other.apertureM === apertureM && comparableLimit(other) < limit) return true;
  }
  return false;
}

function aidedHazardDistance(scene: Scene): number {
  const { beams } = scene;
  const [only] = beams;
  if (beams.length === 1 && only !== undefined && !hasSpot(only)) {
    const aided = aidedBeam(scene, only);
    const source = sourceAt(only, 1, aided.magnification);
    const candidates = limitCandidates(situationOf(scene, 'eye', only, source));
    return reachOfBeam(scene, only, candidates, aided);
  }
  const breakpoints = beams.flatMap((sceneBeam) =>
    breakpointsOf(scene, 'eye', sceneBeam, aidedBeam(scene, sceneBeam).magnification),
  );
  const fixed = beams.map((sceneBeam) =>
    hasSpot(sceneBeam) ? undefined : aidedTerms(scene, sceneBeam, 1),
  );
  return largestReach((distanceM) => {
    const shares = beams.map((sceneBeam, i) =>
      aidedShares(scene, sceneBeam, fixed[i] ?? aidedTerms(scene, sceneBeam, distanceM), distanceM),
    );
    return largestTissueSum(shares);
  }, breakpoints);
}

/** The limits of a beam that is looked at through the optical aid. */
export function aidedTerms(scene: Scene, sceneBeam: SceneBeam, distanceM: number): LimitTerm[] {
  const { magnification } = aidedBeam(scene, sceneBeam);
  return termsAt(scene, 'eye', sceneBeam, sourceAt(sceneBeam, distanceM, magnification));
}

/** The limits of a beam whose source is seen at an angle. */
export function termsAt(
  scene: Scene,
  side: Side,
  sceneBeam: SceneBeam,
  source: ApparentSource,
): LimitTerm[] {
  return limitTerms(limitCandidates(situationOf(scene, side, sceneBeam, source)));
}

/** Shares of the exposure of the beam's model, in air. */
export function modelShares(
  scene: Scene,
  sceneBeam: SceneBeam,
  terms: readonly LimitTerm[],
  distanceM: number,
): TissueShare[] {
  const { onAxis } = scene.model;
  const transmission = Math.exp(-scene.attenuationPerM * distanceM);
  return terms.map(({ tissue, apertureM, limit }) => ({
    tissue,
    ratio: (modelExposure(sceneBeam, onAxis, apertureM, distanceM) * transmission) / limit,
  }));
}

/** Shares of the exposure behind the optical aid, in air. */
export function aidedShares(
  scene: Scene,
  sceneBeam: SceneBeam,
  terms: readonly LimitTerm[],
  distanceM: number,
): TissueShare[] {
  const { onAxis } = scene.model;
  const { gain, collectingApertureM } = aidedBeam(scene, sceneBeam);
  const transmission = Math.exp(-scene.attenuationPerM * distanceM);
  return terms.map(({ tissue, apertureM, limit }) => {
    const exposure = modelExposure(sceneBeam, onAxis, collectingApertureM(apertureM), distanceM);
    return { tissue, ratio: (exposure * gain(apertureM) * transmission) / limit };
  });
}

/** Optical density of all beams: of the tissue where they add up most; 0 when below. */
export function combinedDensity(beams: readonly BeamHazard[]): number {
  const [only] = beams;
  if (beams.length === 1 && only !== undefined) return opticalDensity(only.ratio);
  return opticalDensity(largestTissueSum(beams.map(sharesOf)));
}

/** log10 of exposure over limit, 0 when below. */
export function opticalDensity(ratio: number): number {
  return ratio > 1 ? Math.log10(ratio) : 0;
}

/** Distances at which limits step or the beam turns. */
function breakpointsOf(
  scene: Scene,
  side: Side,
  sceneBeam: SceneBeam,
  magnification: number,
): number[] {
  if (hasSpot(sceneBeam)) return spotBreakpoints(scene, side, sceneBeam, magnification);
  const { field } = sceneBeam;
  return field.kind === 'beam' && field.waistM > 0 ? [field.waistM] : [];
}
