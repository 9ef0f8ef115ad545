import fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import { parseQuantity } from './quantity';
import { formatInput } from './quantity-format';
import { KINDS, type QuantityKind } from './quantity-units';

/** What is typed, and the value in the kind's own unit with the unit that was understood. */
// prettier-ignore
const READ: readonly (readonly [text: string, kind: QuantityKind, value: number, unit: string])[] = [
  ['5 mW', 'power', 0.005, 'mW'], ['5mW', 'power', 0.005, 'mW'], ['0.005 W', 'power', 0.005, 'W'],
  ['5e-3 W', 'power', 0.005, 'W'], ['5E-3 W', 'power', 0.005, 'W'], ['5e−3 W', 'power', 0.005, 'W'],
  ['5 e-3 W', 'power', 0.005, 'W'], ['5×10^-3 W', 'power', 0.005, 'W'], ['5 x 10^-3 W', 'power', 0.005, 'W'],
  ['5·10⁻³ W', 'power', 0.005, 'W'], ['5*10^(-3) W', 'power', 0.005, 'W'], ['10^-3 W', 'power', 0.001, 'W'],
  ['10⁻³ W', 'power', 0.001, 'W'], ['10² W', 'power', 100, 'W'], ['5', 'power', 5, 'W'], ['5.', 'power', 5, 'W'],
  ['.5', 'power', 0.5, 'W'], [',5 W', 'power', 0.5, 'W'], ['5. mW', 'power', 0.005, 'mW'], ['+5 mW', 'power', 0.005, 'mW'],
  ['  5 mW  ', 'power', 0.005, 'mW'], ['5\u202fmW', 'power', 0.005, 'mW'], ['5\u00a0mW', 'power', 0.005, 'mW'],
  ['5\u2009mW', 'power', 0.005, 'mW'], ['5\u2007mW', 'power', 0.005, 'mW'], ['5 µW', 'power', 5e-6, 'µW'],
  ['5 uW', 'power', 5e-6, 'µW'], ['5 μW', 'power', 5e-6, 'µW'], ['5uW', 'power', 5e-6, 'µW'],
  ['5 nW', 'power', 5e-9, 'nW'], ['5 pW', 'power', 5e-12, 'pW'], ['5 kW', 'power', 5000, 'kW'],
  ['5 KW', 'power', 5000, 'kW'], ['5 GW', 'power', 5e9, 'GW'], ['1.5 W', 'power', 1.5, 'W'], ['1,5 W', 'power', 1.5, 'W'],
  ['1,50 W', 'power', 1.5, 'W'], ['0,005 W', 'power', 0.005, 'W'], ['0,5 W', 'power', 0.5, 'W'],
  ['1,2345 W', 'power', 1.2345, 'W'], ['12,34 W', 'power', 12.34, 'W'], ['1234,5 W', 'power', 1234.5, 'W'],
  ['2 watt', 'power', 2, 'W'], ['2 watts', 'power', 2, 'W'], ['0.35 W', 'power', 0.35, 'W'], ['800 mW', 'power', 0.8, 'mW'],
  ['0.95 mW', 'power', 0.00095, 'mW'], ['4000', 'power', 4000, 'W'], ['4 000 W', 'power', 4000, 'W'],
  ['4,000.0 W', 'power', 4000, 'W'], ['4.000,5 W', 'power', 4000.5, 'W'], ['1,000,000 nW', 'power', 0.001, 'nW'],
  ['1.000.000 nW', 'power', 0.001, 'nW'], ['1’000 W', 'power', 1000, 'W'], ["1'000 W", 'power', 1000, 'W'],
  ['001 W', 'power', 1, 'W'], ['1.0 W', 'power', 1, 'W'], ['3E2 W', 'power', 300, 'W'], ['3e+2 W', 'power', 300, 'W'],

  ['532', 'wavelength', 532, 'nm'], ['532 nm', 'wavelength', 532, 'nm'], ['532nm', 'wavelength', 532, 'nm'],
  ['632.8 nm', 'wavelength', 632.8, 'nm'], ['632,8 nm', 'wavelength', 632.8, 'nm'], ['457.9nm', 'wavelength', 457.9, 'nm'],
  ['1064 nm', 'wavelength', 1064, 'nm'], ['1 064 nm', 'wavelength', 1064, 'nm'], ['1\u202f064 nm', 'wavelength', 1064, 'nm'],
  ['1.064 µm', 'wavelength', 1064, 'µm'], ['1.064 um', 'wavelength', 1064, 'µm'], ['1.064um', 'wavelength', 1064, 'µm'],
  ['1.064 μm', 'wavelength', 1064, 'µm'], ['0,532 µm', 'wavelength', 532, 'µm'], ['0.532 µm', 'wavelength', 532, 'µm'],
  ['10.6 µm', 'wavelength', 10_600, 'µm'], ['10,6 µm', 'wavelength', 10_600, 'µm'], ['10.6 micron', 'wavelength', 10_600, 'µm'],
  ['10.6 microns', 'wavelength', 10_600, 'µm'], ['4.6um', 'wavelength', 4600, 'µm'], ['1 mm', 'wavelength', 1e6, 'mm'],
  ['1e-6 m', 'wavelength', 1000, 'm'], ['5320 Å', 'wavelength', 532, 'Å'], ['1,064.5 nm', 'wavelength', 1064.5, 'nm'],
  ['1.064,5 nm', 'wavelength', 1064.5, 'nm'], ['1 000 000 nm', 'wavelength', 1e6, 'nm'], ['1,000,000 nm', 'wavelength', 1e6, 'nm'],
  ['193.3', 'wavelength', 193.3, 'nm'], ['2e3 nm', 'wavelength', 2000, 'nm'], ['1064.0 nm', 'wavelength', 1064, 'nm'],
  ['1,0640 µm', 'wavelength', 1064, 'µm'], ['0.355 um', 'wavelength', 355, 'µm'], ['266.0nm', 'wavelength', 266, 'nm'],

  ['10 ns', 'duration', 1e-8, 'ns'], ['10ns', 'duration', 1e-8, 'ns'], ['35 fs', 'duration', 3.5e-14, 'fs'],
  ['250 fs', 'duration', 2.5e-13, 'fs'], ['8 ps', 'duration', 8e-12, 'ps'], ['1 µs', 'duration', 1e-6, 'µs'],
  ['1 us', 'duration', 1e-6, 'µs'], ['18 μs', 'duration', 1.8e-5, 'µs'], ['2 ms', 'duration', 0.002, 'ms'],
  ['0.25 s', 'duration', 0.25, 's'], ['0,25 s', 'duration', 0.25, 's'], ['0.25', 'duration', 0.25, 's'], ['.25 s', 'duration', 0.25, 's'],
  ['10 sec', 'duration', 10, 's'], ['10 seconds', 'duration', 10, 's'], ['1 second', 'duration', 1, 's'],
  ['10 min', 'duration', 600, 'min'], ['1 minute', 'duration', 60, 'min'], ['5 minutes', 'duration', 300, 'min'],
  ['8 h', 'duration', 28_800, 'h'], ['8h', 'duration', 28_800, 'h'], ['8 hours', 'duration', 28_800, 'h'],
  ['1 hour', 'duration', 3600, 'h'], ['1 hr', 'duration', 3600, 'h'], ['0.5 h', 'duration', 1800, 'h'],
  ['1 d', 'duration', 86_400, 'd'], ['30 000 s', 'duration', 30_000, 's'], ['30000', 'duration', 30_000, 's'],
  ['3e4 s', 'duration', 30_000, 's'], ['1e-13 s', 'duration', 1e-13, 's'], ['100 s', 'duration', 100, 's'], ['5.5 ns', 'duration', 5.5e-9, 'ns'],

  ['20 Hz', 'rate', 20, 'Hz'], ['20Hz', 'rate', 20, 'Hz'], ['20', 'rate', 20, 'Hz'], ['1 kHz', 'rate', 1000, 'kHz'],
  ['1 KHz', 'rate', 1000, 'kHz'], ['200kHz', 'rate', 200_000, 'kHz'], ['80 MHz', 'rate', 8e7, 'MHz'], ['80MHz', 'rate', 8e7, 'MHz'],
  ['76.5 MHz', 'rate', 7.65e7, 'MHz'], ['1 GHz', 'rate', 1e9, 'GHz'], ['20 1/s', 'rate', 20, 'Hz'], ['20 s⁻¹', 'rate', 20, 'Hz'],
  ['20 s^-1', 'rate', 20, 'Hz'], ['10 000 Hz', 'rate', 10_000, 'Hz'], ['1e5 Hz', 'rate', 1e5, 'Hz'], ['0.5 Hz', 'rate', 0.5, 'Hz'],

  ['10 mJ', 'energy', 0.01, 'mJ'], ['100 µJ', 'energy', 1e-4, 'µJ'], ['100 uJ', 'energy', 1e-4, 'µJ'], ['50 nJ', 'energy', 5e-8, 'nJ'],
  ['0.45 J', 'energy', 0.45, 'J'], ['450mJ', 'energy', 0.45, 'mJ'], ['1 joule', 'energy', 1, 'J'], ['2 kJ', 'energy', 2000, 'kJ'],
  ['3,5 mJ', 'energy', 0.0035, 'mJ'], ['1.2e-3 J', 'energy', 0.0012, 'J'], ['5 pJ', 'energy', 5e-12, 'pJ'],

  ['7 mm', 'diameter', 7, 'mm'], ['7', 'diameter', 7, 'mm'], ['2.3 mm', 'diameter', 2.3, 'mm'], ['2,3mm', 'diameter', 2.3, 'mm'],
  ['1.1 cm', 'diameter', 11, 'cm'], ['50 µm', 'diameter', 0.05, 'µm'], ['0.01 m', 'diameter', 10, 'm'], ['900 um', 'diameter', 0.9, 'µm'],
  ['50 µm', 'micrometers', 50, 'µm'], ['50', 'micrometers', 50, 'µm'], ['0.05 mm', 'micrometers', 50, 'mm'], ['6.6um', 'micrometers', 6.6, 'µm'],
  ['9.5 m', 'distance', 9.5, 'm'], ['9,5', 'distance', 9.5, 'm'], ['1.51 km', 'distance', 1510, 'km'], ['100 mm', 'distance', 0.1, 'mm'],
  ['35 cm', 'distance', 0.35, 'cm'], ['-0.2 m', 'position', -0.2, 'm'], ['−20 cm', 'position', -0.2, 'cm'], ['0', 'position', 0, 'm'],

  ['1.5 mrad', 'divergence', 1.5, 'mrad'], ['1.5mrad', 'divergence', 1.5, 'mrad'], ['1,5', 'divergence', 1.5, 'mrad'],
  ['0.5 mrad', 'divergence', 0.5, 'mrad'], ['500 µrad', 'divergence', 0.5, 'µrad'], ['500 urad', 'divergence', 0.5, 'µrad'],
  ['0.02 rad', 'divergence', 20, 'rad'], ['30°', 'degrees', 30, '°'], ['30 deg', 'degrees', 30, '°'], ['30 degrees', 'degrees', 30, '°'],
  ['30', 'degrees', 30, '°'], ['0', 'degrees', 0, '°'], ['0 °', 'degrees', 0, '°'],

  ['25.4 W/m²', 'irradiance', 25.4, 'W/m²'], ['25.4 W/m2', 'irradiance', 25.4, 'W/m²'], ['25.4 W/m^2', 'irradiance', 25.4, 'W/m²'],
  ['25.4 W m-2', 'irradiance', 25.4, 'W/m²'], ['25.4 W m^-2', 'irradiance', 25.4, 'W/m²'], ['25,4 W·m⁻²', 'irradiance', 25.4, 'W/m²'],
  ['25.4', 'irradiance', 25.4, 'W/m²'], ['2.54 mW/cm²', 'irradiance', 25.4, 'mW/cm²'], ['2.54 mW/cm2', 'irradiance', 25.4, 'mW/cm²'],
  ['2.54 mW cm-2', 'irradiance', 25.4, 'mW/cm²'], ['2.54 mW/sq.cm', 'irradiance', 25.4, 'mW/cm²'], ['1 W/cm²', 'irradiance', 1e4, 'W/cm²'],
  ['2 kW/m²', 'irradiance', 2000, 'kW/m²'], ['1 W/mm²', 'irradiance', 1e6, 'W/mm²'], ['10 uW/cm2', 'irradiance', 0.1, 'µW/cm²'],
  ['30 J/m²', 'radiant-exposure', 30, 'J/m²'], ['30 J / m2', 'radiant-exposure', 30, 'J/m²'], ['3 mJ/cm2', 'radiant-exposure', 30, 'mJ/cm²'],
  ['0.5 µJ/cm²', 'radiant-exposure', 0.005, 'µJ/cm²'], ['0.5 uJ cm^-2', 'radiant-exposure', 0.005, 'µJ/cm²'],

  ['10 %', 'percent', 10, '%'], ['10%', 'percent', 10, '%'], ['2,5 %', 'percent', 2.5, '%'], ['10', 'percent', 10, '%'],
  ['0', 'percent', 0, '%'], ['10 percent', 'percent', 10, '%'], ['0.1 1/km', 'attenuation', 0.1, '1/km'], ['0.1', 'attenuation', 0.1, '1/km'],
  ['0.1 /km', 'attenuation', 0.1, '1/km'], ['0.1 km^-1', 'attenuation', 0.1, '1/km'], ['0.1 km⁻¹', 'attenuation', 0.1, '1/km'],
  ['0.001 1/m', 'attenuation', 1, '1/m'], ['0', 'attenuation', 0, '1/km'],
];

