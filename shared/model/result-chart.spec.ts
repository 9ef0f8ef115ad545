import { describe, expect, it } from 'vitest';

import { exposureAt } from '../drawing/exposure-chart';
import type { Beam, HazardCase } from '../hazard/case';
import { evaluate } from '../hazard/evaluate';
import { isEvaluated } from './evaluation-case';
import { resultChart } from './result-chart';
import { resultView, type ResultView } from './result-view';

function beam(wavelengthNm: number, powerW: number): Beam {
  return {
    wavelengthNm,
    emission: { mode: 'cw', powerW },
    diameterMm: 1.5,
    divergenceMrad: 0.5,
    width: '1/e2',
    profile: 'gaussian',
  };
}

function viewOf(hazardCase: HazardCase): ResultView {
  const result = evaluate(hazardCase);
  if (!isEvaluated(result)) throw new Error(result.errors[0]?.message);
  return resultView(hazardCase, result);
}

const SIX_LINES: HazardCase = {
  ruleSet: 'eu-2006-25',
  beams: [
    beam(457.9, 0.35),
    beam(476.5, 0.75),
    beam(488, 1.5),
    beam(496.5, 0.7),
    beam(501.7, 0.4),
    beam(514.5, 2),
  ],
  exposure: { eyeS: 0.25, skinS: 10 },
};

describe('chart of a result', () => {
  it('draws exposure where one limit holds for all lines, and meets it at the hazard distance', () => {
    const view = viewOf(SIX_LINES);
    const model = resultChart(view, 11);
    expect(model.unit).toBe('W/m²');
    expect(model.wallDistanceM).toBe(11);
    expect(model.lines).toHaveLength(6);
    const [eye, skin] = model.limits.map(
      (limit) => exposureAt(model, limit.distanceM) / limit.value,
    );
    expect(eye).toBeCloseTo(1, 6);
    // The skin is averaged over 3.5 mm, the curve over 7 mm.
    expect(Math.abs((skin ?? 0) - 1)).toBeLessThan(0.03);
    expect(model.limits.map(({ side }) => side)).toEqual(['eye', 'skin']);
    expect(model.limits[0]?.label).toContain('25.4');
  });

  it('draws exposure divided by limit where lines have different limits', () => {
    const view = viewOf({
      ruleSet: 'iec-60825-1-2014',
      beams: [beam(450, 0.5), beam(1064, 20)],
      exposure: { eyeS: 60 },
    });
    const model = resultChart(view, undefined);
    expect(model.unit).toBe('');
    expect(exposureAt(model, view.result.eye.hazardDistanceM)).toBeCloseTo(1, 6);
  });

  it('draws pulses by the exposure of one', () => {
    const view = viewOf({
      ruleSet: 'iec-60825-1-2014',
      beams: [
        {
          ...beam(1064, 1),
          emission: {
            mode: 'repetitive',
            pulseEnergyJ: 2e-3,
            pulseDurationS: 1e-8,
            repetitionRateHz: 1000,
          },
        },
      ],
      exposure: { eyeS: 100 },
    });
    const model = resultChart(view, undefined);
    expect(model.unit).toBe('J/m²');
    expect(model.limits[0]?.label).toContain('per pulse');
  });
});

describe('result by line', () => {
  it('gives each line the reach that it has alone, the longest below that of all together', () => {
    const view = viewOf(SIX_LINES);
    const alone = view.lines.map((line) => line.eyeAloneM);
    expect(Math.max(...alone)).toBeLessThan(view.result.eye.hazardDistanceM);
    const last = evaluate({ ...SIX_LINES, beams: SIX_LINES.beams.slice(-1) });
    expect(isEvaluated(last) && last.eye.hazardDistanceM).toBe(alone.at(-1));
  });
});
