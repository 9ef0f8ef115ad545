import fc from 'fast-check';

import type { Emission, ModelBeam, ModelCase, ModelPath } from './decimal-model/case';
import { RULE_SET_IDS } from './decimal-model/rows';

const SHARES = 1_000_000;

/** From nothing to one, evenly. */
const share = fc.noBias(fc.integer({ min: 0, max: SHARES })).map((part) => part / SHARES);

const typed = (value: number): number => Number(value.toPrecision(6));

/** A value a person could have typed: six significant digits, evenly spread over the decades. */
export function decades(from: number, to: number): fc.Arbitrary<number> {
  return share.map((part) => Math.min(to, Math.max(from, typed(from * (to / from) ** part))));
}

const between = (from: number, to: number): fc.Arbitrary<number> =>
  share.map((part) => typed(from + part * (to - from)));

const BANDS_NM: readonly (readonly [number, number])[] = [
  [180, 302],
  [302, 315],
  [315, 400],
  [400, 484],
  [484, 600],
  [600, 700],
  [700, 1050],
  [1050, 1200],
  [1200, 1400],
  [1400, 1500],
  [1500, 1800],
  [1800, 2600],
  [2600, 1e5],
  [1e5, 1e6],
];

export const aWavelength = fc
  .constantFrom(...BANDS_NM)
  .chain(([from, to]) =>
    fc.oneof({ weight: 5, arbitrary: between(from, to) }, fc.constantFrom(from, to)),
  );

const perAxis = (one: fc.Arbitrary<number>): fc.Arbitrary<number | [number, number]> =>
  fc.oneof({ weight: 2, arbitrary: one }, fc.tuple(one, one));

/** Pulse durations mostly from 1 fs to 0.3 s, and rates that leave room between the pulses. */
const aPulse = fc.record({
  pulseEnergyJ: decades(1e-9, 10),
  pulseDurationS: fc.oneof(
    { weight: 4, arbitrary: decades(1e-12, 0.3) },
    decades(1e-14, 1e-12),
    fc.constantFrom(1e-13, 1e-11, 1e-9, 5e-6, 1.3e-5, 1e-3),
  ),
});

const aSingle = aPulse.map((pulse): Emission => ({ mode: 'single', ...pulse }));

const aRepetitive = fc
  .tuple(aPulse, decades(0.01, 1e8), between(0.001, 0.9))
  .map(([pulse, rate, duty]): Emission => {
    const top = typed(duty / pulse.pulseDurationS);
    return { mode: 'repetitive', ...pulse, repetitionRateHz: Math.min(rate, top) };
  });

const aBurst = fc
  .record({
    pulse: aPulse,
    spacing: decades(2, 1e5),
    pulsesPerBurst: fc.integer({ min: 1, max: 60 }),
    pause: decades(1.5, 1e6),
  })
  .map(({ pulse, spacing, pulsesPerBurst, pause }): Emission => {
    const intraBurstRateHz = typed(1 / (spacing * pulse.pulseDurationS));
    const burstRateHz = typed(intraBurstRateHz / (pulsesPerBurst * pause));
    return { mode: 'burst', ...pulse, pulsesPerBurst, intraBurstRateHz, burstRateHz };
  });

export const anEmission = fc.oneof(
  { weight: 3, arbitrary: decades(1e-6, 1e3).map((powerW): Emission => ({ mode: 'cw', powerW })) },
  { weight: 2, arbitrary: aSingle },
  { weight: 3, arbitrary: aRepetitive },
  { weight: 2, arbitrary: aBurst },
);

/** A waist inside what the beam allows: nowhere does its width reach zero. */
function withWaist(beam: ModelBeam, part: number | undefined): ModelBeam {
  if (part === undefined) return beam;
  const smallest = (value: number | readonly [number, number]): number =>
    typeof value === 'number' ? value : Math.min(...value);
  const largest = (value: number | readonly [number, number]): number =>
    typeof value === 'number' ? value : Math.max(...value);
  const reach = smallest(beam.diameterMm!) / largest(beam.divergenceMrad!);
  return { ...beam, waistDistanceM: typed(part * reach) };
}