// prettier-ignore
const REFUSED: readonly (readonly [text: string, kind: QuantityKind, message: string])[] = [
  ['', 'power', 'Enter a number'], ['   ', 'duration', 'for example 10 ns'], ['abc', 'power', 'is not a number'],
  ['mW', 'power', 'is not a number'], ['5 foo', 'power', '“foo” is not a unit'], ['5 mW 3', 'power', 'is not a unit'],
  ['5 W W', 'power', 'is not a unit'], ['2 5 W', 'power', 'is not a unit'], ['5e', 'power', 'is not a unit'], ['1.2.3 W', 'power', 'is not a number'],
  ['1,2,3 W', 'power', 'is not a number'], ['1/4 s', 'duration', 'is not a unit'], ['5 eV', 'energy', 'is not a unit'],
  ['532 W', 'wavelength', '“W” is a power; here stands a length'], ['5 nm', 'power', '“nm” is a length; here stands a power'],
  ['10 mJ', 'power', 'is an energy'], ['5 mW', 'energy', 'is a power'], ['10 Hz', 'duration', 'is a frequency'],
  ['10 ns', 'rate', 'is a duration'], ['1 mrad', 'diameter', 'is an angle'], ['1 mm', 'divergence', 'is a length'],
  ['5 W', 'irradiance', 'is a power; here stands an irradiance'], ['30 J/m²', 'irradiance', 'is a radiant exposure'],
  ['5 %', 'power', 'is a ratio'], ['<5 mW', 'power', 'Leave out “<”'], ['≤ 1 mW', 'power', 'Leave out “≤”'], ['~5 mW', 'power', 'Leave out “~”'],
  ['5-10 mW', 'power', 'not a range'], ['5 – 10 mW', 'power', 'not a range'], ['690 to 1040 nm', 'wavelength', 'not a range'],
  ['5 mW ± 10 %', 'power', 'uncertainty in its own field'], ['5 +/- 1 mW', 'power', 'uncertainty'], ['-5 mW', 'power', 'above 0'],
  ['0 W', 'power', 'above 0'], ['0', 'duration', 'above 0'], ['-1 %', 'percent', '0 or a number above'], ['1e999 W', 'power', 'too large'],
  ['1e-999 W', 'power', 'too small'], ['NaN', 'power', 'is not a number'], ['Infinity W', 'power', 'is not a number'], ['0x10 W', 'power', 'is not a unit'],
];

