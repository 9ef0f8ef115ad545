import { ChangeDetectionStrategy, Component } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { FormControl, ReactiveFormsModule, Validators } from '@angular/forms';

import { QuantityField, type TypedQuantity } from './quantity-field';

@Component({
  selector: 'lm-test-host',
  imports: [QuantityField, ReactiveFormsModule],
  template: `<lm-quantity-field label="Power" path="powerW" kind="power" [formControl]="power" />`,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
class Host {
  readonly power = new FormControl<TypedQuantity | null>(null, Validators.required);
}

async function open() {
  const fixture = TestBed.createComponent(Host);
  await fixture.whenStable();
  const element = fixture.nativeElement as HTMLElement;
  const input = element.querySelector('input') as HTMLInputElement;
  const type = async (text: string) => {
    input.value = text;
    input.dispatchEvent(new Event('input'));
    await fixture.whenStable();
  };
  const leave = async () => {
    input.dispatchEvent(new Event('blur'));
    await fixture.whenStable();
  };
  const note = () => element.querySelector('.note')?.textContent?.replace(/\s+/g, ' ').trim() ?? '';
  return { control: fixture.componentInstance.power, element, fixture, input, leave, note, type };
}

describe('the quantity field', () => {
  it('holds the number in the unit of the contract and the text as typed', async () => {
    const { control, note, type } = await open();
    await type('5mW');
    expect(control.value).toEqual({ value: 0.005, text: '5mW' });
    expect(note()).toBe('= 0.005 W');
  });

  it('does not ask again what was answered before the number was stored', async () => {
    const { control, fixture, note } = await open();
    control.setValue({ value: 10e6, text: '10 MW' });
    await fixture.whenStable();
    expect(control.valid).toBe(true);
    expect(note()).not.toContain('slip of the shift key');
  });

  it('shows the unit that a bare number takes, until one is typed', async () => {
    const { element, type } = await open();
    expect(element.querySelector('.unit')?.textContent).toBe('W');
    await type('5 mW');
    expect(element.querySelector('.unit')).toBeNull();
  });

  it('says what is wrong and what is allowed once the field is left, and keeps the text', async () => {
    const { control, input, leave, note, type } = await open();
    await type('5 nm');
    expect(note()).toBe('');
    await leave();
    expect(note()).toContain('“nm” is a length; here stands a power.');
    expect(note()).toContain('Allowed: nW, µW, mW, W, kW, MW.');
    expect(input.value).toBe('5 nm');
    expect(control.value).toBeNull();
    expect(input.getAttribute('aria-invalid')).toBe('true');
    expect(input.getAttribute('aria-describedby')).toBe('field-powerW-note');
  });

  it('asks when a text can be read in two ways, and takes the answer', async () => {
    const { control, element, fixture, note, type } = await open();
    await type('5 MW');
    expect(control.valid).toBe(false);
    const options = [...element.querySelectorAll<HTMLButtonElement>('.options button')];
    expect(options.map((option) => option.textContent)).toEqual(['5 MW', '5 mW']);
    options[0]?.click();
    await fixture.whenStable();
    expect(control.value).toEqual({ value: 5e6, text: '5 MW' });
    expect(control.valid).toBe(true);
    expect(note()).toBe('= 5 000 000 W');
  });

  it('shows a stored value as it was typed, or with the prefix that suits it', async () => {
    const { control, fixture, input } = await open();
    control.setValue({ value: 0.005, text: '5e-3 W' });
    await fixture.whenStable();
    expect(input.value).toBe('5e-3 W');
    control.setValue({ value: 0.005 });
    await fixture.whenStable();
    expect(input.value).toBe('5 mW');
  });

  it('asks for a required value with an example', async () => {
    const { leave, note } = await open();
    await leave();
    expect(note()).toContain('Enter a number with its unit, for example 5 mW.');
  });
});
