import { describe, expect, it } from 'vitest';

import { RULE_SETS } from '../../shared/hazard/rule-sets';
import { CHECK_VALUES } from '../support/check-values';
import { smallestPrinted } from '../support/limit-of';

/** Four digits are printed. */
const HALF_A_UNIT = 0.0005;

describe('check values computed from the tables by another program', () => {
  for (const { id, edition } of RULE_SETS) {
    const own = CHECK_VALUES.filter(({ ruleSet }) => ruleSet === id);
    if (own.length === 0) continue;
    it(`${edition}: ${own.length} limits of eye and skin`, () => {
      for (const { mechanism, radiantExposureJPerM2, ...question } of own) {
        const limit = smallestPrinted(question);
        const place = JSON.stringify(question);
        expect(Math.abs(limit.value / radiantExposureJPerM2 - 1), place).toBeLessThan(HALF_A_UNIT);
        expect(limit.mechanism, place).toBe(mechanism);
      }
    });
  }
});