// prettier-ignore
const ASKED: readonly (readonly [text: string, kind: QuantityKind, options: readonly string[]])[] = [
  ['1,064', 'wavelength', ['1064 nm', '1.064 nm']], ['1,064 nm', 'wavelength', ['1064 nm', '1.064 nm']],
  ['1,064 µm', 'wavelength', ['1064 µm', '1.064 µm']], ['12,345 W', 'power', ['12345 W', '12.345 W']],
  ['100,000 s', 'duration', ['100000 s', '100 s']], ['5 MW', 'power', ['5 MW', '5 mW']], ['5MW', 'power', ['5 MW', '5 mW']],
  ['5 mw', 'power', ['5 mW', '5 MW']], ['2 MJ', 'energy', ['2 MJ', '2 mJ']], ['5 Mm', 'diameter', ['5 Mm', '5 mm']],
  ['80 mHz', 'rate', ['80 mHz', '80 MHz']], ['80 mhz', 'rate', ['80 mHz', '80 MHz']], ['20 hz', 'rate', ['20 Hz']],
  ['5 w', 'power', ['5 W']], ['532 NM', 'wavelength', ['532 nm']], ['10 NS', 'duration', ['10 ns']],
  ['1.5 Mrad', 'divergence', ['1.5 Mrad', '1.5 mrad']], ['10 Ms', 'duration', ['10 Ms', '10 ms']], ['1.5 MRAD', 'divergence', ['1.5 mrad', '1.5 Mrad']],
];

