import { provideZonelessChangeDetection } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { provideRouter } from '@angular/router';
import type { LaserImport } from '@shared/model/laser-imports';

import { ImportReport } from './import-report';

const CHECKED: LaserImport = {
  id: 'i1',
  fileName: 'lasers.csv',
  status: 'checked',
  rowsTotal: 3,
  rowsDone: 3,
  rowsGood: 3,
  lasers: 2,
  errors: [],
  errorCount: 0,
  warnings: [],
  createdAt: '2026-12-01T08:00:00.000Z',
};

async function show(report: Partial<LaserImport>) {
  TestBed.configureTestingModule({
    providers: [provideZonelessChangeDetection(), provideRouter([])],
  });
  const fixture = TestBed.createComponent(ImportReport);
  fixture.componentRef.setInput('report', { ...CHECKED, ...report });
  await fixture.whenStable();
  const element: HTMLElement = fixture.nativeElement;
  const buttons = [...element.querySelectorAll('button, a')].map((one) => one.textContent?.trim());
  return { element, buttons };
}

describe('the report of an import', () => {
  it('offers to save when every row is right', async () => {
    const { buttons } = await show({});
    expect(buttons).toEqual(['Save 2 lasers', 'Cancel']);
  });

  it('does not offer to save while one row is wrong, and says where', async () => {
    const errors = [
      { row: 2, column: 'power_w', given: '5', message: 'The unit is missing.', allowed: '5 mW' },
      { row: 2, column: 'class', given: 'IIIb/4', message: 'This is not one class.' },
    ];
    const { buttons, element } = await show({ rowsGood: 2, errors, errorCount: 2 });
    expect(buttons).toEqual(['Read another file', 'Errors as CSV']);
    expect(element.querySelector('h2')?.textContent).toContain('2 errors');
    expect(element.querySelector('h3')?.textContent).toBe('Errors in 1 row');
    const cells = [...element.querySelectorAll('tbody tr:first-child > *')].map((cell) =>
      cell.textContent?.replace(/\s+/g, ' ').trim(),
    );
    expect(cells).toEqual(['2', 'power_w', '5', 'The unit is missing. Allowed: 5 mW']);
  });

  it('shows how far it is', async () => {
    const { element } = await show({ status: 'checking', rowsDone: 500, rowsTotal: 2000 });
    expect(element.querySelector('progress')?.value).toBe(25);
    expect(element.textContent).toContain('500 of 2000 rows');
  });

  it('stays after saving, with the way to the list', async () => {
    const { buttons, element } = await show({ status: 'saved' });
    expect(element.querySelector('h2')?.textContent).toContain('2 lasers saved');
    expect(buttons).toEqual(['To the list of lasers', 'Read another file']);
  });
});
