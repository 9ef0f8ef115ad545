import { TestBed } from '@angular/core/testing';
import { EVALUATION_STATE_WORDS, EVALUATION_STATES } from '@shared/workflow/evaluation-life-cycle';
import { LASER_STATE_WORDS, LASER_STATES } from '@shared/workflow/laser-life-cycle';

import { StateChip } from './state-chip';

async function show(inputs: Record<string, unknown>): Promise<HTMLElement> {
  const fixture = TestBed.createComponent(StateChip);
  for (const [name, value] of Object.entries(inputs)) fixture.componentRef.setInput(name, value);
  await fixture.whenStable();
  return fixture.nativeElement as HTMLElement;
}

describe('the state chip', () => {
  it.each([...EVALUATION_STATES, ...LASER_STATES])(
    'has an icon and a word for %s',
    async (state) => {
      const element = await show({ state });
      const words = { ...LASER_STATE_WORDS, ...EVALUATION_STATE_WORDS };
      expect(element.textContent?.trim()).toBe(words[state]);
      expect(element.querySelector('path')?.getAttribute('d')).toBeTruthy();
    },
  );

  it('fills only what is blocked or withdrawn as wrong', async () => {
    const filled: string[] = [];
    for (const state of [...EVALUATION_STATES, ...LASER_STATES]) {
      if ((await show({ state })).className.includes('filled')) filled.push(state);
    }
    expect(new Set(filled)).toEqual(new Set(['withdrawn', 'blocked']));
    expect((await show({ state: 'withdrawn', record: 'laser' })).className).toBe('dashed');
  });
});
