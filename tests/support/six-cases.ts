import type { ModelCase } from './decimal-model/case';

/** What a worked case has to give; irradiances in W/m², radiant exposures in J/m². */
export interface SixCase {
  readonly name: string;
  readonly input: ModelCase;
  readonly expected: Readonly<Record<string, number>>;
}

const gaussian = { width: '1/e2', profile: 'gaussian' } as const;

const caseC = {
  ruleSet: 'iec-60825-1-2014',
  beams: [
    {
      wavelengthNm: 1064,
      emission: {
        mode: 'repetitive',
        pulseEnergyJ: 2e-3,
        pulseDurationS: 10e-9,
        repetitionRateHz: 1000,
      },
      diameterMm: 3,
      divergenceMrad: 1,
      ...gaussian,
    },
  ],
  exposure: { eyeS: 100 },
} as const satisfies ModelCase;

const caseB = {
  ruleSet: 'iec-60825-1-2014',
  beams: [
    {
      wavelengthNm: 1064,
      emission: { mode: 'single', pulseEnergyJ: 0.1, pulseDurationS: 8e-9 },
      diameterMm: 6,
      divergenceMrad: 0.8,
      ...gaussian,
    },
  ],
  exposure: { eyeS: 10 },
} as const satisfies ModelCase;

const caseF = {
  ruleSet: 'iec-60825-1-2014',
  beams: [
    {
      wavelengthNm: 808,
      emission: { mode: 'cw', powerW: 30 },
      diameterMm: 0.1,
      divergenceMrad: 1,
      ...gaussian,
    },
  ],
  exposure: { eyeS: 100 },
  path: { kind: 'fiber', numericalAperture: 0.22 },
} as const satisfies ModelCase;

const hyperbolic = { growth: 'hyperbolic', onAxis: 'aperture-mean' } as const;

/** Six whole cases, computed apart from this code; to be met to 1e-6. */
export const SIX_CASES: readonly SixCase[] = [
  {
    name: 'A: 532 nm, 5 W, direct, ANSI Z136.1-2014',
    input: {
      ruleSet: 'ansi-z136.1-2014',
      beams: [
        {
          wavelengthNm: 532,
          emission: { mode: 'cw', powerW: 5 },
          diameterMm: 2.3,
          divergenceMrad: 0.5,
          ...gaussian,
        },
      ],
      exposure: { eyeS: 0.25 },
    },
    expected: {
      'eye.0.mpe.radiantExposure': 6.363961,
      'eye.0.mpe.irradiance': 25.455844,
      'eye.0.exposure.irradiance': 129_922.4,
      'eye.opticalDensity': 3.7078965,
      'eye.hazardDistance': 1414.3853,
      'skin.0.mpe.irradiance': 31_112.698,
      'skin.hazardDistance': 39.576188,
    },
  },
  {
    name: 'B: 1064 nm, 0.1 J in 8 ns, linear growth, IEC 60825-1:2014',
    input: caseB,
    expected: {
      'eye.0.mpe.radiantExposure': 0.02,
      'eye.0.exposure.radiantExposure': 2427.6559,
      'eye.opticalDensity': 5.0841571,
      'eye.hazardDistance': 4452.8017,
    },
  },
  {
    name: 'B with hyperbolic growth',
    input: { ...caseB, model: hyperbolic },
    expected: { 'eye.hazardDistance': 4460.2954 },
  },
  {
    name: 'C: 1064 nm, 1 kHz, pulse train, IEC 60825-1:2014',
    input: { ...caseC, model: hyperbolic },
    expected: {
      'eye.0.mpe.radiantExposure': 0.01,
      'eye.0.exposure.radiantExposure': 51.967991,
      'eye.opticalDensity': 3.7157359,
      'eye.hazardDistance': 713.609,
    },
  },
  {
    name: 'D: 532 nm, 5 W on a diffuse target, ANSI Z136.1-2014',
    input: {
      ruleSet: 'ansi-z136.1-2014',
      beams: [{ wavelengthNm: 532, emission: { mode: 'cw', powerW: 5 }, ...gaussian }],
      exposure: { eyeS: 0.25 },
      path: { kind: 'diffuse', reflectance: 0.8, angleDeg: 0 },
    },
    expected: {
      'eye.0.exposure.irradiance': 127.32395,
      'eye.opticalDensity': 0.69912262,
      'eye.hazardDistance': 0.22364609,
    },
  },
  {
    name: 'E: 450 nm and 1064 nm on the retina, IEC 60825-1:2014',
    input: {
      ruleSet: 'iec-60825-1-2014',
      beams: [
        {
          wavelengthNm: 450,
          emission: { mode: 'cw', powerW: 0.5 },
          diameterMm: 2,
          divergenceMrad: 1,
          ...gaussian,
        },
        {
          wavelengthNm: 1064,
          emission: { mode: 'cw', powerW: 20 },
          diameterMm: 2,
          divergenceMrad: 1,
          ...gaussian,
        },
      ],
      exposure: { eyeS: 60 },
      model: hyperbolic,
    },
    expected: {
      'eye.0.mpe.irradiance': 1.6666667,
      'eye.1.mpe.irradiance': 50,
      'eye.0.exposure.irradiance': 12_992.24,
      'eye.1.exposure.irradiance': 519_689.61,
      'eye.0.opticalDensity': 3.8918353,
      'eye.1.opticalDensity': 4.016774,
      'eye.opticalDensity': 4.0679266,
      'eye.hazardDistance': 1070.4497,
      'skin.opticalDensity': 2.3680055,
      'skin.hazardDistance': 75.586502,
    },
  },
  {
    name: 'F: 808 nm, 30 W from a multimode fiber, IEC 60825-1:2014',
    input: caseF,
    expected: {
      'eye.0.mpe.irradiance': 16.443717,
      'eye.0.exposure.irradiance': 779_534.42,
      'eye.opticalDensity': 4.6758353,
      'eye.hazardDistance': 5.9953179,
      'skin.0.mpe.irradiance': 3288.7434,
      'skin.hazardDistance': 0.42382342,
    },
  },
  {
    name: 'F on the peak',
    input: { ...caseF, model: { growth: 'linear', onAxis: 'peak' } },
    expected: { 'eye.hazardDistance': 5.9953496 },
  },
];
