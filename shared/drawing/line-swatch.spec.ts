import { describe, expect, it } from 'vitest';

import { isVisible, lineSwatch, linesText, spokenLine, visibleColor } from './line-swatch';

const at = (...wavelengths: number[]) => wavelengths.map((wavelengthNm) => ({ wavelengthNm }));

describe('the line swatch', () => {
  it('takes 400 nm up to but not including 700 nm as visible, as the engine does', () => {
    expect([399.9, 400, 699.9, 700].map(isVisible)).toEqual([false, true, true, false]);
  });

  it('fills visible lines with their color and hatches the others', () => {
    const fills = (nm: number) =>
      lineSwatch({ wavelengthNm: nm }, 16).shapes.map((s) => 'fill' in s && s.fill);
    expect(fills(532)).toContain(visibleColor(532));
    expect(fills(355)).toContain('#7a3fc4');
    expect(fills(1064)).toContain('#b3202a');
  });

  it('has the hue that one sees, dulled', () => {
    expect(visibleColor(532)).toMatch(/^#6.d61a$/);
    expect(visibleColor(650)).toBe('#d61a1a');
    expect(visibleColor(470)).toMatch(/^#1a..d6$/);
  });

  it('puts the edge on the side that faces the visible spectrum', () => {
    const edge = (nm: number) =>
      lineSwatch({ wavelengthNm: nm }, 16).shapes.find(
        (shape) => shape.kind === 'rect' && shape.width === 4,
      );
    expect(edge(266)).toMatchObject({ x: 18 });
    expect(edge(1550)).toMatchObject({ x: 0 });
  });

  it('writes the numbers with their units', () => {
    expect(linesText(at(1064, 532, 355))).toBe('1064, 532, 355\u202fnm');
    expect(linesText(at(800, 10_600))).toBe('800\u202fnm, 10.6\u202fµm');
    expect(linesText(at(514.5, 457.9, 488), true)).toBe('457.9–514.5\u202fnm');
    expect(linesText([{ wavelengthNm: 690, wavelengthToNm: 1040 }])).toBe('690–1040\u202fnm');
    expect(linesText(at(300, 400, 500, 600, 700, 800, 900, 1000))).toBe(
      '300, 400, 500\u202fnm + 5',
    );
  });

  it('has a name for those who do not see it', () => {
    expect(spokenLine({ wavelengthNm: 532 })).toBe('532 nanometers, visible green');
    expect(spokenLine({ wavelengthNm: 1064 })).toBe('1064 nanometers, infrared');
    expect(spokenLine({ wavelengthNm: 690, wavelengthToNm: 1040 })).toBe(
      'tunable from 690 nanometers to 1040 nanometers, visible red to infrared',
    );
  });
});
