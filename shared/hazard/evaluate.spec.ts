import { describe, expect, it } from 'vitest';
import type { HazardCase } from './case';
import { evaluate } from './evaluate';
import type { EvaluationErrors, EvaluationResult, SideResult } from './result';

const GAUSSIAN = { width: '1/e2', profile: 'gaussian' } as const;
const HYPERBOLIC = { growth: 'hyperbolic', onAxis: 'aperture-mean' } as const;

const CASE_A: HazardCase = {
  id: 'A',
  ruleSet: 'ansi-z136.1-2014',
  beams: [
    {
      wavelengthNm: 532,
      emission: { mode: 'cw', powerW: 5 },
      diameterMm: 2.3,
      divergenceMrad: 0.5,
      ...GAUSSIAN,
    },
  ],
  exposure: { eyeS: 0.25 },
};

const CASE_B: HazardCase = {
  ruleSet: 'iec-60825-1-2014',
  beams: [
    {
      wavelengthNm: 1064,
      emission: { mode: 'single', pulseEnergyJ: 0.1, pulseDurationS: 8e-9 },
      diameterMm: 6,
      divergenceMrad: 0.8,
      ...GAUSSIAN,
    },
  ],
};

const CASE_C: HazardCase = {
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
      ...GAUSSIAN,
    },
  ],
  exposure: { eyeS: 100 },
  model: HYPERBOLIC,
};

const CASE_D: HazardCase = {
  ruleSet: 'ansi-z136.1-2014',
  beams: [{ wavelengthNm: 532, emission: { mode: 'cw', powerW: 5 } }],
  exposure: { eyeS: 0.25 },
  path: { kind: 'diffuse', reflectance: 0.8, angleDeg: 0 },
};

const CASE_E: HazardCase = {
  ruleSet: 'iec-60825-1-2014',
  beams: [
    { wavelengthNm: 450, powerW: 0.5 },
    { wavelengthNm: 1064, powerW: 20 },
  ].map(({ wavelengthNm, powerW }) => ({
    wavelengthNm,
    emission: { mode: 'cw', powerW },
    diameterMm: 2,
    divergenceMrad: 1,
    ...GAUSSIAN,
  })),
  exposure: { eyeS: 60 },
  model: HYPERBOLIC,
};

const CASE_F: HazardCase = {
  ruleSet: 'iec-60825-1-2014',
  beams: [{ wavelengthNm: 808, emission: { mode: 'cw', powerW: 30 } }],
  exposure: { eyeS: 100 },
  path: { kind: 'fiber', numericalAperture: 0.22 },
};

function evaluated(input: HazardCase): EvaluationResult {
  const result = evaluate(input);
  if ('errors' in result) throw new Error(JSON.stringify(result.errors));
  return result;
}

function errorsOf(input: unknown): EvaluationErrors {
  const result = evaluate(input);
  if (!('errors' in result)) throw new Error('The case was evaluated.');
  return result;
}

/** The numbers of the worked cases have eight digits; they are to be met to 1e-6. */
function expectClose(value: number | undefined, expected: number): void {
  expect(Math.abs((value ?? NaN) / expected - 1)).toBeLessThan(1e-6);
}

const first = ({ perBeam }: SideResult) => perBeam[0]!;

