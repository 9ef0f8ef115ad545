import { TestBed } from '@angular/core/testing';

import { Formula } from './formula';

async function show(text: string): Promise<HTMLElement> {
  const fixture = TestBed.createComponent(Formula);
  fixture.componentRef.setInput('text', text);
  await fixture.whenStable();
  return fixture.nativeElement as HTMLElement;
}

describe('a formula', () => {
  it('sets fractions, roots, indices and powers', async () => {
    const element = await show('sqrt(D_f^2/(4*Phi))');
    expect(element.querySelector('svg.radical')).not.toBeNull();
    expect(element.querySelector('.over sub')?.textContent).toBe('f');
    expect(element.querySelector('.over sup')?.textContent).toBe('2');
    expect(element.querySelector('.below')?.textContent?.replace(/\s/g, '')).toBe('4·Φ');
    expect(element.querySelector('.paren')).toBeNull();
  });

  it('writes powers of ten as on paper', async () => {
    expect((await show('1.8e-3*t')).querySelector('sup')?.textContent).toBe('−3');
  });

  it('is read aloud as it is written', async () => {
    expect((await show('18*t^0.75')).getAttribute('aria-label')).toBe('18*t^0.75');
  });

  it('shows what it cannot set as it is', async () => {
    expect((await show('read from the table')).textContent).toBe('read from the table');
  });
});
