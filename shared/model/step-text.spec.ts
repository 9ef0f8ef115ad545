import { describe, expect, it } from 'vitest';

import { shortened, stepUnit, stepValue } from './step-text';

describe('text of a step', () => {
  it.each([
    [25.455844122715714, '25.45584'],
    [0.00070710678, '7.071068\u202f×\u202f10⁻⁴'],
    [563519657894736.8, '5.635197\u202f×\u202f10¹⁴'],
    [0, '0'],
    [-0.5, '−0.5'],
    [0.007, '0.007'],
  ])('gives %d as %s', (value, text) => {
    expect(stepValue({ value })).toBe(text);
  });

  it('prints squares, and no unit for a bare number', () => {
    expect(stepUnit({ unit: 'W/m2' })).toBe('W/m²');
    expect(stepUnit({ unit: '1' })).toBe('');
    expect(stepUnit({ unit: 'rad' })).toBe('rad');
  });

  it.each([
    ['18*C_A*t^0.75', '18*C_A*t^0.75'],
    ['0.0007071067811865476 + 2*r_12345678901', '0.0007071067812 + 2*r_12345678901'],
    ['3.7339207841145267e-19/1.602176634e-19', '3.733920784e-19/1.602176634e-19'],
    ['299792458/(532*1e-9)', '299792458/(532*1e-9)'],
    ['log10(129.92240250000001)', 'log10(129.9224025)'],
  ])('shortens the numbers of %s', (formula, text) => {
    expect(shortened(formula)).toBe(text);
  });
});
