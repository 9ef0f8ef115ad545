import { TestBed } from '@angular/core/testing';

import { Quantity } from './quantity';

async function show(inputs: Record<string, unknown>): Promise<HTMLElement> {
  const fixture = TestBed.createComponent(Quantity);
  for (const [name, value] of Object.entries(inputs)) fixture.componentRef.setInput(name, value);
  await fixture.whenStable();
  return fixture.nativeElement as HTMLElement;
}

const shown = (element: HTMLElement) =>
  `${element.querySelector('.number')?.textContent}${element.querySelector('.unit')?.textContent}`;

describe('a quantity', () => {
  it('rounds a distance up and a limit down', async () => {
    expect(shown(await show({ value: 1507.2, unit: 'm', round: 'up' }))).toBe('1.51\u202fkm');
    expect(shown(await show({ value: 25.4558, unit: 'W/m²', round: 'down' }))).toBe(
      '25.4\u202fW/m²',
    );
  });

  it('says the unrounded value to the keyboard too', async () => {
    const element = await show({ value: 25.4558, unit: 'W/m²', round: 'down' });
    const value = element.querySelector('.value');
    expect(value?.getAttribute('tabindex')).toBe('0');
    expect(value?.getAttribute('aria-label')).toBe(
      '25.4 watts per square meter, unrounded 25.4558\u202fW/m²',
    );
  });

  it('shows inputs as they are, with nothing more to see', async () => {
    const element = await show({ value: 0.25, unit: 's', round: 'exact' });
    expect(shown(element)).toBe('0.25\u202fs');
    expect(element.querySelector('.exact')).toBeNull();
  });

  it('has a word, never a zero, for what is not known', async () => {
    const element = await show({ value: null, unit: 'm', round: 'up', nothing: 'not evaluated' });
    expect(element.textContent?.trim()).toBe('not evaluated');
  });
});
