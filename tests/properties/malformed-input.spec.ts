import fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import { evaluate } from '../../shared/hazard/evaluate';
import { errorsOf, resultOf } from '../support/engine-numbers';
import { aCase } from '../support/random-cases';

const SEED = 90_210;

const valid = {
  ruleSet: 'iec-60825-1-2014',
  beams: [
    {
      wavelengthNm: 532,
      emission: { mode: 'cw', powerW: 1 },
      diameterMm: 2,
      divergenceMrad: 1,
      width: '1/e2',
      profile: 'gaussian',
    },
  ],
  exposure: { eyeS: 0.25 },
} as const;

type Path = readonly (string | number)[];

/** A copy of a value with one place changed; nothing else touched. */
function changed(value: unknown, [key, ...rest]: Path, put: unknown): unknown {
  if (key === undefined) return put;
  const copy: Record<string | number, unknown> = Array.isArray(value)
    ? ([...value] as never)
    : { ...(value as object) };
  copy[key] = changed(copy[key], rest, put);
  return copy;
}

function expectWellFormedErrors(input: unknown): void {
  const outcome = evaluate(input);
  if (!('errors' in outcome)) return;
  expect(outcome.errors.length).toBeGreaterThan(0);
  for (const { path, message, allowed } of outcome.errors) {
    expect(typeof path).toBe('string');
    expect(message.length).toBeGreaterThan(3);
    expect(allowed.length).toBeGreaterThan(1);
    expect(`${path}${message}${allowed}`).not.toMatch(/undefined|\[object|NaN is|at .*\.ts/);
  }
}

/** Every place of a case that holds a number. */
function numberPlaces(value: unknown, at: Path = []): Path[] {
  if (typeof value === 'number') return [at];
  if (typeof value !== 'object' || value === null) return [];
  return Object.entries(value).flatMap(([key, inner]) =>
    numberPlaces(inner, [...at, Array.isArray(value) ? Number(key) : key]),
  );
}

/** Every place of a case, its objects included. */
function allPlaces(value: unknown, at: Path = []): Path[] {
  if (typeof value !== 'object' || value === null) return [at];
  const inner = Object.entries(value).flatMap(([key, part]) =>
    allPlaces(part, [...at, Array.isArray(value) ? Number(key) : key]),
  );
  return at.length > 0 ? [at, ...inner] : inner;
}

const nothingElse = (input: unknown, path: RegExp): void => {
  const errors = errorsOf(input);
  expect(errors.map((error) => error.path).join(' | ')).toMatch(path);
  expectWellFormedErrors(input);
};

describe(`malformed input is answered with field errors (seed ${SEED})`, () => {
  it('the case these tests spoil is itself valid', () => {
    expect(resultOf(valid).eye.perBeam).toHaveLength(1);
  });

  it('whatever JSON comes in, nothing is thrown', () => {
    fc.assert(
      fc.property(fc.jsonValue({ maxDepth: 6 }), (input) => expectWellFormedErrors(input)),
      { seed: SEED, numRuns: 400 },
    );
  });

  it('nor for values that JSON cannot hold', () => {
    const odd = [
      undefined,
      null,
      NaN,
      1,
      'text',
      true,
      [],
      {},
      Symbol('s'),
      () => 1,
      10n,
      new Date(0),
    ];
    for (const input of odd) {
      expect(errorsOf(input).length).toBeGreaterThan(0);
      expectWellFormedErrors(input);
    }
    for (const place of allPlaces(valid)) {
      for (const put of odd) expectWellFormedErrors(changed(valid, place, put));
    }
  });

  it('a hostile value anywhere in a valid case never throws', () => {
    const hostile = fc.oneof(
      fc.constantFrom<unknown>(
        null,
        '',
        '1',
        'NaN',
        '1e3',
        NaN,
        Infinity,
        -Infinity,
        -1,
        0,
        -0,
        1e308,
        5e-324,
        true,
        [],
        [1],
        [1, 2, 3],
        [[1]],
        {},
        { toString: 'x' },
        '__proto__',
        'constructor',
        '\u0000',
      ),
      fc.anything({ maxDepth: 2 }),
    );
    fc.assert(
      fc.property(aCase, hostile, fc.nat(), (input, put, pick) => {
        const places = allPlaces(input);
        expectWellFormedErrors(changed(input, places[pick % places.length]!, put));
      }),
      { seed: SEED, numRuns: 500 },
    );
  });

  it('a number that is not finite, not a number or not positive is named by its place', () => {
    fc.assert(
      fc.property(
        aCase,
        fc.constantFrom<unknown>(NaN, Infinity, -Infinity, '1', null, true, {}, []),
        fc.nat(),
        (input, put, pick) => {
          const places = numberPlaces(input).filter((place) => isUsed(input, place));
          const place = places[pick % places.length]!;
          const errors = errorsOf(changed(input, place, put));
          const last = place.filter((part) => typeof part === 'string').at(-1)!;
          expect(errors.map(({ path }) => path).join(' | ')).toContain(last);
        },
      ),
      { seed: SEED, numRuns: 300 },
    );
  });

  it('keys of the prototype are unknown fields like any other', () => {
    for (const key of ['__proto__', 'constructor', 'toString', 'hasOwnProperty']) {
      const input = JSON.parse(JSON.stringify(valid).replace('{', `{"${key}":{"a":1},`)) as unknown;
      nothingElse(input, new RegExp(key));
    }
    for (const ruleSet of ['__proto__', 'constructor', 'toString', 'hasOwnProperty']) {
      nothingElse({ ...valid, ruleSet }, /ruleSet/);
      nothingElse(changed(valid, ['beams', 0, 'emission', 'mode'], ruleSet), /mode/);
    }
  });

  it('very many beams and very deep values are refused, not computed', () => {
    nothingElse({ ...valid, beams: Array.from({ length: 65 }, () => valid.beams[0]) }, /beams/);
    nothingElse({ ...valid, beams: new Array(1_000_000).fill(valid.beams[0]) }, /beams/);
    let deep: unknown = 1;
    for (let i = 0; i < 100_000; i++) deep = [deep];
    nothingElse({ ...valid, exposure: deep }, /exposure/);
    nothingElse(changed(valid, ['beams', 0, 'diameterMm'], deep), /diameterMm/);
    const many = Array.from({ length: 64 }, () => valid.beams[0]);
    expect(resultOf({ ...valid, beams: many }).eye.perBeam).toHaveLength(64);
  });

  it('a case that refers to itself is refused', () => {
    const input: Record<string, unknown> = { ...valid };
    input['exposure'] = input;
    nothingElse(input, /exposure/);
  });
});

/** Whether the path of the case uses the number at a place; what it does not use is ignored. */
function isUsed(input: { path?: { kind: string } | undefined }, place: Path): boolean {
  const kind = input.path?.kind ?? 'direct';
  const key = place.find((part) => typeof part === 'string' && part !== 'beams');
  if (kind !== 'direct' && key === 'waistDistanceM') return false;
  if (
    (kind === 'fiber' || kind === 'diffuse') &&
    (key === 'diameterMm' || key === 'divergenceMrad')
  ) {
    return false;
  }
  if (kind === 'lens' && (key === 'divergenceMrad' || key === 'diameterMm')) return false;
  return !(kind === 'diffuse' && key === 'sourceMrad') && key !== 'skinS' && key !== 'eyeS';
}

describe('each rule of a case is checked, and the message says what is allowed', () => {
  const beam = (put: object): unknown => ({ ...valid, beams: [{ ...valid.beams[0], ...put }] });
  const pulses = {
    mode: 'repetitive',
    pulseEnergyJ: 1e-3,
    pulseDurationS: 1e-8,
    repetitionRateHz: 10,
  };
  const burst = {
    mode: 'burst',
    pulseEnergyJ: 1e-3,
    pulseDurationS: 1e-8,
    pulsesPerBurst: 5,
    intraBurstRateHz: 1e6,
    burstRateHz: 10,
  };
  const cases: readonly [what: string, input: unknown, path: RegExp][] = [
    ['an unknown rule set', { ...valid, ruleSet: 'iec-60825-1-2007' }, /ruleSet/],
    ['no rule set', { ...valid, ruleSet: undefined }, /ruleSet/],
    ['an unknown field', { ...valid, laser: 'x' }, /laser/],
    ['an unknown field of a beam', beam({ powerW: 1 }), /powerW/],
    [
      'an unknown field of the emission',
      beam({ emission: { mode: 'cw', powerW: 1, rate: 2 } }),
      /rate/,
    ],
    ['no beams', { ...valid, beams: [] }, /beams/],
    ['beams that are no list', { ...valid, beams: valid.beams[0] }, /beams/],
    ['a wavelength below 180 nm', beam({ wavelengthNm: 179.9 }), /wavelengthNm/],
    ['a wavelength above 1 mm', beam({ wavelengthNm: 1_000_001 }), /wavelengthNm/],
    ['a power of zero', beam({ emission: { mode: 'cw', powerW: 0 } }), /powerW/],
    ['a negative power', beam({ emission: { mode: 'cw', powerW: -1 } }), /powerW/],
    ['an unknown mode', beam({ emission: { mode: 'pulsed', powerW: 1 } }), /mode/],
    ['a diameter of zero', beam({ diameterMm: 0 }), /diameterMm/],
    ['three diameters', beam({ diameterMm: [1, 2, 3] }), /diameterMm/],
    ['one negative axis', beam({ divergenceMrad: [1, -2] }), /divergenceMrad/],
    ['an unknown width', beam({ width: '1/e²' }), /width/],
    ['an unknown profile', beam({ profile: 'round' }), /profile/],
    ['a source of negative size', beam({ sourceMrad: -1 }), /sourceMrad/],
    ['an exposure of zero', { ...valid, exposure: { eyeS: 0 } }, /eyeS/],
    ['an exposure above 30 000 s', { ...valid, exposure: { eyeS: 30_001 } }, /eyeS/],
    [
      'an exposure of the skin above 30 000 s',
      { ...valid, exposure: { eyeS: 1, skinS: 1e9 } },
      /skinS/,
    ],
    [
      'a pulse longer than its period',
      beam({ emission: { ...pulses, repetitionRateHz: 2e8 } }),
      /emission/,
    ],
    [
      'a burst longer than its period',
      beam({ emission: { ...burst, burstRateHz: 3e5 } }),
      /emission/,
    ],
    [
      'a pulse longer than its place in the burst',
      beam({ emission: { ...burst, intraBurstRateHz: 2e8 } }),
      /emission/,
    ],
    [
      'part of a pulse in a burst',
      beam({ emission: { ...burst, pulsesPerBurst: 2.5 } }),
      /pulsesPerBurst/,
    ],
    ['no positive waist', beam({ waistDistanceM: 2 }), /waistDistanceM|diameterMm/],
    ['an unknown path', { ...valid, path: { kind: 'mirror' } }, /path/],
    ['a lens without a focal length', { ...valid, path: { kind: 'lens' } }, /focalLengthMm/],
    ['a fiber of neither kind', { ...valid, path: { kind: 'fiber' } }, /path/],
    [
      'a reflectance above 1',
      { ...valid, path: { kind: 'diffuse', reflectance: 1.1, angleDeg: 0 } },
      /reflectance/,
    ],
    [
      'a reflectance of zero',
      { ...valid, path: { kind: 'diffuse', reflectance: 0, angleDeg: 0 } },
      /reflectance/,
    ],
    [
      'an angle of 90°',
      { ...valid, path: { kind: 'diffuse', reflectance: 1, angleDeg: 90 } },
      /angleDeg/,
    ],
    [
      'a negative angle',
      { ...valid, path: { kind: 'diffuse', reflectance: 1, angleDeg: -1 } },
      /angleDeg/,
    ],
    [
      'an aid without an objective',
      { ...valid, aid: { magnification: 7, transmission: 1 } },
      /objectiveMm/,
    ],
    [
      'an aid that transmits more than all',
      { ...valid, aid: { objectiveMm: 50, magnification: 7, transmission: 1.5 } },
      /transmission/,
    ],
    ['air that amplifies', { ...valid, air: { attenuationPerKm: -1 } }, /attenuationPerKm/],
    ['an unknown growth', { ...valid, model: { growth: 'cubic', onAxis: 'peak' } }, /growth/],
    [
      'an unknown place on the axis',
      { ...valid, model: { growth: 'linear', onAxis: 'mean' } },
      /onAxis/,
    ],
    ['a negative distance', { ...valid, at: { distanceM: -1 } }, /distanceM/],
    ['no diameter for a direct beam', beam({ diameterMm: undefined }), /diameterMm/],
  ];
  it.each(cases)('%s', (_, input, path) => nothingElse(input, path));

  it('what the path does not use may be missing or odd', () => {
    const bare = { wavelengthNm: 808, emission: { mode: 'cw', powerW: 30 } };
    const fiber = { ...valid, beams: [bare], path: { kind: 'fiber', numericalAperture: 0.22 } };
    const diffuse = {
      ...valid,
      beams: [bare],
      path: { kind: 'diffuse', reflectance: 1, angleDeg: 0 },
    };
    expect(resultOf(fiber).eye.hazardDistanceM).toBeGreaterThan(0);
    expect(resultOf(diffuse).eye.hazardDistanceM).toBeGreaterThan(0);
  });
});
