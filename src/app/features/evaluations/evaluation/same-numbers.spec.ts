import { firstDifference } from './same-numbers';

const RESULT = { eye: { hazardDistanceM: 1507.2, perBeam: [{ opticalDensity: 3.77 }] }, text: 'a' };

describe('browser against server', () => {
  it('agrees with itself and with the noise of the last digits', () => {
    const noisy = structuredClone(RESULT);
    noisy.eye.hazardDistanceM *= 1 + 1e-12;
    expect(firstDifference(RESULT, noisy)).toBeUndefined();
  });

  it('names the first number that differs by more than a billionth', () => {
    const other = structuredClone(RESULT);
    other.eye.perBeam[0]!.opticalDensity = 3.7700001;
    expect(firstDifference(RESULT, other)).toBe('eye.perBeam.0.opticalDensity');
  });

  it('names a number that only one of them has', () => {
    expect(firstDifference(RESULT, { ...RESULT, eye: { perBeam: [] } })).toBe(
      'eye.hazardDistanceM',
    );
    expect(firstDifference({ a: 1 }, { a: null })).toBe('a');
  });

  it('does not compare words', () => {
    expect(firstDifference(RESULT, { ...RESULT, text: 'b' })).toBeUndefined();
  });
});
