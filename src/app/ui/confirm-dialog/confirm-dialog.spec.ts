import { TestBed } from '@angular/core/testing';

import { ConfirmDialog } from './confirm-dialog';

const QUESTION = {
  title: 'Block L-02?',
  text: 'Nobody may use it.',
  action: 'Block',
  reason: { label: 'Reason', minLength: 10 },
};

async function settle(): Promise<void> {
  await new Promise((resolve) => setTimeout(resolve));
  TestBed.tick();
}

describe('the confirmation', () => {
  it('asks for a reason and gives it back, trimmed', async () => {
    const answers: unknown[] = [];
    TestBed.inject(ConfirmDialog)
      .ask(QUESTION)
      .subscribe((answer) => answers.push(answer));
    await settle();
    const form = document.querySelector('lm-confirm-question form');
    const text = form?.querySelector('textarea');
    form?.dispatchEvent(new Event('submit', { cancelable: true }));
    await settle();
    expect(form?.querySelector('.error')?.textContent).toContain('at least 10 characters');
    expect(answers).toEqual([]);
    if (text) text.value = '  Shutter sticks.  ';
    text?.dispatchEvent(new Event('input'));
    form?.dispatchEvent(new Event('submit', { cancelable: true }));
    await vi.waitFor(() => expect(answers).toEqual([{ reason: 'Shutter sticks.' }]));
  });

  it('gives null when the person turns back', async () => {
    const answers: unknown[] = [];
    TestBed.inject(ConfirmDialog)
      .ask(QUESTION)
      .subscribe((answer) => answers.push(answer));
    await settle();
    const buttons = document.querySelectorAll<HTMLButtonElement>('lm-confirm-question button');
    [...buttons].find((button) => button.textContent?.includes('Cancel'))?.click();
    await vi.waitFor(() => expect(answers).toEqual([null]));
  });
});
