import { describe, expect, it } from 'vitest';
import { compareResults, isWorse } from './compare-results';
import { evaluateScenarios, isEvaluated, scenarioCase, uncoveredLines } from './evaluation-case';
import type { LaserInputs, Scenario } from './evaluations';
import { changedInputs, hashedInputs } from './laser-inputs';
import { emissionSummary } from './laser-summary';
import type { Emission, Quantity } from './lasers';
import { proposeScenarios } from './propose-scenarios';
import { reachOf } from './reach-of';

const q = (value: number, more: Partial<Quantity> = {}): Quantity => ({
  value,
  source: 'data-sheet',
  ...more,
});

function line(id: string, nm: number, more: Partial<Emission> = {}): Emission {
  return {
    id,
    wavelengthNm: q(nm),
    mode: 'cw',
    powerW: q(5),
    delivery: 'beam',
    diameterMm: q(2.3),
    diameterConvention: '1/e2',
    divergenceMrad: q(0.5),
    divergenceConvention: '1/e2',
    divergenceAngle: 'full',
    profile: 'gaussian',
    ...more,
  };
}

function inputs(...emissions: Emission[]): LaserInputs {
  return { emissions, emissionSets: [] };
}

function situation(more: Partial<Scenario> = {}): Scenario {
  return {
    id: 's1',
    activity: 'operation',
    name: 'Operation',
    emissionIds: ['e1'],
    atWavelengthNm: {},
    eyeS: 0.25,
    exposureReason: 'unintended',
    path: { kind: 'direct' },
    ...more,
  };
}

describe('the case of a situation', () => {
  it('equals case A of the engine contract for the laser of case A', () => {
    const input = { ruleSet: 'ansi-z136.1-2014', scenarios: [situation()] } as const;
    const [first] = evaluateScenarios(inputs(line('e1', 532)), {
      ...input,
      scenarios: [...input.scenarios],
    });
    const result = first?.result;
    if (!result || !isEvaluated(result)) throw new Error('not evaluated');
    // Engine contract 8, case A.
    expect(result.eye.hazardDistanceM).toBeCloseTo(1414.3853, 3);
    expect(result.eye.opticalDensity).toBeCloseTo(3.7078965, 6);
  });

  it('carries aid, air, model and distance, and completes half a model from the rule set', () => {
    const built = scenarioCase(
      inputs(line('e1', 532)),
      situation({
        aid: { objectiveMm: 50, magnification: 7, transmission: 0.9 },
        attenuationPerKm: 0.1,
        growth: 'hyperbolic',
        atDistanceM: 3,
        skinS: 10,
      }),
      'iec-60825-1-2014',
    );
    expect(built).toMatchObject({
      ok: true,
      case: {
        exposure: { eyeS: 0.25, skinS: 10 },
        aid: { magnification: 7 },
        air: { attenuationPerKm: 0.1 },
        model: { growth: 'hyperbolic', onAxis: 'aperture-mean' },
        at: { distanceM: 3 },
      },
    });
  });

  it('names unknown lines, and faults of the record, by path', () => {
    const laser = inputs(line('e1', 532), line('e2', 1064, { powerW: undefined }));
    const scenarios = [situation(), situation({ id: 's2', emissionIds: ['e2', 'e9'] })];
    const results = evaluateScenarios(laser, { ruleSet: 'icnirp-2013', scenarios });
    expect(results[1]).toMatchObject({
      case: null,
      result: {
        errors: [
          { path: 'laserInputs.emissions[1].powerW' },
          { path: 'scenarios[1].emissionIds', message: 'The laser has no line "e9".' },
        ],
      },
    });
    const tunable = inputs(line('e1', 690, { wavelengthToNm: q(1040) }));
    const [first] = evaluateScenarios(tunable, {
      ruleSet: 'icnirp-2013',
      scenarios: [situation()],
    });
    expect(first?.result).toMatchObject({ errors: [{ path: 'scenarios[0].atWavelengthNm.e1' }] });
  });

  it('does not mix lines that leave by different ways', () => {
    const fiber = line('e2', 976, { delivery: 'multimode-fiber', numericalAperture: q(0.22) });
    const laser = inputs(line('e1', 532), fiber);
    const built = scenarioCase(laser, situation({ emissionIds: ['e1', 'e2'] }), 'icnirp-2013');
    expect(built).toMatchObject({
      ok: false,
      errors: [
        {
          path: 'emissionIds',
          message: expect.stringMatching(/free beam.*numerical aperture 0.22/),
        },
      ],
    });
    const alone = scenarioCase(laser, situation({ emissionIds: ['e2'] }), 'icnirp-2013');
    expect(alone).toMatchObject({ case: { path: { kind: 'fiber', numericalAperture: 0.22 } } });
  });

  it('knows which lines nothing covers', () => {
    const laser = inputs(line('e1', 532), line('e2', 1064));
    expect(uncoveredLines(laser, { scenarios: [situation()] })).toEqual(['1064 nm']);
  });
});

