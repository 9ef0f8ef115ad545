import fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import {
  formatFull,
  formatInput,
  formatOpticalDensity,
  formatQuantity,
  formatWavelength,
  type Rounding,
  spokenUnit,
  UNIT_SPACE,
} from './quantity-format';

// prettier-ignore
const ROUNDED: readonly (readonly [value: number, unit: string, rounding: Rounding, text: string])[] = [
  [1507.2, 'm', 'up', '1.51 km'], [1507.2, 'm', 'down', '1.50 km'], [1507.2, 'm', 'nearest', '1.51 km'],
  [25.4558, 'W/m²', 'down', '25.4 W/m²'], [25.4558, 'W/m²', 'up', '25.5 W/m²'], [2000, 'W/m²', 'down', '2.00 kW/m²'],
  [168, 'm', 'up', '168 m'], [168.00000000003, 'm', 'up', '168 m'], [168.001, 'm', 'up', '169 m'], [1.1, 'm', 'up', '1.10 m'],
  [999.5, 'm', 'up', '1.00 km'], [999.99, 'W/m²', 'down', '999 W/m²'], [0.357, 'm', 'up', '357 mm'], [133_000, 'm', 'up', '133 km'],
  [0.25, 's', 'nearest', '0.250 s'], [30_000, 's', 'nearest', '30 000 s'], [1e-8, 's', 'nearest', '10.0 ns'],
  [0.5, 'mrad', 'nearest', '0.500 mrad'], [1e-20, 'J', 'nearest', '1.00×10⁻²⁰ J'], [3.77, '', 'up', '3.77'], [0, 'm', 'up', '0 m'],
];

describe('formatQuantity', () => {
  it.each(ROUNDED)('writes %d %s rounded %s as %s', (value, unit, rounding, text) => {
    expect(formatQuantity(value, unit, rounding).text).toBe(text.replace(/ /g, UNIT_SPACE));
  });

  it('never puts a limit above, nor a distance below, the value', () => {
    const factors: Readonly<Record<string, number>> = {
      mm: 1e-3,
      µm: 1e-6,
      nm: 1e-9,
      km: 1e3,
      m: 1,
    };
    fc.assert(
      fc.property(fc.double({ min: 1e-6, max: 1e6, noNaN: true }), (value) => {
        const shown = (rounding: Rounding) => {
          const { number, unit } = formatQuantity(value, 'm', rounding);
          return Number(number.replaceAll(UNIT_SPACE, '')) * (factors[unit] ?? Number.NaN);
        };
        // The tenth digit is the solver's noise.
        expect(shown('up')).toBeGreaterThanOrEqual(value * (1 - 1e-9));
        expect(shown('down')).toBeLessThanOrEqual(value * (1 + 1e-9));
        expect(shown('up') / shown('down')).toBeLessThanOrEqual(1.0101);
      }),
      { numRuns: 2000 },
    );
  });

  it('shows an unknown as a dash, never as zero', () => {
    expect(formatQuantity(Number.NaN, 'm', 'up').text).toBe('–');
  });
});

describe('the other forms', () => {
  it('gives the value unrounded', () => {
    expect(formatFull(1507.2384, 'm')).toBe(`1.5072384${UNIT_SPACE}km`);
    expect(formatFull(0.25, 's')).toBe(`0.25${UNIT_SPACE}s`);
    expect(formatFull(-0.2, 'm')).toBe(`−200${UNIT_SPACE}mm`);
  });

  it('rounds an optical density up', () => {
    expect(formatOpticalDensity(3.7612)).toBe('3.77');
    expect(formatOpticalDensity(3.77)).toBe('3.77');
    expect(formatOpticalDensity(3.7700000000001)).toBe('3.77');
    expect(formatOpticalDensity(0)).toBe('0.00');
    expect(formatOpticalDensity(3.71, 1)).toBe('3.8');
  });

  it('keeps every digit of a wavelength', () => {
    expect(formatWavelength(632.8).text).toBe(`632.8${UNIT_SPACE}nm`);
    expect(formatWavelength(10_600).text).toBe(`10.6${UNIT_SPACE}µm`);
  });

  it('writes inputs with the prefix that suits them', () => {
    expect(formatInput(0.005, 'W')).toBe('5 mW');
    expect(formatInput(1e-8, 's')).toBe('10 ns');
    expect(formatInput(1064, 'nm')).toBe('1064 nm');
  });

  it('speaks units in words', () => {
    expect(spokenUnit('W/m²')).toBe('watts per square meter');
    expect(spokenUnit('mJ/cm²')).toBe('millijoules per square centimeter');
    expect(spokenUnit('km')).toBe('kilometers');
    expect(spokenUnit('mrad')).toBe('milliradians');
  });
});
