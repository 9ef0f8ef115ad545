import { TestBed } from '@angular/core/testing';

import { LineSwatch } from './line-swatch';

async function show(inputs: Record<string, unknown>): Promise<HTMLElement> {
  const fixture = TestBed.createComponent(LineSwatch);
  for (const [name, value] of Object.entries(inputs)) fixture.componentRef.setInput(name, value);
  await fixture.whenStable();
  return fixture.nativeElement as HTMLElement;
}

describe('the line swatch', () => {
  it('never stands without its number', async () => {
    const element = await show({ lines: [{ wavelengthNm: 532 }] });
    expect(element.querySelector('.number')?.textContent).toBe('532\u202fnm');
    expect(element.querySelector('.lm-unseen')?.textContent).toBe('532 nanometers, visible green');
  });

  it('shows three chips and the count of the rest when there are more than six', async () => {
    const lines = [1, 2, 3, 4, 5, 6, 7].map((step) => ({ wavelengthNm: 500 + step }));
    const element = await show({ lines });
    expect(element.querySelectorAll('svg')).toHaveLength(3);
    expect(element.querySelector('.number')?.textContent).toBe('501, 502, 503\u202fnm + 4');
  });

  it('says that 700 to 780 nm may be seen', async () => {
    const element = await show({ lines: [{ wavelengthNm: 780 }] });
    expect(element.querySelector('.number')?.getAttribute('title')).toContain('faint deep red');
  });
});