describe('proposed situations', () => {
  it('cover every set and every line, and say why they last as long as they do', () => {
    const laser: LaserInputs = {
      emissions: [line('e1', 488), line('e2', 514.5), line('e3', 1064)],
      emissionSets: [{ name: 'blue and green', emissionIds: ['e1', 'e2'] }],
    };
    const scenarios = proposeScenarios(laser, 'iec-60825-1-2014');
    expect(scenarios.map(({ name, emissionIds, eyeS }) => [name, emissionIds, eyeS])).toEqual([
      ['Operation, blue and green', ['e1', 'e2'], 0.25],
      ['Operation', ['e3'], 10],
      ['Alignment, blue and green', ['e1', 'e2'], 10],
      ['Alignment', ['e3'], 10],
    ]);
    expect(scenarios.every(({ exposureReason }) => exposureReason.length > 10)).toBe(true);
    expect(uncoveredLines(laser, { scenarios })).toEqual([]);
    const results = evaluateScenarios(laser, { ruleSet: 'iec-60825-1-2014', scenarios });
    expect(results.every(({ result }) => isEvaluated(result))).toBe(true);
  });

  it('choose a wavelength inside a tuning range, the farthest of its ends and table edges', () => {
    const laser = inputs(line('e1', 690, { wavelengthToNm: q(1040) }));
    const [first] = proposeScenarios(laser, 'iec-60825-1-2014');
    expect(first?.atWavelengthNm.e1).toBeGreaterThanOrEqual(690);
    expect(first?.atWavelengthNm.e1).toBeLessThanOrEqual(1040);
  });
});

describe('what got worse', () => {
  const scenarios = [situation({ emissionIds: ['e1'] })];
  const of = (...lines: Emission[]) => {
    const chosen = [{ ...scenarios[0]!, emissionIds: lines.map(({ id }) => id) }];
    const results = evaluateScenarios(inputs(...lines), {
      ruleSet: 'iec-60825-1-2014',
      scenarios: chosen,
    });
    return { scenarios: chosen, results };
  };

  it('is nothing when nothing changed', () => {
    expect(compareResults(of(line('e1', 532)), of(line('e1', 532)))).toEqual([]);
  });

  it('lists distances and densities that grew, and turns round when they shrink', () => {
    const more = compareResults(of(line('e1', 532)), of(line('e1', 532, { powerW: q(10) })));
    expect(more.length).toBeGreaterThan(3);
    expect(more.every(({ direction }) => direction === 'worse')).toBe(true);
    expect(isWorse(more)).toBe(true);
    const less = compareResults(of(line('e1', 532, { powerW: q(10) })), of(line('e1', 532)));
    expect(less.every(({ direction }) => direction === 'better')).toBe(true);
    expect(isWorse(less)).toBe(false);
  });

  it('puts new lines first, and counts a lower limit as worse', () => {
    const changes = compareResults(of(line('e1', 800)), of(line('e1', 800), line('e2', 400)));
    expect(changes[0]).toMatchObject({ direction: 'new', sealed: null });
    expect(changes.filter(({ what }) => what.startsWith('400 nm')).length).toBe(4);
    const shorter = compareResults(of(line('e1', 1064)), of(line('e1', 532, { label: '1064 nm' })));
    expect(shorter).toContainEqual(
      expect.objectContaining({ what: 'Eye hazard distance', direction: 'worse' }),
    );
  });

  it('says what is gone', () => {
    const changes = compareResults(of(line('e1', 800), line('e2', 400)), of(line('e1', 800)));
    expect(changes).toContainEqual(
      expect.objectContaining({
        what: '400 nm: optical density, eye',
        direction: 'gone',
        today: null,
      }),
    );
  });
});