describe('six worked cases, from an independent calculation', () => {
  it('A: a visible CW beam', () => {
    const { eye, skin } = evaluated(CASE_A);
    expectClose(first(eye).mpe.radiantExposureJPerM2, 6.363961);
    expectClose(first(eye).mpe.irradianceWPerM2, 25.455844);
    expect(first(eye).mpe).toMatchObject({ rule: 'continuous', mechanism: 'thermal' });
    expectClose(first(eye).exposure.irradianceWPerM2, 129_922.4);
    expectClose(eye.opticalDensity, 3.7078965);
    expectClose(eye.hazardDistanceM, 1414.3853);
    expectClose(first(skin).mpe.irradianceWPerM2, 31_112.698);
    expectClose(skin.hazardDistanceM, 39.576188);
  });

  it('B: one short pulse, by linear and by hyperbolic growth', () => {
    const { eye } = evaluated(CASE_B);
    expectClose(first(eye).mpe.radiantExposureJPerM2, 0.02);
    expect(first(eye).mpe).toMatchObject({ rule: 'single-pulse', mechanism: 'thermal' });
    expectClose(first(eye).exposure.radiantExposureJPerM2, 2427.6559);
    expectClose(eye.opticalDensity, 5.0841571);
    expectClose(eye.hazardDistanceM, 4452.8017);
    expectClose(evaluated({ ...CASE_B, model: HYPERBOLIC }).eye.hazardDistanceM, 4460.2954);
  });

  it('C: repetitive pulses, by the pulse-train rule', () => {
    const { eye } = evaluated(CASE_C);
    const { mpe } = first(eye);
    expect(mpe).toMatchObject({ rule: 'pulse-train', mechanism: 'thermal' });
    expectClose(mpe.radiantExposureJPerM2, 0.01);
    expectClose(mpe.factors.CP, 0.5);
    expect(mpe.candidates?.map(({ rule, value }) => [rule, Number(value.toPrecision(6))])).toEqual([
      ['single-pulse', 0.02],
      ['average', 0.05],
      ['pulse-train', 0.01],
    ]);
    expectClose(first(eye).exposure.radiantExposureJPerM2, 51.967991);
    expectClose(eye.opticalDensity, 3.7157359);
    expectClose(eye.hazardDistanceM, 713.609);
  });

  it('D: a diffuse reflection', () => {
    const { eye } = evaluated(CASE_D);
    expectClose(first(eye).exposure.irradianceWPerM2, 127.32395);
    expect(first(eye).exposure.distanceM).toBe(0.1);
    expectClose(eye.opticalDensity, 0.69912262);
    expectClose(eye.hazardDistanceM, 0.22364609);
  });

  it('E: two wavelengths on the retina', () => {
    const { eye, skin } = evaluated(CASE_E);
    const [blue, infrared] = eye.perBeam;
    expectClose(blue?.mpe.irradianceWPerM2, 1.6666667);
    expect(blue?.mpe.mechanism).toBe('photochemical');
    expectClose(infrared?.mpe.irradianceWPerM2, 50);
    expectClose(blue?.exposure.irradianceWPerM2, 12_992.24);
    expectClose(infrared?.exposure.irradianceWPerM2, 519_689.61);
    expectClose(blue?.opticalDensity, 3.8918353);
    expectClose(infrared?.opticalDensity, 4.016774);
    expectClose(eye.opticalDensity, 4.0679266);
    expectClose(eye.hazardDistanceM, 1070.4497);
    expectClose(skin.opticalDensity, 2.3680055);
    expectClose(skin.hazardDistanceM, 75.586502);
    const alone = evaluated({ ...CASE_E, beams: [CASE_E.beams[0]!] });
    expectClose(alone.eye.hazardDistanceM, 874.00842);
  });

  it('F: the end of a multimode fiber', () => {
    const { eye, skin } = evaluated(CASE_F);
    expectClose(first(eye).mpe.irradianceWPerM2, 16.443717);
    expectClose(first(eye).exposure.irradianceWPerM2, 779_534.42);
    expectClose(eye.opticalDensity, 4.6758353);
    expectClose(eye.hazardDistanceM, 5.9953179);
    const peak = evaluated({ ...CASE_F, model: { growth: 'linear', onAxis: 'peak' } });
    expectClose(peak.eye.hazardDistanceM, 5.9953496);
    expectClose(first(skin).mpe.irradianceWPerM2, 3288.7434);
    expectClose(skin.hazardDistanceM, 0.42382342);
  });
});

describe('the result', () => {
  it('names case, edition and engine, and carries the cautions', () => {
    const result = evaluated(CASE_A);
    expect(result).toMatchObject({
      id: 'A',
      ruleSet: 'ansi-z136.1-2014',
      edition: 'ANSI Z136.1-2014',
      engineVersion: expect.stringMatching(/^\d+\.\d+\.\d+$/) as unknown,
      distances: { hazardDistanceM: { eye: result.eye.hazardDistanceM } },
    });
    expect(result.cautions.join(' ')).toContain('Result made with ANSI Z136.1-2014');
    expect(result).not.toHaveProperty('classes');
    expect(result).not.toHaveProperty('eyewear');
  });

  it('leaves steps and candidates out when it is bare, and nothing else', () => {
    const bare = evaluate(CASE_A, { bare: true }) as EvaluationResult;
    const whole = JSON.parse(JSON.stringify(evaluated(CASE_A))) as EvaluationResult;
    expect(whole.steps?.length).toBeGreaterThan(10);
    delete whole.steps;
    for (const side of [whole.eye, whole.skin]) delete first(side).mpe.candidates;
    expect(JSON.parse(JSON.stringify(bare))).toEqual(whole);
  });

  it('gives exposure and optical density at a distance, in air', () => {
    const at = evaluated({
      ...CASE_A,
      air: { attenuationPerKm: 1 },
      at: { distanceM: 500 },
    }).eye.perBeam[0]!.at!;
    const clear = evaluated({ ...CASE_A, at: { distanceM: 500 } }).eye.perBeam[0]!.at!;
    expectClose(at.irradianceWPerM2, clear.irradianceWPerM2 * Math.exp(-0.5));
    expectClose(at.opticalDensity, clear.opticalDensity - 0.5 / Math.LN10);
  });

  it('gives the hazard distance behind an optical aid, never below that of the naked eye', () => {
    const aid = { objectiveMm: 50, magnification: 7, transmission: 0.9 };
    const aided = evaluated({ ...CASE_A, aid });
    expect(aided.eye.aidedHazardDistanceM).toBeGreaterThan(aided.eye.hazardDistanceM);
    const weak = { objectiveMm: 7, magnification: 1, transmission: 0.1 };
    const dimmed = evaluated({ ...CASE_A, aid: weak });
    expect(dimmed.eye.aidedHazardDistanceM).toBe(dimmed.eye.hazardDistanceM);
  });
});

