import { describe, expect, it } from 'vitest';

import { fontMetrics, PDF_FONTS } from './pdf-fonts';
import { formulaSvg, shortNumber } from './formula-svg';

function textsOf(formula: string): string[] {
  const svg = formulaSvg(formula, 11, 300)?.svg ?? '';
  return [...svg.matchAll(/<text[^>]*>([^<]*)<\/text>/g)].map((match) => match[1] ?? '');
}

describe('formula', () => {
  it('prints a product with its dot, index and exponent', () => {
    expect(textsOf('18*C_A*t^0.75')).toEqual(['18', '·', 'C', 'A', '·', 't', '0.75']);
  });

  it('prints log as the natural and log10 as the decimal logarithm', () => {
    expect(textsOf('log(x)')).toContain('ln');
    expect(textsOf('log10(x)')).toEqual(expect.arrayContaining(['log', '10']));
  });

  it('prints a power of ten with a true minus', () => {
    expect(textsOf('5e-7')).toEqual(['5', '×', '10', '−7']);
  });

  it('stacks a fraction: numerator above denominator, a bar between', () => {
    const svg = formulaSvg('a/b', 10, 100)?.svg ?? '';
    const heights = [...svg.matchAll(/<text[^>]* y="([\d.]+)"/g)].map((match) => Number(match[1]));
    expect(heights[0]).toBeLessThan(heights[1] ?? 0);
    expect(svg).toContain('<path');
  });

  it('sets a wide formula smaller, and leaves one that cannot be read to the page', () => {
    const wide = formulaSvg('alpha_max + beta_max + gamma_max', 11, 400);
    const narrow = formulaSvg('alpha_max + beta_max + gamma_max', 11, (wide?.width ?? 0) * 0.8);
    expect(narrow?.width).toBeCloseTo((wide?.width ?? 0) * 0.8);
    expect(formulaSvg('alpha_max + beta_max + gamma_max', 11, 20)).toBeUndefined();
  });

  it('leaves to the page what is not mathematics', () => {
    expect(formulaSvg('read from the table', 11, 300)).toBeUndefined();
  });

  it.each([
    ['0.25', '0.25'],
    ['25.455844122715710', '25.45584412'],
    ['5E-7', '5e-7'],
    ['0.00018000000000000001', '0.00018'],
  ])('shortens %s to %s', (written, printed) => {
    expect(shortNumber(written)).toBe(printed);
  });
});

describe('font metrics', () => {
  it('gives figures of one width in the sans serif (tabular figures of the font file)', () => {
    const sans = fontMetrics(PDF_FONTS.Sans.normal);
    expect(new Set([...'0123456789'].map((digit) => sans.width(digit))).size).toBe(1);
  });
});
