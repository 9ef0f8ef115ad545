import type { Evaluation, ResultChange } from '@shared/model/evaluations';

import { todaysReach } from './todays-reach';

function result(eyeM: number, skinM: number, aidedM?: number) {
  return {
    eye: { hazardDistanceM: eyeM, aidedHazardDistanceM: aidedM, perBeam: [] },
    skin: { hazardDistanceM: skinM, perBeam: [] },
  };
}

function change(what: string, today: number | null, scenario = 'Operation'): ResultChange {
  return { scenario, what, unit: 'm', sealed: 1, today, direction: 'worse' };
}

function evaluation(whatChanged: ResultChange[]): Evaluation {
  return {
    input: {
      scenarios: [
        { id: 's1', name: 'Operation' },
        { id: 's2', name: 'Alignment' },
      ],
    },
    results: [
      { scenarioId: 's1', result: result(1410, 155, 9390) },
      { scenarioId: 's2', result: result(700, 40) },
    ],
    whatChanged,
  } as unknown as Evaluation;
}

describe('the reach with today’s inputs', () => {
  it('is the sealed one where nothing changed', () => {
    expect(todaysReach(evaluation([]))).toEqual({
      eyeDistanceM: 1410,
      skinDistanceM: 155,
      aidedDistanceM: 9390,
    });
  });

  it('is the farthest of all situations after the change', () => {
    const changes = [
      change('Eye hazard distance', 900),
      change('Eye hazard distance', 2000, 'Alignment'),
      change('Skin hazard distance', 100),
    ];
    expect(todaysReach(evaluation(changes))).toMatchObject({
      eyeDistanceM: 2000,
      skinDistanceM: 100,
    });
  });

  it('is not told when no situation has a distance today', () => {
    const gone = ['Operation', 'Alignment'].flatMap((scenario) => [
      change('Eye hazard distance', null, scenario),
      change('Skin hazard distance', null, scenario),
    ]);
    expect(todaysReach(evaluation(gone))).toBeUndefined();
  });
});
