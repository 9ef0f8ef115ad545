import { emptyEmission, emptyLaser, type LaserFormValue } from './laser-form-value';
import { previewOf } from './preview-of';

function typed(value: number) {
  return {
    value: { value },
    source: 'data-sheet',
    uncertaintyPct: null,
    calibratedOn: '',
  } as const;
}

/** A green line of 5 W, 2.3 mm and 0.5 mrad. */
function greenLaser(): LaserFormValue {
  const value = emptyLaser('e1');
  Object.assign(value.emissions[0]!, {
    wavelengthNm: typed(532),
    powerW: typed(5),
    diameterMm: typed(2.3),
    divergenceMrad: typed(0.5),
  });
  return value;
}

describe('the reach while typing', () => {
  it('is unknown, not zero, before anything is typed', () => {
    const preview = previewOf(emptyLaser('e1'), 'eu-2006-25', undefined);
    expect(preview).toEqual({ reach: undefined, isEmpty: true, notes: [] });
  });

  it('is there once a line is complete', () => {
    const { reach } = previewOf(greenLaser(), 'eu-2006-25', 9.5);
    expect(reach?.eyeDistanceM).toBeGreaterThan(1000);
    expect(reach?.skinDistanceM).toBeLessThan(reach!.eyeDistanceM);
    expect(reach).toMatchObject({ eyeS: 0.25, wallDistanceM: 9.5 });
  });

  it('leaves a line out that is not complete, and says so', () => {
    const value = greenLaser();
    const second = { ...emptyEmission('e2'), wavelengthNm: typed(1064) };
    const { reach, notes } = previewOf(
      { ...value, emissions: [...value.emissions, second] },
      'eu-2006-25',
      undefined,
    );
    expect(reach?.lines).toHaveLength(1);
    expect(notes[0]).toMatch(/^Line 2 does not count yet\./);
  });
});
