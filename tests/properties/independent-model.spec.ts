import { describe, expect, it } from 'vitest';

import { modelNumbers } from '../support/decimal-model/numbers';
import { disagreements } from '../support/agreement';
import { engineNumbers } from '../support/engine-numbers';
import { RULE_SET_IDS } from '../support/decimal-model/rows';
import { drawCases } from '../support/random-cases';
import { SIX_CASES } from '../support/six-cases';

const SEED = 20_250_401;
const CASES = drawCases(400, SEED);

describe(`engine and independent decimal model agree (seed ${SEED})`, () => {
  it.each(RULE_SET_IDS)('on every number of the drawn cases of %s', (ruleSet) => {
    const own = CASES.filter((drawn) => drawn.ruleSet === ruleSet);
    expect(own.length).toBeGreaterThan(40);
    const found = own.flatMap((drawn) => {
      const flatTop = drawn.path?.kind === 'diffuse' && drawn.path.spotMm !== undefined;
      const different = disagreements(engineNumbers(drawn), modelNumbers(drawn), flatTop);
      return different.length > 0 ? [{ drawn: JSON.stringify(drawn), different }] : [];
    });
    expect(found).toEqual([]);
  });
});

describe('the engine meets the six worked cases', () => {
  it.each(SIX_CASES)('$name', ({ input, expected }) => {
    const numbers = engineNumbers(input);
    for (const [key, value] of Object.entries(expected)) {
      const actual = numbers[key];
      expect(Math.abs(actual! / value - 1), `${key}: ${actual} for ${value}`).toBeLessThan(1e-6);
    }
  });
});
