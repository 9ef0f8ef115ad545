import fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import { ONE_INK_PALETTE, PRINT_PALETTE } from './palettes';
import { type Reach, type ReachDistances, reachName } from './reach';
import { distanceAt, METRICS, metricsForWidth, widthOf, xOf } from './reach-axis';
import { reachStrip, reachStripSvg } from './reach-strip';
import type { RectShape, Shape } from './shapes';

const FIBER: ReachDistances = {
  skinDistanceM: 155,
  eyeDistanceM: 1410,
  aidedDistanceM: 9390,
  wallDistanceM: 9.5,
};

const SIZES = Object.values(METRICS);

function rects(shapes: readonly Shape[], fill: string): RectShape[] {
  return shapes.filter((shape) => shape.kind === 'rect' && shape.fill === fill) as RectShape[];
}

/** From where to where the ground of a lane runs, in all its stretches together. */
function extent(shapes: readonly Shape[], y: number): { from: number; to: number } {
  const lane = rects(shapes, 'sheet').filter((rect) => rect.y === y);
  return {
    from: Math.min(...lane.map((rect) => rect.x)),
    to: Math.max(...lane.map((rect) => rect.x + rect.width)),
  };
}

describe('the reach strip', () => {
  it('has the row of the specification: lanes, wall and feet at their places', () => {
    const { shapes, width, height, sills } = reachStrip(FIBER, METRICS.row);
    expect([width, height]).toEqual([244, 20]);
    expect(extent(shapes, 3).from).toBe(11);
    expect(extent(shapes, 3).to).toBeCloseTo(129.0, 0);
    expect(extent(shapes, 7).to).toBeCloseTo(164.5, 0);
    expect(extent(shapes, 13).to).toBeCloseTo(195.0, 0);
    expect(xOf(9.5, METRICS.row)).toBeCloseTo(84.2, 1);
    expect(sills.map((sill) => sill.side)).toEqual(['aided', 'eye', 'skin']);
  });

  it('has the axis of six decades from 0.1 m to 100 km, whatever it shows', () => {
    for (const metrics of SIZES) {
      expect(xOf(0.1, metrics)).toBe(metrics.left);
      expect(xOf(100_000, metrics)).toBeCloseTo(metrics.left + 6 * metrics.decade, 9);
      expect(xOf(0.001, metrics)).toBe(metrics.left);
      expect(distanceAt(xOf(42, metrics), metrics)).toBeCloseTo(42, 9);
    }
  });

  it('takes the form that fits: page, card, phone', () => {
    expect(metricsForWidth(792).decade).toBe(122);
    expect(metricsForWidth(564).size).toBe('page');
    expect(metricsForWidth(563).size).toBe('card');
    expect(metricsForWidth(354)).toMatchObject({ size: 'phone', decade: 53 });
    expect(widthOf(metricsForWidth(320))).toBeLessThanOrEqual(320);
  });

  it('never draws an unknown as zero: no lane, no sill, a question in each decade', () => {
    const { shapes, sills } = reachStrip('unknown', METRICS.card);
    expect(sills).toEqual([]);
    expect(rects(shapes, 'sheet')).toEqual([]);
    const texts = shapes.flatMap((shape) => (shape.kind === 'text' ? shape.parts : []));
    expect(texts.filter((part) => part.text === '?')).toHaveLength(6);
  });

  it('says "nowhere above the limit" in words and closes the sill', () => {
    const { shapes, sills } = reachStrip({ eyeDistanceM: 0, skinDistanceM: 0 }, METRICS.row);
    expect(sills).toEqual([]);
    expect(JSON.stringify(shapes)).toContain('nowhere above the limit');
    expect(shapes.some((shape) => shape.kind === 'path' && shape.fill === 'spruce')).toBe(true);
  });

  it('lets a lane beyond the axis run to its end without a sill', () => {
    const far: ReachDistances = { eyeDistanceM: 133_000, skinDistanceM: 5870 };
    const { shapes, sills } = reachStrip(far, METRICS.card);
    expect(sills.map((sill) => sill.side)).toEqual(['skin']);
    expect(JSON.stringify(shapes)).toContain('> 100\u202fkm');
  });

  it('leaves the aided lane out when it reaches no more than 2 % farther', () => {
    const sides = (aidedDistanceM: number) =>
      reachStrip({ ...FIBER, aidedDistanceM }, METRICS.row).sills.map((sill) => sill.side);
    expect(sides(1410 * 1.019)).not.toContain('aided');
    expect(sides(1410 * 1.021)).toContain('aided');
  });

  it('draws ticks for several lines, twelve at most', () => {
    const lines = Array.from({ length: 20 }, (_, i) => ({
      wavelengthNm: 500 + i,
      eyeDistanceM: 10 + i,
    }));
    const own = (count: number) =>
      reachStrip({ ...FIBER, lines: lines.slice(0, count) }, METRICS.card).shapes.filter(
        (shape) => shape.kind === 'path' && shape.stroke?.startsWith('#'),
      );
    expect(own(1)).toHaveLength(0);
    expect(own(5)).toHaveLength(5);
    expect(own(20)).toHaveLength(12);
  });

  it('stays inside its box and has only finite numbers, whatever the distances', () => {
    const distance = fc.oneof(fc.constant(0), fc.double({ min: 1e-4, max: 1e7, noNaN: true }));
    const reach = fc.record({
      eyeDistanceM: distance,
      skinDistanceM: distance,
      aidedDistanceM: distance,
      wallDistanceM: fc.option(fc.double({ min: 0.05, max: 1e4, noNaN: true }), { nil: undefined }),
    });
    fc.assert(
      fc.property(reach, fc.constantFrom(...SIZES), (distances, metrics) => {
        const { shapes, width, sills } = reachStrip(distances, metrics);
        expect(JSON.stringify(shapes)).not.toMatch(/null|NaN|Infinity/);
        for (const rect of shapes.filter((shape) => shape.kind === 'rect')) {
          expect(rect.width).toBeGreaterThan(0);
        }
        for (const sill of sills) expect(sill.x).toBeLessThanOrEqual(width);
      }),
      { numRuns: 300 },
    );
  });

  it('becomes an SVG with literal colors for paper, in color and in one ink', () => {
    const states: Reach[] = [FIBER, 'unknown', 'loading', { eyeDistanceM: 0, skinDistanceM: 0 }];
    for (const reach of states) {
      for (const palette of [PRINT_PALETTE, ONE_INK_PALETTE]) {
        const svg = reachStripSvg(reach, palette, 'Limen Sans');
        expect(svg).toMatch(/^<svg [^>]*viewBox="0 0 141 24">/);
        expect(svg).not.toMatch(/var\(|undefined|NaN/);
      }
    }
    expect(reachStripSvg(FIBER, PRINT_PALETTE, 'Limen Sans')).toContain('#b4370f');
  });
});

describe('the name of a strip', () => {
  it('says the three distances and the wall', () => {
    expect(reachName('L-02', { ...FIBER, aidName: '7 × 50 optics' })).toBe(
      'Reach of L-02: skin 155 meters, eye 1.41 kilometers, with 7 × 50 optics 9.39 kilometers; ' +
        'wall of the room at 9.50 meters',
    );
  });

  it('says what is not known and what is nowhere', () => {
    expect(reachName('L-20', 'unknown')).toBe('Reach of L-20: not evaluated');
    expect(reachName('L-06', { eyeDistanceM: 0, skinDistanceM: 0 })).toBe(
      'Reach of L-06: nowhere above the limit',
    );
  });
});
