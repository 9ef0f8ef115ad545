import { TestBed } from '@angular/core/testing';

import { ReachStrip } from './reach-strip';

const REACH = { skinDistanceM: 167.2, eyeDistanceM: 1507.2, wallDistanceM: 11 };

async function show(inputs: Record<string, unknown>): Promise<HTMLElement> {
  const fixture = TestBed.createComponent(ReachStrip);
  for (const [name, value] of Object.entries(inputs)) fixture.componentRef.setInput(name, value);
  document.body.append(fixture.nativeElement as HTMLElement);
  await fixture.whenStable();
  return fixture.nativeElement as HTMLElement;
}

describe('the reach strip', () => {
  it('has a name that says the distances', async () => {
    const element = await show({ reach: REACH, subject: 'L-16' });
    expect(element.querySelector('svg')?.getAttribute('aria-label')).toBe(
      'Reach of L-16: skin 168 meters, eye 1.51 kilometers; wall of the room at 11.0 meters',
    );
  });

  it('is hidden from screen readers where the numbers stand beside it', async () => {
    const element = await show({ reach: REACH, subject: 'L-16', size: 'row', decorative: true });
    const svg = element.querySelector('svg');
    expect(svg?.getAttribute('aria-hidden')).toBe('true');
    expect(svg?.getAttribute('width')).toBe('244');
  });

  it('lets the arrows go from sill to sill, nearest first, each saying its unrounded value', async () => {
    const element = await show({ reach: REACH, subject: 'L-16', pointable: true });
    const sills = [...element.querySelectorAll('button')];
    expect(sills.map((sill) => sill.getAttribute('aria-label'))).toEqual([
      'Skin hazard distance, unrounded 167.2\u202fm',
      'Eye hazard distance, unrounded 1.5072\u202fkm',
    ]);
    sills[0]?.focus();
    sills[0]?.dispatchEvent(new KeyboardEvent('keydown', { key: 'ArrowRight', bubbles: true }));
    expect(document.activeElement).toBe(sills[1]);
  });

  it('uses the roles of the theme for its colors', async () => {
    const element = await show({ reach: REACH, subject: 'L-16' });
    expect(element.querySelector('[fill="var(--lm-skin)"]')).not.toBeNull();
    expect(element.querySelector('[stroke="var(--lm-eye)"]')).not.toBeNull();
  });
});