describe('parseQuantity', () => {
  it.each(READ)('reads “%s” as %s', (text, kind, value, unit) => {
    expect(parseQuantity(text, kind)).toMatchObject({ ok: true, value, unit });
  });

  it.each(REFUSED)('refuses “%s” as %s and says why', (text, kind, message) => {
    const reading = parseQuantity(text, kind);
    expect(reading).toMatchObject({ ok: false, allowed: KINDS[kind].allowed });
    expect(reading.ok === false && reading.message).toContain(message);
  });

  it.each(ASKED)('asks what “%s” means as %s', (text, kind, options) => {
    const reading = parseQuantity(text, kind);
    expect(reading.ok === 'ask' && reading.options.map((option) => option.label)).toEqual(options);
  });

  it('has at least 200 inputs in its tables', () => {
    expect(READ.length + REFUSED.length + ASKED.length).toBeGreaterThanOrEqual(200);
  });

  it('keeps the text as typed, and adds the unit that stood beside the field', () => {
    expect(parseQuantity('5mW', 'power')).toMatchObject({ text: '5mW', si: 0.005 });
    expect(parseQuantity('532', 'wavelength')).toMatchObject({ text: '532 nm', si: 532e-9 });
    expect(parseQuantity('5', 'power', 'mW')).toMatchObject({ text: '5 mW', value: 0.005 });
  });

  it('gives each reading of an unclear text in full', () => {
    const reading = parseQuantity('5 MW', 'power');
    expect(reading.ok === 'ask' && reading.options.map(({ reading: { value } }) => value)).toEqual([
      5e6, 0.005,
    ]);
  });

  it('never throws, whatever is typed', () => {
    const kinds = Object.keys(KINDS) as QuantityKind[];
    fc.assert(
      fc.property(fc.string({ unit: 'binary' }), fc.constantFrom(...kinds), (text, kind) => {
        expect([true, false, 'ask']).toContain(parseQuantity(text, kind).ok);
      }),
      { numRuns: 2000 },
    );
  });

  it('reads what formatInput writes as the same number, in every kind', () => {
    const kinds = Object.keys(KINDS) as QuantityKind[];
    const number = fc
      .tuple(
        fc.double({ min: 1, max: 10, maxExcluded: true, noNaN: true }),
        fc.integer({ min: -16, max: 9 }),
      )
      .map(([mantissa, exponent]) => Number(`${mantissa}e${exponent}`));
    fc.assert(
      fc.property(number, fc.constantFrom(...kinds), (value, kind) => {
        const text = formatInput(value, KINDS[kind].unit);
        const reading = parseQuantity(text, kind);
        const readings = reading.ok === 'ask' ? reading.options.map((o) => o.reading) : [reading];
        expect(readings.some((one) => one.ok === true && one.value === value)).toBe(true);
      }),
      { numRuns: 10_000 },
    );
  });
});
