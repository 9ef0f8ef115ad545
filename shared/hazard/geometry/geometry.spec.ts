import { describe, expect, it } from 'vitest';
import type { Beam } from '../case';
import {
  apertureFraction,
  gaussianEllipseFraction,
  slenderGaussianFraction,
} from './aperture-fraction';
import { apertureMean, peak } from './beam-exposure';
import { beamShape, widthX, widthY } from './beam-shape';
import { diffuseExposure, diffuseField, spotSource } from './diffuse-field';
import { distanceOfWidth, reach, type ReachQuery } from './reach';

const BEAM: Beam = {
  wavelengthNm: 532,
  emission: { mode: 'cw', powerW: 1 },
  diameterMm: 2,
  divergenceMrad: 1,
  width: '1/e',
  profile: 'gaussian',
};
const DIRECT = { kind: 'direct' } as const;

/** The fraction by a fine grid over the aperture, as slow and plain as can be. */
function fractionOnGrid(profile: Beam['profile'], aperture: number, dx: number, dy: number) {
  const n = 1500;
  const step = aperture / n;
  let sum = 0;
  for (let i = 0; i < n; i++) {
    for (let j = 0; j < n; j++) {
      const [x, y] = [(i + 0.5) * step - aperture / 2, (j + 0.5) * step - aperture / 2];
      if (x * x + y * y > (aperture / 2) ** 2) continue;
      const square = 4 * ((x / dx) ** 2 + (y / dy) ** 2);
      const inside = square <= 1 ? 1 : 0;
      sum += profile === 'top-hat' ? inside : Math.exp(-square);
    }
  }
  return (4 * sum * step * step) / (Math.PI * dx * dy);
}

describe('the part of a beam that passes an aperture', () => {
  it('is that of the formula for a circular Gaussian', () => {
    expect(apertureFraction('gaussian', 7, 7, 7)).toBeCloseTo(1 - Math.exp(-1), 14);
    expect(apertureFraction('gaussian', 7, 0, 0)).toBe(1);
  });

  it.each([
    ['gaussian', 7, 3, 9],
    ['gaussian', 7, 20, 5],
    ['gaussian', 1, 30, 0.5],
    ['top-hat', 7, 3, 9],
    ['top-hat', 7, 9, 6],
    ['top-hat', 3.5, 30, 1],
  ] as const)('agrees with a grid: %s, aperture %d, %d × %d', (profile, aperture, dx, dy) => {
    const fraction = apertureFraction(profile, aperture, dx, dy);
    expect(Math.abs(fraction / fractionOnGrid(profile, aperture, dx, dy) - 1)).toBeLessThan(2e-3);
  });

  it('does not depend on the order of the axes, and meets the circular form', () => {
    for (const profile of ['gaussian', 'top-hat'] as const) {
      expect(apertureFraction(profile, 7, 2, 30)).toBe(apertureFraction(profile, 7, 30, 2));
      expect(apertureFraction(profile, 7, 8, 8 * (1 + 1e-13))).toBeCloseTo(
        apertureFraction(profile, 7, 8, 8),
        11,
      );
    }
  });

  it('is the same by both integrals', () => {
    for (const aperture of [1e-3, 0.1, 1, 7, 100]) {
      for (const [wide, narrow] of [
        [1.01, 1],
        [3, 1],
        [50, 0.5],
        [10, 0.01],
      ] as const) {
        const even = gaussianEllipseFraction(aperture, wide, narrow);
        const slender = slenderGaussianFraction(aperture, wide, narrow);
        expect(Math.abs(slender / even - 1)).toBeLessThan(2e-13);
      }
    }
  });

  it('is exact for a beam like a slit', () => {
    // Far wider than the aperture in x: the density along it is 2/(√π Dx).
    for (const narrow of [1e-3, 1e-9, 1e-200]) {
      const fraction = apertureFraction('gaussian', 1, 1e6, narrow);
      expect(fraction / (2 / Math.sqrt(Math.PI) / 1e6)).toBeCloseTo(1, 5);
    }
  });
});

