import type { FieldCheck, NumberRange } from './field-check';

/** A duration that the tables hold. */
export const DURATION: NumberRange = {
  isInside: (value) => value > 0 && value <= 30_000,
  allowed: 'a number of seconds above 0 and up to 30 000',
};

/** A part of a whole, such as a reflectance. */
export const PART_OF_ONE: NumberRange = {
  isInside: (value) => value > 0 && value <= 1,
  allowed: 'a number above 0 and up to 1',
};

const EXPOSURE_FIELDS = new Set(['eyeS', 'skinS']);
const AID_FIELDS = new Set(['objectiveMm', 'magnification', 'transmission']);
const AIR_FIELDS = new Set(['attenuationPerKm']);
const MODEL_FIELDS = new Set(['growth', 'onAxis']);
const AT_FIELDS = new Set(['distanceM']);

/** Checks the exposure durations. */
export function checkExposure(check: FieldCheck, exposure: unknown): void {
  const fields = check.object(exposure, EXPOSURE_FIELDS);
  if (fields === undefined) return;
  check.number(fields.eyeS, 'eyeS', DURATION);
  if (fields.skinS !== undefined) check.number(fields.skinS, 'skinS', DURATION);
}

/** Checks the optical aid. */
export function checkAid(check: FieldCheck, aid: unknown): void {
  const fields = check.object(aid, AID_FIELDS);
  if (fields === undefined) return;
  check.number(fields.objectiveMm, 'objectiveMm');
  check.number(fields.magnification, 'magnification');
  check.number(fields.transmission, 'transmission', PART_OF_ONE);
}

/** Checks the attenuation of the air. */
export function checkAir(check: FieldCheck, air: unknown): void {
  const fields = check.object(air, AIR_FIELDS);
  if (fields !== undefined) check.number(fields.attenuationPerKm, 'attenuationPerKm');
}

/** Checks the model of the beam. */
export function checkModel(check: FieldCheck, model: unknown): void {
  const fields = check.object(model, MODEL_FIELDS);
  if (fields === undefined) return;
  check.choice(fields.growth, 'growth', ['hyperbolic', 'linear']);
  check.choice(fields.onAxis, 'onAxis', ['peak', 'aperture-mean']);
}

/** Checks the distance that is asked for. */
export function checkAt(check: FieldCheck, at: unknown): void {
  const fields = check.object(at, AT_FIELDS);
  if (fields !== undefined) check.number(fields.distanceM, 'distanceM');
}
