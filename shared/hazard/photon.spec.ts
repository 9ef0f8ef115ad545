import { describe, expect, it } from 'vitest';
import { photonOf } from './photon';

describe('a photon', () => {
  it('has the energy hc/λ (constants of the SI of 2019)', () => {
    const { photonEnergyJ, photonEnergyEv, frequencyHz } = photonOf(532);
    expect(photonEnergyEv).toBeCloseTo(1239.841984 / 532, 8);
    expect(photonEnergyJ).toBeCloseTo(3.7339e-19, 22);
    expect(frequencyHz / 5.6352e14).toBeCloseTo(1, 4);
  });
});
