import { describe, expect, it } from 'vitest';
import { proposedExposure } from './default-exposure';

describe('proposed exposure durations', () => {
  it.each([
    [[532], 'direct', 0.25],
    [[532, 1064], 'direct', 10],
    [[1550], 'direct', 100],
    [[532], 'diffuse', 600],
    [[355, 1064], 'diffuse', 30_000],
  ] as const)('of %j nm, %s: %d s', (wavelengthsNm, pathKind, eyeS) => {
    const proposal = proposedExposure(wavelengthsNm, pathKind);
    expect(proposal.eyeS).toBe(eyeS);
    expect(proposal.skinS).toBeGreaterThanOrEqual(10);
    expect(proposal.reason).not.toBe('');
  });
});
