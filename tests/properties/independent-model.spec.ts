import { describe, expect, it } from 'vitest';

import { HazardModel, type Compared } from '../support/decimal-model/model';
import { modelNumbers } from '../support/decimal-model/numbers';
import { disagreements } from '../support/agreement';
import { engineNumbers, resultOf } from '../support/engine-numbers';
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

/** A train whose pulses keep their own limit says nothing beside the single pulse. */
function addsNothing({ candidate }: Compared, all: readonly Compared[]): boolean {
  return (
    candidate.rule === 'pulse-train' &&
    all.some(
      (other) =>
        other.candidate.rule === 'single-pulse' && other.candidate.limit.eq(candidate.limit),
    )
  );
}

describe(`the engine considers every limit that the model finds (seed ${SEED})`, () => {
  it.each(['eye', 'skin'] as const)('%s', (side) => {
    let found = 0;
    for (const drawn of CASES.slice(0, 150)) {
      if (drawn.path?.kind === 'diffuse') continue;
      const perBeam = new HazardModel(drawn).perBeam(side);
      const result = resultOf(drawn)[side].perBeam;
      perBeam.forEach(({ all }, i) => {
        for (const compared of all.filter((one) => !addsNothing(one, all))) {
          const { rule, mechanism, apertureMm, limit } = compared.candidate;
          const match = result[i]!.mpe.candidates!.some(
            (own) =>
              own.rule === rule &&
              own.mechanism === mechanism &&
              apertureMm.div(own.limitingApertureMm).sub(1).abs().lt(1e-12) &&
              limit.div(own.value).sub(1).abs().lt(1e-12),
          );
          expect(match, `${rule} ${mechanism} ${limit} of ${JSON.stringify(drawn)}`).toBe(true);
          found++;
        }
      });
    }
    expect(found).toBeGreaterThan(200);
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
