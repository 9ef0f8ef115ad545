import type { HazardCase } from './case';
import { largestTissueSum, type LimitTerm } from './limit-terms';
import { hasSpot, modelExposure, sceneOf, sourceAt, type Scene, type SceneBeam } from './scene';
import { aidedShares, aidedTerms, modelShares, sideHazard, termsAt } from './side-hazard';
import type { Side } from './result';

/** The exposure of one beam: W/m² of a CW beam, J/m² of one pulse otherwise. */
export type CurveExposure =
  { readonly irradianceWPerM2: number } | { readonly radiantExposureJPerM2: number };

/** What reaches a person at one distance, by the case's model of the beam and its air. */
export interface CurvePoint {
  readonly distanceM: number;
  /** The largest sum of exposure over limit on a tissue of the eye; 1 at the hazard distance. */
  readonly eyeRatio: number;
  readonly skinRatio: number;
  /** Through the optical aid, when the case has one; never below the naked eye's. */
  readonly aidedRatio?: number;
  /** Averaged over the aperture of the eye's governing limit, or the peak, as the model says. */
  readonly beams: readonly CurveExposure[];
}

/**
 * The exposure at many distances, for drawing. Limits that do not depend on distance are read once.
 *
 * @param hazardCase a case that `parseCase` has accepted.
 * @param distancesM above 0.
 */
export function exposureCurve(hazardCase: HazardCase, distancesM: readonly number[]): CurvePoint[] {
  const scene = sceneOf(hazardCase);
  const eye = termsReader(scene, 'eye');
  const skin = termsReader(scene, 'skin');
  const aided = scene.beams.map((beam) => (hasSpot(beam) ? undefined : aidedTerms(scene, beam, 1)));
  const apertures = sideHazard(scene, 'eye').worst.map(({ governing }) => governing.apertureM);
  return distancesM.map((distanceM): CurvePoint => {
    const eyeRatio = largestTissueSum(
      scene.beams.map((beam, i) => modelShares(scene, beam, eye(beam, i, distanceM), distanceM)),
    );
    const skinRatio = largestTissueSum(
      scene.beams.map((beam, i) => modelShares(scene, beam, skin(beam, i, distanceM), distanceM)),
    );
    const beams = scene.beams.map((beam, i) =>
      curveExposure(scene, beam, apertures[i] as number, distanceM),
    );
    if (scene.aid === undefined) return { distanceM, eyeRatio, skinRatio, beams };
    const throughAid = largestTissueSum(
      scene.beams.map((beam, i) =>
        aidedShares(scene, beam, aided[i] ?? aidedTerms(scene, beam, distanceM), distanceM),
      ),
    );
    return { distanceM, eyeRatio, skinRatio, aidedRatio: Math.max(eyeRatio, throughAid), beams };
  });
}

/** Reads the limits of a beam: once, or at every distance where a lit spot shrinks with it. */
function termsReader(scene: Scene, side: Side) {
  const fixed = scene.beams.map((beam) =>
    hasSpot(beam) ? undefined : termsAt(scene, side, beam, beam.source),
  );
  return (beam: SceneBeam, i: number, distanceM: number): readonly LimitTerm[] =>
    fixed[i] ?? termsAt(scene, side, beam, sourceAt(beam, distanceM));
}

function curveExposure(
  scene: Scene,
  beam: SceneBeam,
  apertureM: number,
  distanceM: number,
): CurveExposure {
  const transmission = Math.exp(-scene.attenuationPerM * distanceM);
  const exposure = modelExposure(beam, scene.model.onAxis, apertureM, distanceM) * transmission;
  return beam.timing.isPulsed
    ? { radiantExposureJPerM2: exposure }
    : { irradianceWPerM2: exposure };
}
