import { provideZonelessChangeDetection } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { provideRouter } from '@angular/router';
import type { LaserRow } from '@shared/model/lasers';

import { LaserTable } from './laser-table';

const ROW: LaserRow = {
  id: 'l2',
  version: 1,
  tag: 'L-02',
  maker: 'Quenlorn',
  model: 'QG-5',
  area: { id: 'a1', code: 'A-101', name: 'Ultrafast lab' },
  wallDistanceM: 9.5,
  declaredClass: '3B',
  verifiedClass: '4',
  state: 'in-use',
  lines: [{ wavelengthNm: 532, mode: 'cw', summary: 'CW, 5 W' }],
  reach: {
    evaluationId: 'v1',
    evaluationNumber: 1,
    state: 'approved',
    ruleSet: 'eu-2006-25',
    eyeS: 0.25,
    skinS: 10,
    eyeDistanceM: 1407.2,
    skinDistanceM: 155,
    opticalDensity: 3.701,
    scenario: 'Operation',
    lines: [],
  },
  attention: [],
};

describe('rows of the register', () => {
  const sorted = vi.fn();

  async function show(...rows: readonly Partial<LaserRow>[]) {
    sorted.mockReset();
    TestBed.configureTestingModule({
      providers: [provideZonelessChangeDetection(), provideRouter([])],
    });
    const fixture = TestBed.createComponent(LaserTable);
    fixture.componentRef.setInput(
      'rows',
      rows.map((row) => ({ ...ROW, ...row })),
    );
    fixture.componentRef.setInput('sorting', { sort: 'tag', order: 'asc' });
    fixture.componentInstance.sortingChange.subscribe(sorted);
    await fixture.whenStable();
    const element: HTMLElement = fixture.nativeElement;
    const cell = (name: string) =>
      element.querySelector(`td.${name}`)?.textContent?.replace(/\s+/g, ' ').trim() ?? '';
    return { element, cell };
  }

  it('round distance and density up, and say the duration with them', async () => {
    const { cell } = await show({});
    expect(cell('distance')).toBe('1.41 km at 0.25 s');
    expect(cell('density')).toBe('3.71');
  });

  it('show the verified class before the declared one', async () => {
    const { cell } = await show({});
    expect(cell('class')).toBe('Class 4');
  });

  it('never show unknown as zero', async () => {
    const { cell } = await show({ reach: undefined });
    expect(cell('distance')).toBe('not evaluated');
    expect(cell('density')).toBe('–');
  });

  it('say none where nothing is above the limit', async () => {
    const { cell } = await show({ reach: { ...ROW.reach!, eyeDistanceM: 0, opticalDensity: 0 } });
    expect(cell('distance')).toBe('none at 0.25 s');
  });

  it('say what waits, but not the word of the chip again', async () => {
    const { cell } = await show({
      state: 'blocked',
      attention: ['Blocked', 'Evaluation stale', 'Review due'],
    });
    expect(cell('state')).toBe('Blocked Evaluation stale and 1 more');
  });

  it('turn the order at the second press on a head', async () => {
    const { element } = await show({});
    const [tag, lines] = [...element.querySelectorAll<HTMLButtonElement>('thead button')];
    tag!.click();
    expect(sorted).toHaveBeenLastCalledWith({ sort: 'tag', order: 'desc' });
    lines!.click();
    expect(sorted).toHaveBeenLastCalledWith({ sort: 'wavelength', order: 'asc' });
    expect(element.querySelector('th.laser')?.getAttribute('aria-sort')).toBe('ascending');
  });
});
