import { TestBed } from '@angular/core/testing';

import { PasswordPrompt } from './password-prompt';

async function open(inputs: Record<string, unknown> = {}) {
  const fixture = TestBed.createComponent(PasswordPrompt);
  const all = { statement: 'I approve L-16.', action: 'Sign and seal', ...inputs };
  for (const [name, value] of Object.entries(all)) fixture.componentRef.setInput(name, value);
  await fixture.whenStable();
  const element = fixture.nativeElement as HTMLElement;
  const signed: string[] = [];
  fixture.componentInstance.signed.subscribe((password) => signed.push(password));
  const submit = async () => {
    element.querySelector('form')?.dispatchEvent(new Event('submit', { cancelable: true }));
    await fixture.whenStable();
  };
  return { element, input: element.querySelector('input') as HTMLInputElement, signed, submit };
}

describe('the password prompt', () => {
  it('shows the sentence beside the button that signs it', async () => {
    const { element, input, signed, submit } = await open();
    expect(element.querySelector('.lm-statement')?.textContent).toBe('I approve L-16.');
    input.value = 'threshold-and-door';
    await submit();
    expect(signed).toEqual(['threshold-and-door']);
  });

  it('does not sign without a password', async () => {
    const { element, signed, submit } = await open();
    await submit();
    expect(signed).toEqual([]);
    expect(element.querySelector('.error')?.textContent).toContain('Enter your password');
  });

  it('is off, and says why, for a person who may not sign', async () => {
    const { element, input } = await open({ reasons: ['You wrote this evaluation yourself.'] });
    expect(input.disabled).toBe(true);
    expect(element.querySelector('button')?.disabled).toBe(true);
    expect(element.textContent).toContain('You wrote this evaluation yourself.');
  });
});
