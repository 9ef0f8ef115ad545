import { ChangeDetectionStrategy, Component } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { FormArray, FormControl, FormGroup, ReactiveFormsModule, Validators } from '@angular/forms';
import { requiredText } from '@shared/model/common';

import { Control } from './control';
import { Field } from './field';
import { fieldId } from './field-id';
import { setServerErrors } from './server-errors';
import { zodValidator } from './zod-validator';

@Component({
  selector: 'lm-test-host',
  imports: [Control, Field, ReactiveFormsModule],
  template: `
    <form [formGroup]="form">
      <lm-field label="Serial number" path="serial" hint="As on the plate">
        <input lmControl formControlName="serial" />
      </lm-field>
    </form>
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
class Host {
  readonly form = new FormGroup({
    serial: new FormControl('', zodValidator(requiredText('the serial number'))),
    lines: new FormArray([new FormGroup({ powerW: new FormControl(1) })]),
  });
}

describe('a field', () => {
  it('names its control, and shows the hint until there is an error', async () => {
    const fixture = TestBed.createComponent(Host);
    await fixture.whenStable();
    const element = fixture.nativeElement as HTMLElement;
    const input = element.querySelector('input') as HTMLInputElement;
    expect(element.querySelector('label')?.htmlFor).toBe(input.id);
    expect(element.querySelector(`#${input.getAttribute('aria-describedby')}`)?.textContent).toBe(
      'As on the plate',
    );
    input.dispatchEvent(new Event('blur'));
    await fixture.whenStable();
    expect(element.querySelector('.error')?.textContent).toBe('Enter the serial number.');
    expect(input.getAttribute('aria-invalid')).toBe('true');
  });

  it('takes the errors of the server by their path, until the person changes it', async () => {
    const fixture = TestBed.createComponent(Host);
    await fixture.whenStable();
    const { form } = fixture.componentInstance;
    form.controls.serial.setValue('A1');
    const left = setServerErrors(form, [
      { path: 'serial', message: 'This serial is taken.' },
      { path: 'lines[0].powerW', message: 'Too large.', allowed: 'up to 10 W' },
      { path: 'elsewhere', message: 'No field here.' },
    ]);
    await fixture.whenStable();
    expect(left.map((error) => error.path)).toEqual(['elsewhere']);
    expect(form.get('lines.0.powerW')?.errors).toEqual({
      server: 'Too large. Allowed: up to 10 W',
    });
    const element = fixture.nativeElement as HTMLElement;
    expect(element.querySelector('.error')?.textContent).toBe('This serial is taken.');
    form.controls.serial.setValue('A2');
    await fixture.whenStable();
    expect(element.querySelector('.error')).toBeNull();
  });

  it('has an id that an error can point at', () => {
    expect(fieldId('emissions[0].powerW')).toBe('field-emissions-0-powerW');
  });

  it('has words for the validators of the framework too', async () => {
    const fixture = TestBed.createComponent(Host);
    const { serial } = fixture.componentInstance.form.controls;
    serial.setValidators([Validators.required]);
    serial.updateValueAndValidity();
    serial.markAsTouched();
    await fixture.whenStable();
    const element = fixture.nativeElement as HTMLElement;
    expect(element.querySelector('.error')?.textContent).toBe('Enter the serial number.');
  });
});
