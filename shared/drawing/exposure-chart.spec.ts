import fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import {
  chartScale,
  chartTable,
  exposureAt,
  exposureChart,
  type ExposureChartModel,
  exposureChartSvg,
  yOf,
} from './exposure-chart';
import { PRINT_PALETTE } from './palettes';
import { METRICS, metricsForWidth } from './reach-axis';
import { reachStrip } from './reach-strip';

/** Exposure falling with the square of the distance: 1 W/m² at 100 m. */
const MODEL: ExposureChartModel = {
  unit: 'W/m²',
  title: 'one line',
  points: [0.1, 1, 10, 1e3, 1e5].map((distanceM) => ({ distanceM, value: 1e4 / distanceM ** 2 })),
  limits: [
    { side: 'eye', value: 25, label: 'Eye limit 25.0 W/m²', distanceM: 20 },
    { side: 'skin', value: 2000, label: 'Skin limit 2.00 kW/m²', distanceM: Math.sqrt(5) },
  ],
  wallDistanceM: 11,
};

describe('the exposure chart', () => {
  it('reads a power law exactly between its points', () => {
    fc.assert(
      fc.property(fc.double({ min: 0.1, max: 1e5, noNaN: true }), (distanceM) => {
        expect(exposureAt(MODEL, distanceM) / (1e4 / distanceM ** 2)).toBeCloseTo(1, 9);
      }),
    );
  });

  it('puts its rings where curve and limit meet, below the sills of the strip', () => {
    const metrics = metricsForWidth(792, 64);
    const { shapes } = exposureChart(MODEL, metrics);
    const rings = shapes.filter((shape) => shape.kind === 'circle');
    const scale = chartScale(MODEL, metrics);
    const { sills } = reachStrip({ eyeDistanceM: 20, skinDistanceM: Math.sqrt(5) }, metrics);
    const eye = sills.find((sill) => sill.side === 'eye');
    expect(rings).toHaveLength(2);
    expect(rings[0]?.x).toBe(eye?.x);
    expect(rings[0]?.y).toBeCloseTo(yOf(exposureAt(MODEL, 20), scale), 6);
  });

  it('shows every limit', () => {
    const scale = chartScale(MODEL, METRICS.page);
    for (const { value } of MODEL.limits) {
      expect(yOf(value, scale)).toBeGreaterThan(scale.top);
      expect(yOf(value, scale)).toBeLessThan(scale.bottom);
    }
  });

  it('tells the limits apart without color: solid, dashed, dotted', () => {
    const limits = [
      ...MODEL.limits,
      { side: 'aided', value: 5, label: 'Aided limit', distanceM: 45 } as const,
    ];
    const { shapes } = exposureChart({ ...MODEL, limits }, METRICS.page);
    const line = (color: string) =>
      shapes.find((s) => s.kind === 'path' && s.stroke === color && s.strokeWidth === 1.5);
    expect(line('eye')).not.toHaveProperty('dash');
    expect(line('skin')).toMatchObject({ dash: [8, 4] });
    expect(line('aid')).toMatchObject({ dash: [0, 4], roundCap: true });
  });

  it('has a table of the same points, three to a decade', () => {
    const rows = chartTable(MODEL);
    expect(rows).toHaveLength(19);
    expect(rows[0]?.value).toBeCloseTo(1e6, 3);
    expect(rows.at(-1)?.distanceM).toBe(100_000);
  });

  it('draws exposures that are zero, or never above a limit, without broken numbers', () => {
    const silent: ExposureChartModel = {
      ...MODEL,
      points: MODEL.points.map(({ distanceM }) => ({ distanceM, value: 0 })),
      limits: [{ side: 'eye', value: 25, label: 'Eye limit', distanceM: 0 }],
    };
    for (const model of [MODEL, silent, { ...MODEL, limits: [] }]) {
      expect(exposureChartSvg(model, PRINT_PALETTE, 'Limen Sans')).not.toMatch(
        /NaN|Infinity|undefined|var\(/,
      );
    }
  });
});
