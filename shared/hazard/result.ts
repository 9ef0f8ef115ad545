import type { RuleSetId } from './rule-sets';

/** What a limit protects against. */
export type Mechanism = 'thermal' | 'photochemical' | 'corneal';

/** The rule by which a limit applies to the emission. */
export type LimitRule = 'continuous' | 'single-pulse' | 'average' | 'pulse-train';

/** The two things a beam can reach. */
export type Side = 'eye' | 'skin';

/** The numbers that a limit was read with; only those that were used. */
export interface Factors {
  CA?: number;
  CB?: number;
  CC?: number;
  CE?: number;
  CP?: number;
  KL?: number;
  C2?: number;
  T1S?: number;
  T2S?: number;
  alphaMaxMrad?: number;
  gammaPhMrad?: number;
  /** Pulses counted by the rule. */
  pulses?: number;
  /** Consecutive pulses that count as one. */
  pulsesInGroup?: number;
}

/** One limit that was considered. */
export interface LimitCandidate {
  rule: LimitRule;
  mechanism: Mechanism;
  /** In the terms of `unit`: over the exposure, or per pulse. */
  value: number;
  unit: 'J/m2';
  durationS: number;
  limitingApertureMm: number;
  /** The worst exposure over this candidate's aperture, divided by the candidate. */
  exposureToLimit: number;
  /** As printed in its table, with the rule's own factor. */
  formula: string;
  source: string;
}

/** The governing limit of one beam. */
export interface BeamLimit {
  /** CW: over the exposure duration; pulsed: per pulse. */
  radiantExposureJPerM2: number;
  /** CW: mean; repetitive: per pulse times rate; single: per pulse over pulse duration. */
  irradianceWPerM2: number;
  /** The duration that the limit was read at. */
  durationS: number;
  rule: LimitRule;
  mechanism: Mechanism;
  limitingApertureMm: number;
  factors: Factors;
  /** Left out of a bare evaluation. */
  candidates?: LimitCandidate[];
}

/** An exposure in the terms of its limit. */
export interface BeamExposure {
  radiantExposureJPerM2: number;
  irradianceWPerM2: number;
  distanceM: number;
}

/** One beam against one side. */
export interface BeamResult {
  label?: string;
  wavelengthNm: number;
  photonEnergyJ: number;
  photonEnergyEv: number;
  frequencyHz: number;
  mpe: BeamLimit;
  /** The worst accessible exposure, averaged over the limiting aperture. */
  exposure: BeamExposure;
  /** log10(exposure / mpe), 0 when below. */
  opticalDensity: number;
  /** At the distance of `at`. */
  at?: BeamExposure & { opticalDensity: number };
}

/** Eye or skin. */
export interface SideResult {
  perBeam: BeamResult[];
  /** All beams together, m; 0 when nowhere above the limit. */
  hazardDistanceM: number;
  /** The largest of one beam, and of all beams on the tissue where they add up most. */
  opticalDensity: number;
  at?: { opticalDensity: number };
  aidedHazardDistanceM?: number;
}

/**
 * One step of the derivation. `formula` and `substituted` are plain infix mathematics: + - * / ^,
 * exp, expm1, log (natural), log1p, log10, sqrt, min, max, ceil, abs, cos and pi; `substituted`
 * evaluates to `value`.
 */
export interface Step {
  symbol: string;
  what: string;
  formula: string;
  substituted: string;
  value: number;
  unit: string;
  source: string;
  side: Side;
  /** Index of the beam; without it the step is about all beams. */
  beam?: number;
}

/** Something the reader of a result must know. */
export type WarningCode =
  | 'outside-validity'
  | 'assumption'
  | 'extrapolated'
  | 'low-confidence-row'
  | 'superseded-edition'
  | 'growth-model'
  | 'below-diffraction-limit';

/** A warning with its sentence. */
export interface Warning {
  code: WarningCode;
  text: string;
}

/** What `evaluate` answers to a case that it can evaluate. */
export interface EvaluationResult {
  id?: string;
  ruleSet: RuleSetId;
  edition: string;
  engineVersion: string;
  eye: SideResult;
  skin: SideResult;
  distances: { hazardDistanceM: { eye: number; skin: number } };
  /** Left out of a bare evaluation. */
  steps?: Step[];
  warnings: Warning[];
  cautions: readonly string[];
}

/** One thing that is wrong with a case. */
export interface FieldError {
  /** Such as `beams[0].emission.powerW`. */
  path: string;
  message: string;
  /** What may stand there. */
  allowed: string;
}

/** What `evaluate` answers to a case that it cannot evaluate. */
export interface EvaluationErrors {
  id?: string;
  errors: FieldError[];
}
