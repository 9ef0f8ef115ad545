import { T2_LARGEST_MRAD } from './factors/break-time-t2';
import { ALPHA_MIN_MRAD } from './factors/apparent-source';
import { alphaMax, gammaPh } from './limits/row-reading';
import { limitCandidates } from './pulses/limit-candidates';
import type { Side } from './result';
import { situationOf, sourceAt, type Scene, type SceneBeam } from './scene';

/**
 * The distances from a lit spot at which a limit steps or bends: where the spot is seen under an
 * angle at which a table or a factor changes.
 */
export function spotBreakpoints(
  scene: Scene,
  side: Side,
  sceneBeam: SceneBeam,
  magnification: number,
): number[] {
  const { field } = sceneBeam;
  if (field.kind === 'beam' || side === 'skin') return [];
  const { spotM, cosine } = field;
  const axes = [1, cosine, (1 + cosine) / 2];
  return criticalAngles(scene, side, sceneBeam).flatMap((angleMrad) =>
    axes.map((axis) => (spotM * axis * magnification * 1e3) / angleMrad),
  );
}

function criticalAngles(scene: Scene, side: Side, sceneBeam: SceneBeam): number[] {
  const situation = situationOf(scene, side, sceneBeam, sourceAt(sceneBeam, 1));
  const { point, exposureS } = situation;
  if (!point.band.isRetinal) return [];
  const { factors } = scene.rules.ruleSet;
  const durations = new Set(limitCandidates(situation).map(({ durationS }) => durationS));
  const printed = [
    ...factors.CP.flatMap((row) => row.sourceMrad ?? []),
    ...scene.rules.ruleSet.eyeExtendedSource.flatMap((row) => row.sourceMrad ?? []),
  ].filter((edge) => typeof edge === 'number');
  const ofDurations = [...durations].flatMap((t) => [alphaMax(point, t), gammaPh(point, t)]);
  const angles = [ALPHA_MIN_MRAD, T2_LARGEST_MRAD, ...printed, ...ofDurations];
  return [...angles, ...anglesOfT2(exposureS)].filter((angle) => angle > 0 && angle < Infinity);
}

/**
 * The angles at which T_2 equals the exposure duration: of both axes, or of one while the other is
 * held at the smallest or the largest angle.
 */
function anglesOfT2(exposureS: number): number[] {
  if (!(exposureS > 10 && exposureS < 100)) return [];
  const mean = ALPHA_MIN_MRAD + 98.5 * Math.log10(exposureS / 10);
  return [mean, 2 * mean - ALPHA_MIN_MRAD, 2 * mean - T2_LARGEST_MRAD];
}
