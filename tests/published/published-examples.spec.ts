import { afterAll, describe, expect, it } from 'vitest';

import type { BeamResult } from '../../shared/hazard/result';
import { resultOf } from '../support/engine-numbers';

import examples from './examples.json';
import notUsed from './not-used.json';

/** One number that a published source prints for a case. */
interface PublishedExample {
  readonly id: string;
  readonly source: string;
  readonly locator: string;
  readonly provenance: 'read in the source' | 'from memory of the source';
  readonly ruleSet: string;
  readonly inputs: unknown;
  readonly quantity: string;
  /** A second case, where the source prints a comparison. */
  readonly comparedWith?: unknown;
  /** Where the source averages over another aperture than the rule set. */
  readonly apertureMm?: number;
  readonly expected: number;
  readonly unit: string;
  readonly printed: string;
  readonly tolerance: number;
  /** Why the tolerance is more than half a unit of the last printed digit. */
  readonly toleranceReason?: string;
  readonly note?: string;
}

const EXAMPLES = examples as readonly PublishedExample[];

const area = (diameterMm: number): number => (Math.PI * (diameterMm / 1000) ** 2) / 4;

const eye = (inputs: unknown): BeamResult => resultOf(inputs).eye.perBeam[0]!;

/** The class limit by hand: the exposure limit times the area of its aperture, W (pulse: J). */
function classLimit(inputs: unknown): number {
  const { mpe } = eye(inputs);
  const single = JSON.stringify(inputs).includes('"single"');
  const limit = single ? mpe.radiantExposureJPerM2 : mpe.irradianceWPerM2;
  return limit * area(mpe.limitingApertureMm);
}

/** The part of one watt that passes the limiting aperture at the distance of `at`. */
function fractionThere(inputs: unknown): number {
  const { mpe, at } = eye(inputs);
  return at!.irradianceWPerM2 * area(mpe.limitingApertureMm);
}

/** How a quantity is read from the engine's results. */
const QUANTITIES: Record<string, (example: PublishedExample) => number> = {
  'eye.mpe.irradiance': ({ inputs }) => eye(inputs).mpe.irradianceWPerM2,
  'eye.mpe.radiantExposure': ({ inputs }) => eye(inputs).mpe.radiantExposureJPerM2,
  'skin.mpe.irradiance': ({ inputs }) => resultOf(inputs).skin.perBeam[0]!.mpe.irradianceWPerM2,
  'skin.mpe.radiantExposure': ({ inputs }) =>
    resultOf(inputs).skin.perBeam[0]!.mpe.radiantExposureJPerM2,
  'eye.mpe.irradianceWithoutCC': ({ inputs }) => {
    const { mpe } = eye(inputs);
    return mpe.irradianceWPerM2 / mpe.factors.CC!;
  },
  'eye.factors.T1S': ({ inputs }) => eye(inputs).mpe.factors.T1S!,
  'eye.exposure.irradiance': ({ inputs }) => eye(inputs).exposure.irradianceWPerM2,
  'eye.opticalDensity': ({ inputs }) => resultOf(inputs).eye.opticalDensity,
  'eye.opticalDensityRoundedUp': ({ inputs }) => Math.ceil(resultOf(inputs).eye.opticalDensity),
  'eye.opticalDensityOver': ({ inputs, apertureMm }) => {
    const { mpe, exposure } = eye(inputs);
    const power = exposure.irradianceWPerM2 * area(mpe.limitingApertureMm);
    return Math.log10(power / area(apertureMm!) / mpe.irradianceWPerM2);
  },
  'eye.hazardDistance': ({ inputs }) => resultOf(inputs).eye.hazardDistanceM,
  'eye.classLimit': ({ inputs }) => classLimit(inputs),
  'eye.classLimitIncreaseDb': ({ inputs, comparedWith }) =>
    10 * Math.log10(classLimit(inputs) / classLimit(comparedWith)),
  'eye.at.apertureFraction': ({ inputs }) => fractionThere(inputs),
  'eye.at.largestPower': ({ inputs }) => classLimit(inputs) / fractionThere(inputs),
};

const count = (keep: (example: PublishedExample) => boolean): number =>
  EXAMPLES.filter(keep).length;

describe('published worked examples', () => {
  for (const example of EXAMPLES) {
    it(`${example.id} – ${example.source}, ${example.locator} (${example.provenance})`, () => {
      const actual = QUANTITIES[example.quantity]!(example);
      const text = `${example.quantity}: ${actual} for the printed ${example.printed}`;
      expect(Math.abs(actual - example.expected), text).toBeLessThanOrEqual(example.tolerance);
    });
  }

  it('each example has its own id, and says why where the tolerance is wide', () => {
    expect(new Set(EXAMPLES.map(({ id }) => id)).size).toBe(EXAMPLES.length);
    for (const { id, expected, printed, tolerance, toleranceReason } of EXAMPLES) {
      const wide = tolerance > halfAUnit(printed, expected) * (1 + 1e-9);
      expect(wide, `${id}: the tolerance ${tolerance} of ${printed}`).toBe(
        toleranceReason !== undefined,
      );
    }
  });

  it('each example that is left out says why', () => {
    for (const { id, reason } of notUsed) {
      expect(reason.length, id).toBeGreaterThan(20);
      expect(EXAMPLES.some((example) => example.id === id)).toBe(false);
    }
  });

  afterAll(() => {
    const read = count(({ provenance }) => provenance === 'read in the source');
    const memory = count(({ provenance }) => provenance === 'from memory of the source');
    const wide = count(({ toleranceReason }) => toleranceReason !== undefined);
    console.log(
      `Published checks: ${EXAMPLES.length}, of them ${read} read in the source and ` +
        `${memory} from memory of the source; ${wide} with a wider tolerance and its reason; ` +
        `${notUsed.length} examples not used.`,
    );
  });
});

/** Half a unit of the last printed digit, in the SI unit of the expected value. */
function halfAUnit(printed: string, expected: number): number {
  const [, digits, exponent] = /^([\d.]+)(?:e([-+]?\d+))?/.exec(printed)!;
  const decimals = digits!.split('.')[1]?.length ?? 0;
  const factor = expected / Number(`${digits}e${exponent ?? 0}`);
  return 0.5 * 10 ** (Number(exponent ?? 0) - decimals) * factor;
}
