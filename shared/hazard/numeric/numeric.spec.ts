import { describe, expect, it } from 'vitest';
import { findRoot } from './find-root';
import { largestReach } from './largest-reach';
import { maximum } from './maximum';
import { periodicMean } from './periodic-mean';
import { power } from './power';

describe('findRoot', () => {
  it.each([
    ['a square root', (x: number) => x * x - 2, 1, 2, Math.SQRT2],
    ['a steep function', (x: number) => Math.exp(20 * x) - 5, -1, 3, Math.log(5) / 20],
    ['a root at an end', (x: number) => x - 1, 1, 2, 1],
    ['a falling logarithm over many decades', (x: number) => -Math.log(x / 1e5), 1e-3, 1e9, 1e5],
  ])('finds %s', (...[, f, from, to, expected]) => {
    const root = findRoot(f, from, to);
    expect(Math.abs(root / expected - 1)).toBeLessThan(1e-13);
  });

  it('refuses a bracket without a change of sign', () => {
    expect(() => findRoot((x) => x * x + 1, -1, 1)).toThrow(RangeError);
  });
});

describe('largestReach', () => {
  it('finds where a falling ratio reaches 1', () => {
    expect(largestReach((r) => 100 / r ** 2, [])).toBeCloseTo(10, 12);
    expect(largestReach((r) => 0.5 / (1 + r), [])).toBe(0);
  });

  it('takes the far side of a hill', () => {
    const hill = (r: number) => 3 * Math.exp(-((r - 5) ** 2));
    expect(largestReach(hill, [5])).toBeCloseTo(5 + Math.sqrt(Math.log(3)), 10);
  });

  it('finds a hill between two breakpoints, however narrow its top', () => {
    const hill = (r: number) => 1.001 * Math.exp(-((Math.log(r / 3) / 0.2) ** 2));
    const expected = 3 * Math.exp(0.2 * Math.sqrt(Math.log(1.001)));
    expect(largestReach(hill, [1, 10])).toBeCloseTo(expected, 8);
  });

  it('ends at a step that falls below 1', () => {
    expect(largestReach((r) => (r < 2 ? 1.5 : 0.9 / r), [2])).toBeCloseTo(2, 12);
    expect(largestReach((r) => (r < 2 ? 0.5 : 6 / r), [2])).toBeCloseTo(6, 12);
  });
});

describe('maximum', () => {
  it('finds a hill between points, and keeps an end that is higher', () => {
    expect(maximum((x) => -((x - 0.3) ** 2), [0, 0.5, 1])).toBeCloseTo(0.3, 7);
    expect(maximum((x) => x, [0, 1, 2])).toBe(2);
  });
});

describe('periodicMean', () => {
  it('integrates smooth even functions to the last digits', () => {
    expect(periodicMean(() => 3)).toBeCloseTo(3, 14);
    expect(periodicMean((u) => Math.cos(u) ** 2)).toBeCloseTo(0.5, 14);
    // The mean of 1 / (1 + k sin²) is 1 / √(1 + k).
    expect(periodicMean((u) => 1 / (1 + 9999 * Math.sin(u) ** 2))).toBeCloseTo(0.01, 14);
  });
});

describe('power', () => {
  it('agrees with the general power for the exponents that tables print', () => {
    for (const exponent of [0, 0.25, 0.5, 0.75, -0.25, 0.375]) {
      for (const base of [1e-13, 3.3e-7, 0.25, 10, 3e4]) {
        expect(Math.abs(power(base, exponent) / base ** exponent - 1)).toBeLessThan(1e-14);
      }
    }
  });
});
