import type { EvaluationInput } from '@shared/model/evaluations';
import {
  type Emission,
  type LaserInput,
  laserInputSchema,
  type Quantity,
} from '@shared/model/lasers';

/** A number of a data sheet. */
export function quantity(value: number, more: Partial<Quantity> = {}): Quantity {
  return { value, source: 'data-sheet', ...more };
}

/** 532 nm, continuous, 5 W, 2.3 mm, 0.5 mrad: a complete line. */
export function anEmission(more: Partial<Emission> = {}): Emission {
  return {
    id: 'e1',
    wavelengthNm: quantity(532),
    mode: 'cw',
    powerW: quantity(5),
    delivery: 'beam',
    diameterMm: quantity(2.3),
    diameterConvention: '1/e2',
    divergenceMrad: quantity(0.5),
    divergenceConvention: '1/e2',
    divergenceAngle: 'full',
    profile: 'gaussian',
    ...more,
  };
}

/** A laser whose record is complete but for its area; valid by the contract. */
export function aLaser(more: Partial<LaserInput> = {}): LaserInput {
  return laserInputSchema.parse({
    maker: 'Quenlorn',
    model: 'QG-5',
    homeBuilt: false,
    mobile: false,
    declaredClass: '4',
    emissions: [anEmission()],
    emissionSets: [],
    ...more,
  });
}

/** The proposed situations, with the activities that are not evaluated answered. */
export function answered(input: EvaluationInput): EvaluationInput {
  const reason = 'The maker alone does this, by a permit of its own.';
  return {
    ...input,
    notCovered: [
      { activity: 'maintenance', reason },
      { activity: 'service', reason },
    ],
  };
}
