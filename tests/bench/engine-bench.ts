import { evaluate } from '@shared/hazard/evaluate';
import { exposureLimit } from '@shared/hazard/limit';
import type { EvaluationResult } from '@shared/hazard/result';
import { callsPerSecond } from './calls-per-second';

/** The speed of the engine in calls a second, and of the formula that it is measured against. */
export interface EngineSpeed {
  /** One simple limit and one optical density, written out by hand. */
  readonly floorPerS: number;
  readonly limitPerS: number;
  readonly barePerS: number;
  readonly withStepsPerS: number;
}

const INPUTS = 1024;
const WAVELENGTHS_NM = Float64Array.from({ length: INPUTS }, (_, i) => 400 + (i * 299) / INPUTS);
const DURATIONS_S = Float64Array.from({ length: INPUTS }, (_, i) => 1e-4 * 1e4 ** (i / INPUTS));

const CASES = Array.from({ length: INPUTS }, (_, i) => ({
  ruleSet: 'ansi-z136.1-2014',
  beams: [
    {
      wavelengthNm: WAVELENGTHS_NM[i],
      emission: { mode: 'cw', powerW: 0.1 + i / 100 },
      diameterMm: 1 + i / INPUTS,
      divergenceMrad: 0.5 + i / INPUTS,
      width: '1/e2',
      profile: 'gaussian',
    },
  ],
  exposure: { eyeS: DURATIONS_S[i] },
}));

/** Measures the engine. */
export function engineBench(): EngineSpeed {
  return {
    floorPerS: callsPerSecond((i) =>
      handInlined(at(WAVELENGTHS_NM, i), at(DURATIONS_S, i * 7), 1000 + i),
    ),
    limitPerS: callsPerSecond(
      (i) =>
        exposureLimit({
          ruleSet: 'ansi-z136.1-2014',
          side: 'eye',
          wavelengthNm: at(WAVELENGTHS_NM, i),
          durationS: at(DURATIONS_S, i * 7),
        }).radiantExposureJPerM2,
    ),
    barePerS: callsPerSecond((i) => {
      const result = evaluate(CASES[i % INPUTS], { bare: true }) as EvaluationResult;
      return result.eye.hazardDistanceM;
    }),
    withStepsPerS: callsPerSecond((i) => {
      const result = evaluate(CASES[i % INPUTS]) as EvaluationResult;
      return result.eye.hazardDistanceM + (result.steps?.length ?? 0);
    }),
  };
}

/** C_A, `18 C_A t^0.75` and the optical density: what no program can do without. */
function handInlined(wavelengthNm: number, durationS: number, exposure: number): number {
  let correctionFactorCA = 5;
  if (wavelengthNm < 700) correctionFactorCA = 1;
  else if (wavelengthNm < 1050) correctionFactorCA = 10 ** (0.002 * (wavelengthNm - 700));
  return Math.log10(exposure / (18 * correctionFactorCA * durationS ** 0.75));
}

function at(values: Float64Array, index: number): number {
  return values[index % INPUTS] as number;
}