describe('the reach', () => {
  it('is the worst of all situations, with each line alone', () => {
    const laser = inputs(line('e1', 532), line('e2', 1064));
    const both = situation({ id: 's2', name: 'Both', emissionIds: ['e1', 'e2'], eyeS: 10 });
    const input = { ruleSet: 'iec-60825-1-2014' as const, scenarios: [situation(), both] };
    const results = evaluateScenarios(laser, input);
    const reach = reachOf(input, results);
    expect(reach).toMatchObject({ scenario: 'Both', eyeS: 10, skinS: 10 });
    expect(reach?.lines.map(({ wavelengthNm }) => wavelengthNm)).toEqual([532, 1064]);
    for (const one of reach?.lines ?? []) {
      expect(one.eyeDistanceM).toBeLessThanOrEqual(reach!.eyeDistanceM * (1 + 1e-12));
    }
    expect(reachOf(input, [])).toBeUndefined();
  });
});

describe('inputs', () => {
  it('are told apart field by field', () => {
    const before = inputs(line('e1', 532), line('e2', 1064));
    const after: LaserInputs = {
      ...inputs(
        line('e1', 532, { powerW: q(10, { source: 'measured' }), m2: 1.2 }),
        line('e3', 355),
      ),
      beamPath: 'open',
    };
    expect(changedInputs(before, after)).toEqual([
      { field: '532 nm: power', sealed: '5 W (data sheet)', today: '10 W (measured)' },
      { field: '532 nm: m2', sealed: 'not given', today: '1.2' },
      { field: '1064 nm', sealed: 'on record', today: 'removed' },
      { field: '355 nm', sealed: 'not on record', today: 'added' },
      { field: 'Beam path', sealed: 'not given', today: 'open' },
    ]);
    expect(changedInputs(before, before)).toEqual([]);
  });

  it('are the same whatever they were typed as', () => {
    const typed = inputs(line('e1', 532, { powerW: q(5, { text: '5000 mW' }) }));
    expect(hashedInputs(typed)).toEqual(hashedInputs(inputs(line('e1', 532))));
  });
});

it.each([
  [line('a', 532), 'CW, 5 W'],
  [
    line('a', 800, {
      mode: 'repetitive',
      pulseEnergyJ: q(5e-3),
      pulseDurationS: q(35e-15),
      repetitionRateHz: q(1000),
    }),
    '5 mJ, 35 fs, 1 kHz',
  ],
  [
    line('a', 800, {
      mode: 'mode-locked',
      powerW: q(0.6),
      pulseDurationS: q(10e-15),
      repetitionRateHz: q(80e6),
    }),
    'mode-locked, 600 mW, 10 fs, 80 MHz',
  ],
  [
    line('a', 800, { mode: 'single', pulseEnergyJ: q(4e-5), pulseDurationS: q(3e-13) }),
    '40 µJ, 300 fs, single',
  ],
])('a line in a list reads as on the data sheet', (emission, text) => {
  expect(emissionSummary(emission)).toBe(text);
});
