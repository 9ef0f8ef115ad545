import { TestBed } from '@angular/core/testing';
import type { ExposureChartModel } from '@shared/drawing/exposure-chart';

import { ExposureChart } from './exposure-chart';

const MODEL: ExposureChartModel = {
  unit: 'W/m²',
  title: 'one line',
  points: [0.1, 1e5].map((distanceM) => ({ distanceM, value: 1e4 / distanceM ** 2 })),
  limits: [{ side: 'eye', value: 25, label: 'Eye limit 25.0 W/m²', distanceM: 20 }],
};

async function open() {
  const fixture = TestBed.createComponent(ExposureChart);
  fixture.componentRef.setInput('model', MODEL);
  await fixture.whenStable();
  const element = fixture.nativeElement as HTMLElement;
  const press = async (key: string) => {
    element
      .querySelector('[role=slider]')
      ?.dispatchEvent(new KeyboardEvent('keydown', { key, cancelable: true }));
    await fixture.whenStable();
    return element.querySelector('[role=slider]')?.getAttribute('aria-valuetext');
  };
  return { element, fixture, press };
}

describe('the exposure chart', () => {
  it('is read with the arrow keys, rounded up', async () => {
    const { press } = await open();
    expect(await press('Home')).toBe('1.00 megawatts per square meter at 100 millimeters');
    expect(await press('PageUp')).toBe('10.0 kilowatts per square meter at 1.00 meters');
    expect(await press('ArrowRight')).toContain('at 1.12 meters');
    expect(await press('End')).toContain('at 100 kilometers');
    expect(await press('ArrowRight')).toContain('at 100 kilometers');
  });

  it('can be read as a table', async () => {
    const { element, fixture } = await open();
    element.querySelector<HTMLButtonElement>('.toggle')?.click();
    await fixture.whenStable();
    expect(element.querySelectorAll('tbody tr')).toHaveLength(19);
    expect(element.querySelector('svg')).toBeNull();
  });
});
