import { PART_OF_ONE } from './check-parts';
import type { FieldCheck, Fields, NumberRange } from './field-check';

/** What a path uses of a beam. The rest may be left out and is ignored when given. */
export interface UsedOfBeam {
  readonly diameter: boolean;
  readonly divergence: boolean;
  /** Profile and the criterion of its widths. */
  readonly profile: boolean;
  readonly waist: boolean;
}

const EVERYTHING: UsedOfBeam = { diameter: true, divergence: true, profile: true, waist: true };
const NOTHING: UsedOfBeam = { diameter: false, divergence: false, profile: false, waist: false };

const FIELDS_OF_KIND = {
  direct: new Set(['kind']),
  lens: new Set(['kind', 'focalLengthMm', 'diameterAtLensMm']),
  fiber: new Set(['kind', 'numericalAperture', 'modeFieldDiameterUm']),
  diffuse: new Set(['kind', 'reflectance', 'angleDeg', 'spotMm']),
} as const;

const KINDS = Object.keys(FIELDS_OF_KIND) as readonly (keyof typeof FIELDS_OF_KIND)[];

const VIEWING_ANGLE: NumberRange = {
  isInside: (value) => value >= 0 && value < 90,
  allowed: 'a number of degrees from 0 to below 90',
};

/** Checks the path and says what it uses of a beam. */
export function checkPath(check: FieldCheck, path: unknown): UsedOfBeam {
  if (path === undefined) return EVERYTHING;
  const kind = KINDS.find((known) => known === (path as { kind?: unknown } | null)?.kind);
  const fields = check.object(path, FIELDS_OF_KIND[kind ?? 'direct']);
  if (fields === undefined) return NOTHING;
  switch (kind) {
    case 'direct':
      return EVERYTHING;
    case 'lens':
      return checkLens(check, fields);
    case 'fiber':
      checkFiber(check, fields);
      return NOTHING;
    case 'diffuse':
      check.number(fields.reflectance, 'reflectance', PART_OF_ONE);
      check.number(fields.angleDeg, 'angleDeg', VIEWING_ANGLE);
      if (fields.spotMm !== undefined) check.number(fields.spotMm, 'spotMm');
      return NOTHING;
    default:
      check.choice(fields.kind, 'kind', KINDS);
      return NOTHING;
  }
}

function checkLens(check: FieldCheck, fields: Fields): UsedOfBeam {
  check.number(fields.focalLengthMm, 'focalLengthMm');
  const isGivenAtLens = fields.diameterAtLensMm !== undefined;
  if (isGivenAtLens) check.perAxis(fields.diameterAtLensMm, 'diameterAtLensMm');
  return { diameter: !isGivenAtLens, divergence: false, profile: true, waist: false };
}

function checkFiber(check: FieldCheck, { numericalAperture, modeFieldDiameterUm }: Fields): void {
  if (numericalAperture !== undefined && modeFieldDiameterUm !== undefined) {
    check.fail(
      '',
      'A fiber is either multimode or single mode.',
      'numericalAperture or modeFieldDiameterUm, not both',
    );
  } else if (modeFieldDiameterUm !== undefined) {
    check.number(modeFieldDiameterUm, 'modeFieldDiameterUm');
  } else if (numericalAperture !== undefined) {
    check.number(numericalAperture, 'numericalAperture', PART_OF_ONE);
  } else {
    check.fail(
      'numericalAperture',
      'The fiber has neither a numerical aperture nor a mode-field diameter.',
      'numericalAperture (multimode) or modeFieldDiameterUm (single mode)',
    );
  }
}
