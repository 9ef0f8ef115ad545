import { TestBed } from '@angular/core/testing';
import { NonNullableFormBuilder } from '@angular/forms';
import { type LaserInput, laserInputSchema } from '@shared/model/lasers';

import { filled } from '../../../core/forms/filled';
import { laserForm, laserFormValue } from './laser-form';
import { copyOf, emptyLaser, formValueOf, laserInputFrom } from './laser-form-value';
import { newEmissionId } from './new-emission-id';

const LASER: LaserInput = laserInputSchema.parse({
  tag: 'L-02',
  maker: 'Quenlorn',
  model: 'QG-5',
  serial: 'QG5-1207',
  year: 2021,
  homeBuilt: false,
  mobile: false,
  declaredClass: '4',
  verifiedClass: '4',
  unattended: false,
  safetyFeatures: { keySwitch: true, shutter: false },
  inServiceSince: '2022-03-01',
  emissions: [
    {
      id: 'e1',
      wavelengthNm: { value: 532, text: '532 nm', source: 'data-sheet' },
      mode: 'cw',
      powerW: { value: 5, text: '5 W', source: 'data-sheet', uncertaintyPct: 5 },
      operatingPowerW: {
        value: 3.5,
        text: '3.5 W',
        source: 'measured',
        calibratedOn: '2026-02-01',
      },
      delivery: 'beam',
      diameterMm: { value: 2.3, source: 'data-sheet' },
      diameterConvention: '1/e2',
      divergenceMrad: { value: 0.5, source: 'data-sheet' },
      divergenceConvention: '1/e2',
      divergenceAngle: 'full',
      profile: 'gaussian',
      waistDistanceM: -0.2,
      m2: 1.1,
    },
  ],
  emissionSets: [{ name: 'all', emissionIds: ['e1'] }],
});

function throughForm(laser: LaserInput) {
  const fb = TestBed.inject(NonNullableFormBuilder);
  const form = laserForm(fb, formValueOf(laser));
  return laserInputSchema.parse(filled(laserInputFrom(laserFormValue(form))));
}

describe('a laser in its form', () => {
  it('comes out as it went in', () => {
    expect(throughForm(LASER)).toEqual(LASER);
  });

  it('keeps what a change of mode hides, and sends it only when it counts', () => {
    const value = formValueOf(LASER);
    value.emissions[0]!.mode = 'single';
    const [line] = (laserInputFrom(value) as LaserInput).emissions;
    expect(line).not.toHaveProperty('powerW');
    expect(value.emissions[0]!.powerW.value?.value).toBe(5);
  });

  it('sends the second axis and the end of a tuning range only when there is one', () => {
    const value = formValueOf(LASER);
    const line = value.emissions[0]!;
    line.diameterYMm = { ...line.diameterMm };
    line.wavelengthToNm = { ...line.wavelengthNm };
    const sent = () => (laserInputFrom(value) as LaserInput).emissions[0];
    expect(sent()).not.toHaveProperty('diameterYMm');
    line.isElliptical = true;
    line.isTunable = true;
    expect(sent()).toHaveProperty('diameterYMm');
    expect(sent()).toHaveProperty('wavelengthToNm');
  });

  it('sends the calibration of a meter only with a measured number', () => {
    const value = formValueOf(LASER);
    value.emissions[0]!.operatingPowerW.source = 'label';
    const [line] = (laserInputFrom(value) as LaserInput).emissions;
    expect(line?.operatingPowerW).not.toHaveProperty('calibratedOn');
  });

  it('copied leaves out what belongs to the first laser alone', () => {
    const { record, emissions } = copyOf(LASER);
    expect(record).not.toHaveProperty('tag');
    expect(record).not.toHaveProperty('serial');
    expect(record).not.toHaveProperty('verifiedClass');
    expect(record.maker).toBe('Quenlorn');
    expect(emissions).toHaveLength(1);
  });

  it('that is empty asks for the wavelength of its line', () => {
    const fb = TestBed.inject(NonNullableFormBuilder);
    const form = laserForm(fb, emptyLaser('e1'));
    const wavelength = form.controls.emissions.at(0).controls.wavelengthNm.controls.value;
    expect(wavelength.errors).toEqual({ missing: 'Enter the wavelength, for example 532 nm.' });
  });
});

describe('the id of a new line', () => {
  it('is one that no line has', () => {
    expect(newEmissionId([])).toBe('e1');
    expect(newEmissionId(['e1', 'e2'])).toBe('e3');
    expect(newEmissionId(['e2'])).toBe('e3');
    expect(newEmissionId(['e3', 'e2'])).toBe('e4');
  });
});
