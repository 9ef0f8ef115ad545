import { provideZonelessChangeDetection } from '@angular/core';
import { type ComponentFixture, TestBed } from '@angular/core/testing';
import { NonNullableFormBuilder } from '@angular/forms';

import { EmissionEditor } from './emission-editor';
import { emissionForm, type EmissionForm } from './laser-form';
import { emptyEmission } from './laser-form-value';

describe('the fields of a line', () => {
  let fixture: ComponentFixture<EmissionEditor>;
  let form: EmissionForm;
  let element: HTMLElement;

  beforeEach(async () => {
    TestBed.configureTestingModule({ providers: [provideZonelessChangeDetection()] });
    form = emissionForm(TestBed.inject(NonNullableFormBuilder), emptyEmission('e1'));
    fixture = TestBed.createComponent(EmissionEditor);
    fixture.componentRef.setInput('form', form);
    fixture.componentRef.setInput('index', 0);
    element = fixture.nativeElement;
    await fixture.whenStable();
  });

  const labels = () =>
    [...element.querySelectorAll('lm-sourced-quantity label[for]')].map(
      (label) => label.firstChild?.textContent?.trim() ?? '',
    );
  const notes = () => [...element.querySelectorAll('.notes li')].map((note) => note.textContent);

  async function change(patch: Parameters<EmissionForm['patchValue']>[0]) {
    form.patchValue(patch);
    await fixture.whenStable();
  }

  it('follow the mode', async () => {
    expect(labels()).toContain('Power, maximum');
    await change({ mode: 'burst' });
    expect(labels()).not.toContain('Power, maximum');
    expect(labels()).toEqual(
      expect.arrayContaining(['Pulse energy', 'Pulses in a burst', 'Rate inside a burst']),
    );
  });

  it('follow the way out', async () => {
    await change({ delivery: 'single-mode-fiber' });
    expect(labels()).toContain('Mode-field diameter');
    expect(labels()).not.toContain('Diameter at the exit');
  });

  it('have a second axis for an elliptical beam', async () => {
    await change({ isElliptical: true });
    expect(labels()).toEqual(
      expect.arrayContaining(['Diameter at the exit, x', 'Diameter at the exit, y']),
    );
  });

  it('say what is made of data-sheet figures', async () => {
    await change({
      wavelengthNm: { value: { value: 532 } },
      powerW: { value: { value: 5 } },
      diameterMm: { value: { value: 1 } },
      diameterConvention: 'fwhm',
      divergenceMrad: { value: { value: 0.5 } },
      divergenceAngle: 'half',
    });
    // Gaussian: 1/e² width = 1.699 FWHM; a half angle is half the full one.
    expect(notes()).toEqual([
      expect.stringMatching(/1 mm at half maximum \(FWHM\) is 1\.699 mm at 1\/e²/),
      expect.stringMatching(/half angle 0\.5 mrad is the full angle 1 mrad/),
    ]);
  });

  it('say what is missing before the line can be evaluated', async () => {
    await change({ wavelengthNm: { value: { value: 532 } } });
    expect(notes().join(' ')).toContain('the power is missing');
  });

  it('set the source of every number at once', async () => {
    await change({ wavelengthNm: { value: { value: 532 } }, powerW: { value: { value: 5 } } });
    const select = element.querySelector<HTMLSelectElement>('#field-emissions-0-source')!;
    select.value = 'label';
    select.dispatchEvent(new Event('change'));
    await fixture.whenStable();
    expect(form.controls.powerW.value.source).toBe('label');
    expect(form.controls.diameterMm.value.source).toBe('label');
  });
});
