import type { CaseContext } from './check-beams';
import type { FieldCheck, NumberRange } from './field-check';

/** The longest exposure, s. */
export const LONGEST_EXPOSURE_S = 30_000;

/** A duration that the tables hold. */
export const DURATION: NumberRange = {
  isInside: (value) => value > 0 && value <= LONGEST_EXPOSURE_S,
  allowed: 'a number of seconds above 0 and up to 30 000',
};

const PART_OF_ONE: NumberRange = {
  isInside: (value) => value > 0 && value <= 1,
  allowed: 'a number above 0 and up to 1',
};

const ANGLE: NumberRange = {
  isInside: (value) => value >= 0 && value < 90,
  allowed: 'a number of degrees from 0 to below 90',
};

const PATH_KINDS = ['direct', 'lens', 'fiber', 'diffuse'] as const;

/** Checks the path and says what it uses of a beam. */
export function checkPath(check: FieldCheck, path: unknown): CaseContext {
  if (path === undefined) return { usesDiameter: true, usesDivergence: true, isDirect: true };
  const kind = (path as { kind?: unknown } | null)?.kind;
  const fields = check.object(path, 'path', pathFields(kind));
  if (
    fields === undefined ||
    !check.choice(kind, 'path.kind', PATH_KINDS, 'There is no such path')
  ) {
    return { usesDiameter: false, usesDivergence: false, isDirect: false };
  }
  switch (kind) {
    case 'lens':
      check.number(fields['focalLengthMm'], 'path.focalLengthMm');
      if (fields['diameterAtLensMm'] !== undefined) {
        check.perAxis(fields['diameterAtLensMm'], 'path.diameterAtLensMm');
      }
      return {
        usesDiameter: fields['diameterAtLensMm'] === undefined,
        usesDivergence: false,
        isDirect: false,
        usesWidth: true,
      };
    case 'fiber':
      checkFiber(check, fields['numericalAperture'], fields['modeFieldDiameterUm']);
      break;
    case 'diffuse':
      check.number(fields['reflectance'], 'path.reflectance', PART_OF_ONE);
      check.number(fields['angleDeg'], 'path.angleDeg', ANGLE);
      if (fields['spotMm'] !== undefined) check.number(fields['spotMm'], 'path.spotMm');
      break;
    default:
      return { usesDiameter: true, usesDivergence: true, isDirect: true };
  }
  return { usesDiameter: false, usesDivergence: false, isDirect: false };
}

function pathFields(kind: unknown): readonly string[] {
  switch (kind) {
    case 'lens':
      return ['kind', 'focalLengthMm', 'diameterAtLensMm'];
    case 'fiber':
      return ['kind', 'numericalAperture', 'modeFieldDiameterUm'];
    case 'diffuse':
      return ['kind', 'reflectance', 'angleDeg', 'spotMm'];
    default:
      return ['kind'];
  }
}

function checkFiber(
  check: FieldCheck,
  numericalAperture: unknown,
  modeFieldDiameterUm: unknown,
): void {
  if (numericalAperture !== undefined && modeFieldDiameterUm !== undefined) {
    check.fail(
      'path',
      'A fiber is either multimode or single mode.',
      'numericalAperture or modeFieldDiameterUm, not both',
    );
  }
  if (modeFieldDiameterUm !== undefined)
    check.number(modeFieldDiameterUm, 'path.modeFieldDiameterUm');
  else if (numericalAperture !== undefined)
    check.number(numericalAperture, 'path.numericalAperture', PART_OF_ONE);
  else {
    check.fail(
      'path.numericalAperture',
      'The fiber has neither a numerical aperture nor a mode-field diameter.',
      'numericalAperture (multimode) or modeFieldDiameterUm (single mode)',
    );
  }
}

/** Checks the exposure durations. */
export function checkExposure(check: FieldCheck, exposure: unknown, isOptional: boolean): void {
  if (exposure === undefined && isOptional) return;
  const fields = check.object(exposure, 'exposure', ['eyeS', 'skinS']);
  if (fields === undefined) return;
  check.number(fields['eyeS'], 'exposure.eyeS', DURATION);
  if (fields['skinS'] !== undefined) check.number(fields['skinS'], 'exposure.skinS', DURATION);
}

/** Checks the optical aid. */
export function checkAid(check: FieldCheck, aid: unknown): void {
  const fields = check.object(aid, 'aid', ['objectiveMm', 'magnification', 'transmission']);
  if (fields === undefined) return;
  check.number(fields['objectiveMm'], 'aid.objectiveMm');
  check.number(fields['magnification'], 'aid.magnification');
  check.number(fields['transmission'], 'aid.transmission', PART_OF_ONE);
}

/** Checks the attenuation of the air. */
export function checkAir(check: FieldCheck, air: unknown): void {
  const fields = check.object(air, 'air', ['attenuationPerKm']);
  if (fields !== undefined) check.number(fields['attenuationPerKm'], 'air.attenuationPerKm');
}

/** Checks the model of the beam. */
export function checkModel(check: FieldCheck, model: unknown): void {
  const fields = check.object(model, 'model', ['growth', 'onAxis']);
  if (fields === undefined) return;
  check.choice(fields['growth'], 'model.growth', ['hyperbolic', 'linear']);
  check.choice(fields['onAxis'], 'model.onAxis', ['peak', 'aperture-mean']);
}

/** Checks the distance that is asked for. */
export function checkAt(check: FieldCheck, at: unknown): void {
  const fields = check.object(at, 'at', ['distanceM']);
  if (fields !== undefined) check.number(fields['distanceM'], 'at.distanceM');
}
