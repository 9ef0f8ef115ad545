import { TestBed } from '@angular/core/testing';
import { NonNullableFormBuilder } from '@angular/forms';
import * as z from 'zod';

import { contractWords } from '../../ui/field/contract-words';
import { zodValidator } from '../../ui/field/zod-validator';
import { contractErrors } from './contract-errors';
import { filled } from './filled';
import { formErrors } from './form-errors';

describe('a form’s value for the contract', () => {
  it('leaves out what is empty, and objects of nothing', () => {
    const value = {
      maker: 'Quenlorn',
      serial: '',
      year: null,
      flags: { key: null, shutter: false },
    };
    expect(filled(value)).toEqual({ maker: 'Quenlorn', flags: { shutter: false } });
    expect(filled({ a: '', b: { c: null } })).toBeUndefined();
  });

  it('keeps lists, also empty ones', () => {
    expect(filled({ emissions: [], lines: [{ id: 'e1', label: '' }] })).toEqual({
      emissions: [],
      lines: [{ id: 'e1' }],
    });
  });
});

describe('errors of the contract', () => {
  const schema = z.strictObject({
    lines: z.array(z.strictObject({ powerW: z.number().min(1) })).min(1),
    kind: z.enum(['a', 'b']),
    year: z.int().max(2100),
  });

  it('name fields as the server does, in our words', () => {
    const parsed = schema.safeParse(
      { lines: [{ powerW: 0 }], kind: 'c', year: 3000 },
      { error: contractWords },
    );
    expect(contractErrors(parsed.error!)).toEqual([
      { path: 'lines[0].powerW', message: 'At least 1.' },
      { path: 'kind', message: 'Choose one of the list.' },
      { path: 'year', message: 'At most 2100.' },
    ]);
  });

  it('say what to do where something is missing', () => {
    const parsed = schema.safeParse({ lines: [], kind: 'a' }, { error: contractWords });
    expect(contractErrors(parsed.error!).map(({ message }) => message)).toEqual([
      'Give at least one.',
      'Fill this in.',
    ]);
  });

  it('keep the contract’s own sentence for an empty text', () => {
    const validate = zodValidator(z.string().min(1, { error: 'Enter the maker.' }));
    const control = TestBed.inject(NonNullableFormBuilder).control('');
    expect(validate(control)).toEqual({ zod: 'Enter the maker.' });
  });
});

describe('errors of a form’s controls', () => {
  it('carry the path that the contract has for the field', () => {
    const fb = TestBed.inject(NonNullableFormBuilder);
    const wrong = () => ({ own: 'Wrong.' });
    const form = fb.group({
      name: ['', wrong],
      lines: fb.array([fb.group({ ok: [''], power: ['', wrong] })]),
      off: [{ value: '', disabled: true }, wrong],
    });
    expect(formErrors(form)).toEqual([
      { path: 'name', message: 'Wrong.' },
      { path: 'lines[0].power', message: 'Wrong.' },
    ]);
  });
});
