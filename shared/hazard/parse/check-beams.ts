import type { PerAxis } from '../case';
import { checkEmission } from './check-emission';
import type { FieldCheck, Fields, NumberRange } from './field-check';

/** What the path uses of a beam. The rest may be left out and is ignored when given. */
export interface CaseContext {
  readonly usesDiameter: boolean;
  readonly usesDivergence: boolean;
  readonly isDirect: boolean;
  /** The width criterion counts although the beam's own diameter does not. */
  readonly usesWidth?: boolean;
}

const MOST_BEAMS = 64;

const BEAM_FIELDS = [
  'label',
  'wavelengthNm',
  'emission',
  'diameterMm',
  'divergenceMrad',
  'width',
  'profile',
  'sourceMrad',
  'waistDistanceM',
  'm2',
] as const;

const WAVELENGTH: NumberRange = {
  isInside: (value) => value >= 180 && value <= 1e6,
  allowed: 'a number of nanometers from 180 to 1 000 000',
};

const ANY_NUMBER: NumberRange = { isInside: () => true, allowed: 'a finite number' };

/** Checks every beam. */
export function checkBeams(check: FieldCheck, beams: unknown, context: CaseContext): void {
  const allowed = `a list of 1 to ${MOST_BEAMS} beams`;
  if (!Array.isArray(beams)) {
    check.fail(
      'beams',
      beams === undefined ? 'beams is missing.' : 'beams must be a list.',
      allowed,
    );
  } else if (beams.length < 1 || beams.length > MOST_BEAMS) {
    check.fail('beams', `There are ${beams.length} beams.`, allowed);
  } else {
    for (let i = 0; i < beams.length; i++) checkBeam(check, beams[i], `beams[${i}]`, context);
  }
}

function checkBeam(check: FieldCheck, beam: unknown, path: string, context: CaseContext): void {
  const fields = check.object(beam, path, BEAM_FIELDS);
  if (fields === undefined) return;
  if (fields['label'] !== undefined) check.text(fields['label'], `${path}.label`);
  checkWavelength(check, fields['wavelengthNm'], `${path}.wavelengthNm`);
  checkEmission(check, fields['emission'], `${path}.emission`);
  if (fields['sourceMrad'] !== undefined) check.perAxis(fields['sourceMrad'], `${path}.sourceMrad`);
  checkGeometry(check, fields, path, context);
}

function checkWavelength(check: FieldCheck, wavelengthNm: unknown, path: string): void {
  if (typeof wavelengthNm === 'object' && wavelengthNm !== null && !Array.isArray(wavelengthNm)) {
    check.fail(
      path,
      'A wavelength range is not evaluated by this version.',
      `a single wavelength: ${WAVELENGTH.allowed}`,
    );
  } else check.number(wavelengthNm, path, WAVELENGTH);
}

function checkGeometry(
  check: FieldCheck,
  fields: Fields,
  path: string,
  { usesDiameter, usesDivergence, isDirect, usesWidth = usesDiameter }: CaseContext,
): void {
  const { diameterMm, divergenceMrad, waistDistanceM } = fields;
  const isDiameter = usesDiameter && check.perAxis(diameterMm, `${path}.diameterMm`);
  const isDivergence = usesDivergence && check.perAxis(divergenceMrad, `${path}.divergenceMrad`);
  if (usesWidth) checkProfile(check, fields, path);
  if (!isDirect) return;
  if (fields['m2'] !== undefined) check.number(fields['m2'], `${path}.m2`);
  if (waistDistanceM === undefined) return;
  if (!check.number(waistDistanceM, `${path}.waistDistanceM`, ANY_NUMBER)) return;
  if (isDiameter && isDivergence) {
    checkWaist(check, diameterMm as PerAxis, divergenceMrad as PerAxis, {
      waistDistanceM,
      path: `${path}.waistDistanceM`,
    });
  }
}

function checkProfile(check: FieldCheck, fields: Fields, path: string): void {
  const profile = fields['profile'];
  check.choice(profile, `${path}.profile`, ['gaussian', 'top-hat'], 'There is no such profile');
  if (profile !== 'top-hat' || fields['width'] !== undefined) {
    check.choice(fields['width'], `${path}.width`, ['1/e', '1/e2'], 'There is no such width');
  }
}

/** A beam that narrows from the exit to its waist must have some width left there. */
function checkWaist(
  check: FieldCheck,
  diameterMm: PerAxis,
  divergenceMrad: PerAxis,
  { waistDistanceM, path }: { waistDistanceM: number; path: string },
): void {
  for (const axis of [0, 1] as const) {
    const d = typeof diameterMm === 'number' ? diameterMm : diameterMm[axis];
    const phi = typeof divergenceMrad === 'number' ? divergenceMrad : divergenceMrad[axis];
    if (Math.abs(waistDistanceM) * phi < d) continue;
    const farthestM = Number((d / phi).toPrecision(6));
    check.fail(
      path,
      `With this divergence the beam has no positive waist ${waistDistanceM} m from the exit.`,
      `between -${farthestM} and ${farthestM} m, edges excluded (diameter / divergence)`,
    );
    return;
  }
}
