import type { RuleSetId } from './rows';

type Pair = number | readonly [number, number];

export type Emission =
  | { readonly mode: 'cw'; readonly powerW: number }
  | { readonly mode: 'single'; readonly pulseEnergyJ: number; readonly pulseDurationS: number }
  | {
      readonly mode: 'repetitive';
      readonly pulseEnergyJ: number;
      readonly pulseDurationS: number;
      readonly repetitionRateHz: number;
    }
  | {
      readonly mode: 'burst';
      readonly pulseEnergyJ: number;
      readonly pulseDurationS: number;
      readonly pulsesPerBurst: number;
      readonly intraBurstRateHz: number;
      readonly burstRateHz: number;
    };

export interface ModelBeam {
  readonly label?: string;
  readonly wavelengthNm: number;
  readonly emission: Emission;
  readonly diameterMm?: Pair;
  readonly divergenceMrad?: Pair;
  readonly width?: '1/e' | '1/e2';
  readonly profile?: 'gaussian' | 'top-hat';
  readonly sourceMrad?: Pair;
  readonly waistDistanceM?: number;
}

export type ModelPath =
  | { readonly kind: 'direct' }
  | { readonly kind: 'lens'; readonly focalLengthMm: number; readonly diameterAtLensMm?: number }
  | { readonly kind: 'fiber'; readonly numericalAperture: number }
  | { readonly kind: 'fiber'; readonly modeFieldDiameterUm: number }
  | {
      readonly kind: 'diffuse';
      readonly reflectance: number;
      readonly angleDeg: number;
      readonly spotMm?: number;
    };

export interface Aid {
  readonly objectiveMm: number;
  readonly magnification: number;
  readonly transmission: number;
}

/** The cases the model understands: a subset of what the engine takes. */
export interface ModelCase {
  readonly ruleSet: RuleSetId;
  readonly beams: readonly ModelBeam[];
  readonly exposure: { readonly eyeS: number; readonly skinS?: number };
  readonly path?: ModelPath;
  readonly aid?: Aid;
  readonly air?: { readonly attenuationPerKm: number };
  readonly model?: {
    readonly growth: 'hyperbolic' | 'linear';
    readonly onAxis: 'peak' | 'aperture-mean';
  };
  readonly at?: { readonly distanceM: number };
}

export function axes(value: Pair): readonly [number, number] {
  return typeof value === 'number' ? [value, value] : value;
}