describe('the width of a beam', () => {
  it('grows hyperbolically or linearly', () => {
    expect(widthX(beamShape(BEAM, DIRECT, 'hyperbolic'), 2)).toBeCloseTo(Math.SQRT2 * 2e-3, 15);
    expect(widthX(beamShape(BEAM, DIRECT, 'linear'), 2)).toBeCloseTo(4e-3, 15);
  });

  it('is given at the 1/e² points √2 wider, and for a top-hat once only', () => {
    const narrow = beamShape({ ...BEAM, width: '1/e2' }, DIRECT, 'linear');
    expect(widthX(narrow, 1)).toBeCloseTo(3e-3 / Math.SQRT2, 15);
    const topHat = beamShape({ ...BEAM, width: '1/e2', profile: 'top-hat' }, DIRECT, 'linear');
    expect(widthX(topHat, 1)).toBeCloseTo(3e-3, 15);
  });

  it('has its waist where it is said to be', () => {
    const focused = beamShape({ ...BEAM, waistDistanceM: 1.5 }, DIRECT, 'hyperbolic');
    expect(widthX(focused, 0)).toBe(2e-3);
    expect(widthX(focused, 1.5)).toBeCloseTo(Math.sqrt(4e-6 - 2.25e-6), 15);
    expect(widthX(focused, 3)).toBeCloseTo(2e-3, 15);
  });

  it('has two axes', () => {
    const shape = beamShape(
      { ...BEAM, diameterMm: [1, 2], divergenceMrad: [3, 1] },
      DIRECT,
      'linear',
    );
    expect([widthX(shape, 1), widthY(shape, 1)]).toEqual([4e-3, 3e-3]);
  });

  it('behind a lens is a cone from the focus', () => {
    const shape = beamShape(BEAM, { kind: 'lens', focalLengthMm: 100 }, 'hyperbolic');
    expect(widthX(shape, 2)).toBeCloseTo(0.04, 15);
  });

  it('behind a fiber follows NA at the 5 % point, or the mode-field diameter', () => {
    const multimode = beamShape(BEAM, { kind: 'fiber', numericalAperture: 0.22 }, 'linear');
    // At the slope NA from the axis 5 % of the peak are left.
    expect(Math.exp(-((2 * 0.22) ** 2) / widthX(multimode, 1) ** 2)).toBeCloseTo(0.05, 14);
    const single = beamShape(BEAM, { kind: 'fiber', modeFieldDiameterUm: 4 }, 'linear');
    expect(widthX(single, 1)).toBeCloseTo((Math.SQRT2 * 532e-9) / (Math.PI * 2e-6), 14);
  });
});

describe('reach', () => {
  const shape = beamShape(BEAM, DIRECT, 'hyperbolic');
  const query: ReachQuery = {
    field: shape,
    onAxis: 'aperture-mean',
    apertureM: 7e-3,
    powerOrEnergy: 5,
    limit: 25,
    attenuationPerM: 0,
  };

  it('is where the exposure equals the limit, in closed form and by root finding alike', () => {
    for (const profile of ['gaussian', 'top-hat'] as const) {
      for (const waistDistanceM of [-1, 0, 1.5]) {
        for (const growth of ['hyperbolic', 'linear'] as const) {
          const field = beamShape({ ...BEAM, profile, waistDistanceM }, DIRECT, growth);
          const closed = reach({ ...query, field });
          expect(5 * apertureMean(field, 7e-3, closed)).toBeCloseTo(25, 9);
          const numeric = reach({ ...query, field: { ...field, isCircular: false } });
          expect(Math.abs(numeric / closed - 1)).toBeLessThan(1e-10);
        }
      }
    }
  });

  it('takes the peak when asked to', () => {
    const distanceM = reach({ ...query, onAxis: 'peak' });
    expect(5 * peak(shape, distanceM)).toBeCloseTo(25, 9);
    expect(distanceM).toBeGreaterThan(reach(query));
  });

  it('is 0 when nowhere above the limit', () => {
    expect(reach({ ...query, limit: 1e9 })).toBe(0);
    expect(distanceOfWidth(shape, 1e-3)).toBe(0);
  });

  it('is shorter in air', () => {
    const distanceM = reach({ ...query, attenuationPerM: 1e-3 });
    expect(5 * apertureMean(shape, 7e-3, distanceM) * Math.exp(-1e-3 * distanceM)).toBeCloseTo(
      25,
      9,
    );
  });

  it('is the distance of a diffuse reflection', () => {
    const field = diffuseField({ kind: 'diffuse', reflectance: 0.8, angleDeg: 60 });
    expect(5 * diffuseExposure(field, reach({ ...query, field }))).toBeCloseTo(25, 10);
  });
});

describe('a lit spot', () => {
  it('is foreshortened in one axis', () => {
    const field = diffuseField({ kind: 'diffuse', reflectance: 1, angleDeg: 60, spotMm: 10 });
    const { xMrad, yMrad } = spotSource(field, 0.5);
    expect(yMrad).toBeCloseTo(20, 12);
    expect(xMrad).toBeCloseTo(10, 12);
  });
});
