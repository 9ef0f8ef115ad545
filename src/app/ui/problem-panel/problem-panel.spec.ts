import { TestBed } from '@angular/core/testing';
import { PROBLEMS, type Problem } from '@shared/model/problem';

import { ProblemPanel } from './problem-panel';

const INVALID: Problem = {
  type: '/problems/invalid-input',
  name: 'invalid-input',
  ...PROBLEMS['invalid-input'],
  errors: [{ path: 'serial', message: 'Enter the serial number.', allowed: 'letters and digits' }],
};

async function show(problem: Problem | null) {
  const fixture = TestBed.createComponent(ProblemPanel);
  document.body.append(fixture.nativeElement as HTMLElement);
  fixture.componentRef.setInput('problem', problem);
  await fixture.whenStable();
  return { element: fixture.nativeElement as HTMLElement, fixture };
}

describe('the problem panel', () => {
  it('takes the focus and links each error to its field', async () => {
    const { element } = await show(INVALID);
    expect(document.activeElement).toBe(element);
    expect(element.querySelector('h2')?.textContent).toBe('Some input needs correction');
    expect(element.querySelector('a')?.getAttribute('href')).toBe('#field-serial');
    expect(element.textContent).toContain('Allowed: letters and digits');
  });

  it('moves to the field when its error is chosen', async () => {
    const field = document.createElement('input');
    field.id = 'field-serial';
    field.scrollIntoView = () => undefined;
    document.body.append(field);
    const { element } = await show(INVALID);
    element.querySelector('a')?.click();
    expect(document.activeElement).toBe(field);
  });

  it('lists every reason why a step is refused', async () => {
    const { element } = await show({
      type: '/problems/guard-failed',
      name: 'guard-failed',
      ...PROBLEMS['guard-failed'],
      reasons: ['One.', 'Two.'],
    });
    expect([...element.querySelectorAll('.reason')].map((reason) => reason.textContent)).toEqual([
      'One.',
      'Two.',
    ]);
  });
});
