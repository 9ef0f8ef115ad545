import type { BeamGrowth, Beam, BeamModel, HazardCase, OnAxis, OpticalAid, Path } from './case';
import { SMALL_SOURCE, type ApparentSource } from './factors/apparent-source';
import { apertureMean, exposureOfUnitPower } from './geometry/beam-exposure';
import { beamShape, type BeamShape } from './geometry/beam-shape';
import {
  diffuseExposure,
  diffuseField,
  NEAREST_VIEW_M,
  spotSource,
  type DiffuseField,
} from './geometry/diffuse-field';
import { apparentSource, pointAt } from './limit';
import { compiledRuleSet, type CompiledRuleSet } from './limits/compiled-rule-set';
import { emissionTiming, type EmissionTiming } from './pulses/emission-timing';
import type { LimitSituation } from './pulses/limit-candidates';
import type { Side } from './result';
import { ruleSetById } from './rule-sets';

const DIRECT: Path = { kind: 'direct' };

/** A case made ready for computing: SI, defaults filled in. */
export interface Scene {
  readonly hazardCase: HazardCase;
  readonly rules: CompiledRuleSet;
  readonly path: Path;
  readonly model: BeamModel;
  readonly attenuationPerM: number;
  readonly aid: OpticalAid | undefined;
  readonly beams: readonly SceneBeam[];
}

/** One beam of a scene, with the field that it makes along the path. */
export interface SceneBeam {
  readonly beam: Beam;
  readonly timing: EmissionTiming;
  readonly field: BeamShape | DiffuseField;
  readonly source: ApparentSource;
  /** Whether an optical aid sees the source larger. */
  readonly hasSource: boolean;
}

/** The case made ready for computing. */
export function sceneOf(hazardCase: HazardCase): Scene {
  const rules = compiledRuleSet(ruleSetById(hazardCase.ruleSet));
  const path = hazardCase.path ?? DIRECT;
  const model = hazardCase.model ?? rules.ruleSet.defaultModel;
  return {
    hazardCase,
    rules,
    path,
    model,
    attenuationPerM: (hazardCase.air?.attenuationPerKm ?? 0) / 1000,
    aid: hazardCase.aid,
    beams: hazardCase.beams.map((beam) => sceneBeam(beam, path, model.growth)),
  };
}

/** The same scene with the other growth of the beams. */
export function withGrowth(scene: Scene, growth: BeamGrowth): Scene {
  const { hazardCase, rules, path, attenuationPerM, aid } = scene;
  const beams = scene.beams.map(({ beam }) => sceneBeam(beam, path, growth));
  const model = { growth, onAxis: scene.model.onAxis };
  return { hazardCase, rules, path, model, attenuationPerM, aid, beams };
}

/** What decides the limits of a beam, whose source is seen at a distance and magnified. */
export function situationOf(
  scene: Scene,
  side: Side,
  sceneBeam: SceneBeam,
  source: ApparentSource,
): LimitSituation {
  const { rules, hazardCase } = scene;
  const { emission, wavelengthNm } = sceneBeam.beam;
  const eyeS = hazardCase.exposure?.eyeS ?? sceneBeam.timing.pulseS;
  return {
    point: pointAt(rules, side, wavelengthNm, source),
    emission,
    exposureS: side === 'eye' ? eyeS : (hazardCase.exposure?.skinS ?? eyeS),
    trainRule: rules.ruleSet.pulseTrain,
    hasT2: rules.ruleSet.factors.hasT2,
  };
}

/** Whether the angle of the source, and with it the limit, changes with distance. */
export function hasSpot({ field }: SceneBeam): boolean {
  return field.kind === 'surface' && field.spotM > 0;
}

/** The source as it is seen at a distance. */
export function sourceAt(
  { field, source }: SceneBeam,
  distanceM: number,
  magnification = 1,
): ApparentSource {
  const seen = field.kind === 'surface' && field.spotM > 0 ? spotSource(field, distanceM) : source;
  if (magnification === 1) return seen;
  return { xMrad: seen.xMrad * magnification, yMrad: seen.yMrad * magnification };
}

/** Where the worst accessible exposure is, m; a diffuse spot is searched from here on. */
export function worstPlaceM({ field }: SceneBeam): number {
  return field.kind === 'surface' ? NEAREST_VIEW_M : Math.max(0, field.waistM);
}

/** Exposure averaged over an aperture, without air, in the terms of the emission. */
export function meanExposure(
  { field, timing }: SceneBeam,
  apertureM: number,
  distanceM: number,
): number {
  const ofUnitPower =
    field.kind === 'surface'
      ? diffuseExposure(field, distanceM)
      : apertureMean(field, apertureM, distanceM);
  return timing.powerOrEnergy * ofUnitPower;
}

/** Exposure of the model of the beam, without air, in the terms of the emission. */
export function modelExposure(
  { field, timing }: SceneBeam,
  onAxis: OnAxis,
  apertureM: number,
  distanceM: number,
): number {
  const ofUnitPower =
    field.kind === 'surface'
      ? diffuseExposure(field, distanceM)
      : exposureOfUnitPower(field, onAxis, apertureM, distanceM);
  return timing.powerOrEnergy * ofUnitPower;
}

function sceneBeam(beam: Beam, path: Path, growth: BeamGrowth): SceneBeam {
  return {
    beam,
    timing: emissionTiming(beam.emission),
    field: path.kind === 'diffuse' ? diffuseField(path) : beamShape(beam, path, growth),
    source: beam.sourceMrad === undefined ? SMALL_SOURCE : apparentSource(beam.sourceMrad),
    hasSource:
      beam.sourceMrad !== undefined || (path.kind === 'diffuse' && path.spotMm !== undefined),
  };
}
