import type { RuleSetId } from './rule-sets';

/** One number for both axes, or the values of the x and the y axis. */
export type PerAxis = number | readonly [x: number, y: number];

/** Emission without a break: the mean power, W. */
export interface ContinuousEmission {
  readonly mode: 'cw';
  readonly powerW: number;
}

/** One pulse and no other within the exposure. */
export interface SinglePulseEmission {
  readonly mode: 'single';
  readonly pulseEnergyJ: number;
  readonly pulseDurationS: number;
}

/** Equal pulses at a constant rate. */
export interface RepetitiveEmission {
  readonly mode: 'repetitive';
  readonly pulseEnergyJ: number;
  readonly pulseDurationS: number;
  readonly repetitionRateHz: number;
}

/** Bursts of equal pulses, the bursts at a constant rate. */
export interface BurstEmission {
  readonly mode: 'burst';
  readonly pulseEnergyJ: number;
  readonly pulseDurationS: number;
  readonly pulsesPerBurst: number;
  readonly intraBurstRateHz: number;
  readonly burstRateHz: number;
}

/** How the light is emitted in time. */
export type Emission =
  ContinuousEmission | SinglePulseEmission | RepetitiveEmission | BurstEmission;

/** The point of a Gaussian at which diameters and divergences are given. */
export type WidthCriterion = '1/e' | '1/e2';

/** The shape of the irradiance across the beam. */
export type BeamProfile = 'gaussian' | 'top-hat';

/**
 * One beam. `width` governs every diameter and divergence of a Gaussian; a top-hat has full
 * widths. What the path does not use may be left out and is ignored when given.
 */
export interface Beam {
  readonly label?: string;
  /** Vacuum wavelength, nm, from 180 to 1 000 000. */
  readonly wavelengthNm: number;
  readonly emission: Emission;
  /** At the exit (the waist, unless `waistDistanceM` is given), mm. */
  readonly diameterMm?: PerAxis;
  /** Full angle in the far field, mrad. */
  readonly divergenceMrad?: PerAxis;
  readonly width?: WidthCriterion;
  readonly profile?: BeamProfile;
  /** Angle that the apparent source subtends, mrad; without it the source is small. */
  readonly sourceMrad?: PerAxis;
  /** Where the waist lies, m from the exit, positive ahead. */
  readonly waistDistanceM?: number;
  /** Beam propagation ratio M²; enters only the diffraction warning. */
  readonly m2?: number;
}

/** How long eye and skin are exposed, s, in (0, 30 000]. */
export interface Exposure {
  readonly eyeS: number;
  /** Defaults to `eyeS`. */
  readonly skinS?: number;
}

/** The beam itself. */
export interface DirectPath {
  readonly kind: 'direct';
}

/** Beyond the focus of a lens. Distances count from the focus. */
export interface LensPath {
  readonly kind: 'lens';
  readonly focalLengthMm: number;
  readonly diameterAtLensMm?: number;
}

/** From the end of a multimode fiber. */
export interface MultimodeFiberPath {
  readonly kind: 'fiber';
  readonly numericalAperture: number;
}

/** From the end of a single-mode fiber. */
export interface SingleModeFiberPath {
  readonly kind: 'fiber';
  readonly modeFieldDiameterUm: number;
}

/** Back from a matt surface. Distances count from the lit spot. */
export interface DiffusePath {
  readonly kind: 'diffuse';
  /** In (0, 1]. */
  readonly reflectance: number;
  /** Between the surface normal and the viewer, degrees, in [0, 90). */
  readonly angleDeg: number;
  readonly spotMm?: number;
}

/** The way from the laser to the person. */
export type Path = DirectPath | LensPath | MultimodeFiberPath | SingleModeFiberPath | DiffusePath;

/** Binoculars, a telescope or a loupe in front of the eye. */
export interface OpticalAid {
  readonly objectiveMm: number;
  readonly magnification: number;
  /** In (0, 1]. */
  readonly transmission: number;
}

/** How the beam's width grows with distance. */
export type BeamGrowth = 'hyperbolic' | 'linear';

/** Which exposure of the beam is compared with a limit to find a distance. */
export type OnAxis = 'peak' | 'aperture-mean';

/** The model of the beam; each rule set has its default. */
export interface BeamModel {
  readonly growth: BeamGrowth;
  readonly onAxis: OnAxis;
}

/** A case as it is given: everything that decides the result, in SI with the unit in the name. */
export interface HazardCase {
  readonly id?: string;
  readonly ruleSet: RuleSetId;
  readonly beams: readonly Beam[];
  /** May be left out when every beam is a single pulse. */
  readonly exposure?: Exposure;
  /** Defaults to the direct beam. */
  readonly path?: Path;
  readonly aid?: OpticalAid;
  /** Natural attenuation coefficient of the air, 1/km. */
  readonly air?: { readonly attenuationPerKm: number };
  readonly model?: BeamModel;
  /** Also report exposure and optical density at this distance. */
  readonly at?: { readonly distanceM: number };
}
