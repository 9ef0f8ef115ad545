import { describe, expect, it } from 'vitest';

import { readSearch } from './laser-search-words';

describe('a search for lasers', () => {
  it('understands wavelength, class and room in any order', () => {
    const expected = {
      bands: [{ fromNm: 531.5, toNm: 532.5 }],
      classes: ['3B'],
      words: ['B-204'],
    };
    expect(readSearch('532 nm 3B B-204')).toEqual(expected);
    expect(readSearch('b-204 3b 532nm')).toEqual({ ...expected, words: ['b-204'] });
  });

  it('takes ranges, decimals and micrometers', () => {
    expect(readSearch('700-900 nm').bands).toEqual([{ fromNm: 699.5, toNm: 900.5 }]);
    expect(readSearch('632.8 nm').bands[0]?.fromNm).toBeCloseTo(632.75, 10);
    expect(readSearch('10.6 µm').bands[0]?.toNm).toBeCloseTo(10_650, 10);
  });

  it('reads a bare digit as a class only after the word class', () => {
    expect(readSearch('class 4').classes).toEqual(['4']);
    expect(readSearch('model 4')).toEqual({ bands: [], classes: [], words: ['model', '4'] });
  });

  it('leaves out the words that find nothing by themselves', () => {
    expect(readSearch('532 nm 3B room 2').words).toEqual(['2']);
  });
});