export const aBeam = fc
  .tuple(
    fc.record(
      {
        wavelengthNm: aWavelength,
        emission: anEmission,
        diameterMm: perAxis(decades(0.2, 60)),
        divergenceMrad: perAxis(decades(0.03, 60)),
        width: fc.constantFrom('1/e' as const, '1/e2' as const),
        profile: fc.constantFrom('gaussian' as const, 'gaussian' as const, 'top-hat' as const),
        sourceMrad: perAxis(decades(0.5, 300)),
      },
      {
        requiredKeys: [
          'wavelengthNm',
          'emission',
          'diameterMm',
          'divergenceMrad',
          'width',
          'profile',
        ],
      },
    ),
    fc.option(between(-0.95, 0.95), { freq: 4, nil: undefined }),
  )
  .map(([beam, part]): ModelBeam => withWaist(beam, part));

const aPath: fc.Arbitrary<ModelPath> = fc.oneof(
  { weight: 5, arbitrary: fc.constant<ModelPath>({ kind: 'direct' }) },
  fc
    .tuple(decades(5, 500), fc.option(decades(0.5, 30), { nil: undefined }))
    .map(([focalLengthMm, diameterAtLensMm]): ModelPath => ({
      kind: 'lens',
      focalLengthMm,
      ...(diameterAtLensMm === undefined ? {} : { diameterAtLensMm }),
    })),
  between(0.05, 0.6).map((numericalAperture): ModelPath => ({ kind: 'fiber', numericalAperture })),
  between(2, 15).map((modeFieldDiameterUm): ModelPath => ({ kind: 'fiber', modeFieldDiameterUm })),
  fc.tuple(between(0.02, 1), between(0, 89)).map(([reflectance, angleDeg]): ModelPath => ({
    kind: 'diffuse',
    reflectance,
    angleDeg,
  })),
  fc
    .tuple(between(0.02, 1), fc.constantFrom(0, 0, 30, 60, 80), decades(0.3, 80))
    .map(([reflectance, angleDeg, spotMm]): ModelPath => ({
      kind: 'diffuse',
      reflectance,
      angleDeg,
      spotMm,
    })),
);

const anExposure = fc.oneof(
  { weight: 2, arbitrary: fc.constantFrom(0.25, 10, 100, 600, 30_000) },
  decades(1e-3, 30_000),
);

/** Any case that the rule set with this place in the list can evaluate. */
export const aCase: fc.Arbitrary<ModelCase> = fc.record(
  {
    ruleSet: fc.constantFrom(...RULE_SET_IDS),
    beams: fc.oneof(
      { weight: 3, arbitrary: fc.array(aBeam, { minLength: 1, maxLength: 1 }) },
      fc.array(aBeam, { minLength: 2, maxLength: 3 }),
    ),
    exposure: fc.oneof(
      anExposure.map((eyeS) => ({ eyeS })),
      fc.tuple(anExposure, anExposure).map(([eyeS, skinS]) => ({ eyeS, skinS })),
    ),
    path: aPath,
    aid: fc.record({
      objectiveMm: between(5, 80),
      magnification: between(1, 20),
      transmission: between(0.3, 1),
    }),
    air: decades(0.01, 5).map((attenuationPerKm) => ({ attenuationPerKm })),
    model: fc.record({
      growth: fc.constantFrom('hyperbolic' as const, 'linear' as const),
      onAxis: fc.constantFrom('peak' as const, 'aperture-mean' as const),
    }),
    at: decades(0.02, 3000).map((distanceM) => ({ distanceM })),
  },
  { requiredKeys: ['ruleSet', 'beams', 'exposure'] },
);

/** Always the same cases for the same seed. */
export function drawCases(numRuns: number, seed: number): ModelCase[] {
  return fc.sample(aCase, { numRuns, seed });
}