describe('warnings', () => {
  const codes = (input: HazardCase) => evaluated(input).warnings.map(({ code }) => code);

  it('of a superseded edition', () => {
    expect(codes({ ...CASE_A, ruleSet: 'ansi-z136.1-1993' })).toContain('superseded-edition');
    expect(codes(CASE_A)).toEqual([]);
  });

  it('of the other growth when it reaches over 1 % farther, with its distance', () => {
    const { warnings } = evaluated({ ...CASE_A, model: { ...HYPERBOLIC, growth: 'linear' } });
    const growth = warnings.filter(({ code }) => code === 'growth-model');
    expect(growth.map(({ text }) => text)).toEqual([
      'With hyperbolic growth the hazard distance of the skin is 39.58 m, against 35.24 m here.',
    ]);
  });

  it('of pulses shorter than the tables, which keep the irradiance of the shortest one', () => {
    const pulse = (pulseDurationS: number): HazardCase => ({
      ...CASE_B,
      beams: [
        {
          ...CASE_B.beams[0]!,
          emission: { mode: 'single', pulseEnergyJ: 1e-6, pulseDurationS },
        },
      ],
    });
    expect(codes(pulse(5e-14))).toContain('outside-validity');
    expect(codes(pulse(1e-13))).not.toContain('outside-validity');
    const [held, shortest] = [5e-14, 1e-13].map(
      (duration) => first(evaluated(pulse(duration)).eye).mpe.irradianceWPerM2,
    );
    expectClose(held, shortest!);
  });

  it('of a divergence below the diffraction limit', () => {
    const [beam] = CASE_A.beams;
    const narrow = { ...CASE_A, beams: [{ ...beam!, divergenceMrad: 0.29 }] };
    const wide = { ...CASE_A, beams: [{ ...beam!, divergenceMrad: 0.3 }] };
    expect(codes(narrow)).toContain('below-diffraction-limit');
    expect(codes(wide)).not.toContain('below-diffraction-limit');
  });

  it('of rows written down from memory with less than high certainty', () => {
    const texts = evaluated({ ...CASE_C, ruleSet: 'ansi-z136.1-2014' }).warnings;
    expect(texts.map(({ text }) => text).join(' ')).toMatch(/rule for pulse trains.*low certainty/);
  });
});

describe('a case that cannot be evaluated', () => {
  it('keeps its id and names every field that is wrong', () => {
    const { id, errors } = errorsOf({
      ...CASE_A,
      ruleSet: 'ansi',
      beams: [{ ...CASE_A.beams[0], emission: { mode: 'cw', powerW: -1 } }],
      exposure: { eyeS: 1e6 },
      color: 'green',
    });
    expect(id).toBe('A');
    expect(errors.map(({ path }) => path)).toEqual([
      'color',
      'ruleSet',
      'beams[0].emission.powerW',
      'exposure.eyeS',
    ]);
    expect(errors[2]).toEqual({
      path: 'beams[0].emission.powerW',
      message: 'powerW must be a finite number above 0, not -1.',
      allowed: 'a finite number above 0',
    });
  });

  it('says what this version does not evaluate', () => {
    const range = { ...CASE_A.beams[0]!, wavelengthNm: { fromNm: 700, toNm: 800 } };
    const { errors } = errorsOf({ ...CASE_A, beams: [range], uncertainty: { powerPct: 5 } });
    expect(errors.map(({ path }) => path)).toEqual(['uncertainty', 'beams[0].wavelengthNm']);
    expect(errors[1]?.allowed).toContain('a single wavelength');
  });

  it('has a pulse or burst longer than its period, or no waist', () => {
    const paths = (beam: object) =>
      errorsOf({ ...CASE_C, beams: [{ ...CASE_C.beams[0]!, ...beam }] }).errors.map(
        ({ path }) => path,
      );
    const pulse = { pulseEnergyJ: 1, pulseDurationS: 1e-3 };
    expect(paths({ emission: { mode: 'repetitive', ...pulse, repetitionRateHz: 2000 } })).toEqual([
      'beams[0].emission.pulseDurationS',
    ]);
    const burst = { mode: 'burst', ...pulse, pulsesPerBurst: 10, intraBurstRateHz: 500 };
    expect(paths({ emission: { ...burst, burstRateHz: 100 } })).toEqual([
      'beams[0].emission.burstRateHz',
    ]);
    expect(paths({ waistDistanceM: 3 })).toEqual(['beams[0].waistDistanceM']);
  });

  it('is no case at all', () => {
    for (const input of [undefined, null, 5, 'case', [], () => 1, Symbol('case'), 1n]) {
      expect(errorsOf(input).errors[0]?.path).toBe('');
    }
    const trap = new Proxy(
      {},
      {
        get() {
          throw new Error('no');
        },
      },
    );
    expect(errorsOf(trap).errors[0]?.message).toBe('The case cannot be read.');
  });

  it('has numbers that lie too far apart', () => {
    const extreme = {
      ...CASE_A.beams[0]!,
      emission: { mode: 'cw', powerW: 1e308 },
      diameterMm: [1e-300, 1e300],
    };
    expect(() => evaluate({ ...CASE_A, beams: [extreme] })).not.toThrow();
  });
});
