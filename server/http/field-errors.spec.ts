import * as z from 'zod';
import { expect, it } from 'vitest';

import { fieldErrors, wordsFor } from './field-errors';

const schema = z.strictObject({
  emissions: z.array(
    z.strictObject({
      wavelengthNm: z.strictObject({ value: z.number().min(180).max(1e6) }),
      beam: z.discriminatedUnion('shape', [
        z.strictObject({ shape: z.literal('circular'), diameterMm: z.number() }),
        z.strictObject({
          shape: z.literal('elliptical'),
          diametersMm: z.array(z.number()).length(2),
        }),
      ]),
      size: z.union([z.number(), z.strictObject({ major: z.number(), minor: z.number() })]),
      class: z.enum(['1', '2', '4']),
    }),
  ),
});

function errorsOf(emission: object) {
  const parsed = schema.safeParse({ emissions: [emission] }, { error: wordsFor });
  return parsed.success ? [] : fieldErrors(parsed.error);
}

const GOOD = {
  wavelengthNm: { value: 532 },
  beam: { shape: 'circular', diameterMm: 1 },
  size: 1,
  class: '4',
};

it('errors stand at the path that the form uses, and say what is allowed', () => {
  expect(errorsOf({ ...GOOD, wavelengthNm: { value: 18 }, class: '3' })).toEqual([
    {
      path: 'emissions[0].wavelengthNm.value',
      message: 'This is out of range: at least 180.',
      allowed: 'at least 180',
    },
    {
      path: 'emissions[0].class',
      message: 'This must be 1, 2 or 4.',
      allowed: '1, 2 or 4',
    },
  ]);
});

it('something missing, and something of another type, are said as such', () => {
  expect(errorsOf({ ...GOOD, class: undefined, wavelengthNm: { value: '532' } })).toEqual([
    { path: 'emissions[0].wavelengthNm.value', message: 'This must be a number.' },
    { path: 'emissions[0].class', message: 'This must be 1, 2 or 4.', allowed: '1, 2 or 4' },
  ]);
});

it('in a choice of forms the errors are those of the form that was meant', () => {
  expect(errorsOf({ ...GOOD, size: { major: 1 } })[0]?.path).toBe('emissions[0].size.minor');
  expect(errorsOf({ ...GOOD, beam: { shape: 'circular' } })[0]?.path).toBe(
    'emissions[0].beam.diameterMm',
  );
  expect(errorsOf({ ...GOOD, beam: { shape: 'square' } })[0]?.path).toContain('emissions[0].beam');
});

it('keys that are not known are named one by one', () => {
  const errors = errorsOf({ ...GOOD, color: 'red', power: 1 });
  expect(errors.map((error) => error.path)).toEqual(['emissions[0].color', 'emissions[0].power']);
});
