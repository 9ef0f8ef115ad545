import { changedFields } from './changed-fields';
import { fieldUnit, fieldWords } from './field-words';
import { valueWords } from './value-words';

describe('fields in words', () => {
  it.each([
    ['maker', 'maker', ''],
    ['emissions[0].powerW', 'line 1, power', 'W'],
    ['emissions[2].pulseDurationS.value', 'line 3, pulse duration', 's'],
    ['wallDistanceM', 'wall distance', 'm'],
    ['areaId', 'area', ''],
    ['declaredStandardOn', 'declared standard', ''],
    ['safetyFeatures.keySwitch', 'safety features, key switch', ''],
    ['emissions[0].m2', 'line 1, M²', ''],
  ])('%s reads "%s"', (path, words, unit) => {
    expect(fieldWords(path)).toBe(words);
    expect(fieldUnit(path)).toBe(unit);
  });
});

describe('values in words', () => {
  it('says a quantity as typed, with its source', () => {
    const power = { value: 0.005, text: '5 mW', source: 'data-sheet', uncertaintyPct: 10 };
    expect(valueWords(power, 'emissions[0].powerW')).toBe('5 mW (data sheet, ±10\u202f%)');
  });

  it('gives a bare number the unit of its field', () => {
    expect(valueWords(9.5, 'wallDistanceM')).toBe('9.5\u202fm');
  });

  it.each([
    [null, 'not given'],
    ['', 'not given'],
    [true, 'yes'],
    [false, 'no'],
    [[], 'none'],
    [['a', 'b'], 'a; b'],
    [{ id: 'P1', name: 'Ilse Brandmoor' }, 'Ilse Brandmoor'],
  ])('%j reads "%s"', (value, words) => {
    expect(valueWords(value)).toBe(words);
  });
});

describe('what differs between two versions', () => {
  it('names each field once, and a quantity as one field', () => {
    const before = { maker: 'Quenlorn', emissions: [{ powerW: { value: 5, source: 'label' } }] };
    const after = { maker: 'Quenlorn', emissions: [{ powerW: { value: 2, source: 'measured' } }] };
    expect(changedFields(before, after)).toEqual([
      {
        field: 'emissions[0].powerW',
        before: { value: 5, source: 'label' },
        after: { value: 2, source: 'measured' },
      },
    ]);
  });

  it('takes absent, undefined and null for the same', () => {
    expect(changedFields({ note: undefined, tag: null }, {})).toEqual([]);
  });

  it('shows a line that was added or removed', () => {
    const [change] = changedFields({ emissions: [] }, { emissions: [{ id: 'e1' }] });
    expect(change).toEqual({ field: 'emissions[0]', before: undefined, after: { id: 'e1' } });
  });
});
