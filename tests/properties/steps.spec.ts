// A general mathematics library: it knows nothing of this project. Its `log` is the natural one.
import { evaluate as calculate } from 'mathjs';
import { describe, expect, it } from 'vitest';

import { resultOf } from '../support/engine-numbers';
import { drawCases } from '../support/random-cases';

const SEED = 31_415;
const CASES = drawCases(500, SEED);

describe(`every derivation can be recomputed from what it prints (seed ${SEED})`, () => {
  it('the substituted text of every step evaluates to its value', () => {
    let checked = 0;
    for (const drawn of CASES) {
      for (const step of resultOf(drawn).steps ?? []) {
        const text = `${step.symbol} = ${step.formula} = ${step.substituted} of ${JSON.stringify(drawn)}`;
        const value = Number(calculate(step.substituted));
        const scale = Math.max(Math.abs(step.value), Number.MIN_VALUE);
        expect(
          Math.abs(value - step.value) / scale,
          `${text}: ${value}, ${step.value}`,
        ).toBeLessThan(1e-9);
        checked++;
      }
    }
    expect(checked).toBeGreaterThan(5 * CASES.length);
  });

  it('every step says what it is, from where and in which unit', () => {
    for (const drawn of CASES.slice(0, 100)) {
      for (const step of resultOf(drawn).steps ?? []) {
        expect(step.what.length, JSON.stringify(step)).toBeGreaterThan(3);
        expect(step.source.length, JSON.stringify(step)).toBeGreaterThan(3);
        expect(step.symbol).toMatch(/^\S+$/);
        expect(typeof step.unit).toBe('string');
        expect(Number.isFinite(step.value)).toBe(true);
      }
    }
  });

  it('the steps end in the numbers of the result', () => {
    for (const drawn of CASES.slice(0, 200)) {
      const result = resultOf(drawn);
      const values = (result.steps ?? []).map(({ value }) => value);
      const has = (value: number): boolean =>
        values.some((own) => Math.abs(own - value) <= 1e-9 * Math.abs(value));
      for (const side of [result.eye, result.skin]) {
        expect(has(side.hazardDistanceM), JSON.stringify(drawn)).toBe(true);
        for (const { mpe, exposure, opticalDensity } of side.perBeam) {
          expect(has(mpe.radiantExposureJPerM2), JSON.stringify(drawn)).toBe(true);
          expect(has(opticalDensity), JSON.stringify(drawn)).toBe(true);
          const { irradianceWPerM2, radiantExposureJPerM2 } = exposure;
          expect(has(irradianceWPerM2) || has(radiantExposureJPerM2)).toBe(true);
        }
      }
    }
  });
});
