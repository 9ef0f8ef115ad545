import { describe, expect, it } from 'vitest';

import { modelNumbers } from '../support/decimal-model/numbers';
import { SIX_CASES } from '../support/six-cases';

describe('the independent decimal model meets the six worked cases', () => {
  for (const { name, input, expected } of SIX_CASES) {
    it(name, () => {
      const numbers = modelNumbers(input);
      for (const [key, value] of Object.entries(expected)) {
        const actual = numbers[key];
        expect(actual, key).toBeDefined();
        expect(Math.abs(actual! / value - 1), `${key}: ${actual} for ${value}`).toBeLessThan(1e-6);
      }
    });
  }
});
