import { readListState, writeListState } from './laser-list-query';

describe('the state of the list in the address', () => {
  it('reads filters in the words of the API', () => {
    const state = readListState({
      q: '532 nm 3B',
      class: '3B',
      state: 'blocked',
      fromNm: '400',
      toNm: '700',
      attention: 'stale',
      sort: 'eye-distance',
      order: 'desc',
      rows: '150',
    });
    expect(state.filter).toEqual({
      q: '532 nm 3B',
      class: '3B',
      state: 'blocked',
      fromNm: 400,
      toNm: 700,
      attention: 'stale',
    });
    expect(state).toMatchObject({ sort: 'eye-distance', order: 'desc', rows: 150 });
  });

  it('leaves out what the address says wrongly', () => {
    const state = readListState({
      class: '5',
      fromNm: '18',
      sort: 'price',
      order: 'up',
      rows: '-3',
    });
    expect(state).toEqual({ filter: {}, sort: 'attention', order: 'asc', rows: 50 });
  });

  it('leaves defaults out of the address', () => {
    const params = writeListState(readListState({}));
    expect(Object.values(params).every((value) => value === null)).toBe(true);
  });

  it('writes what it read', () => {
    const address = { q: 'pump', areaId: 'a1', sort: 'tag', order: 'desc', rows: '100' };
    const params = writeListState(readListState(address));
    expect(Object.fromEntries(Object.entries(params).filter(([, value]) => value))).toEqual(
      address,
    );
  });
});
