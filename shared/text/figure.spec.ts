import { describe, expect, it } from 'vitest';
import { figure } from './figure';

describe('a figure in a sentence', () => {
  it.each([
    [5, 'W', '5 W'],
    [0.002, 'J', '2 mJ'],
    [1e-8, 's', '10 ns'],
    [0.00099999999, 'W', '1 mW'],
    [30_000, 's', '30,000 s'],
    [0.25, 's', '250 ms'],
    [80e6, 'Hz', '80 MHz'],
    [1.6986436, 'mm', '1.699 mm'],
    [0, 'm', '0 m'],
    [10_600, 'nm', '10,600 nm'],
    [532, '', '532'],
    [1e-16, 's', '0.1 fs'],
  ] as const)('%d %s reads "%s"', (value, unit, text) => {
    expect(figure(value, unit)).toBe(text);
  });
});
